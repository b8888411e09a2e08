package dev.couplet.examples.rounds;

import static java.nio.charset.StandardCharsets.UTF_8;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** What one run of the example, in this JVM, printed and returned. */
record Outcome(int status, String out, String err) {
  static Outcome of(String... args) {
    return of(false, args);
  }

  static Outcome of(boolean onTerminal, String... args) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    int status =
        Rounds.run(
            args, new PrintStream(out, true, UTF_8), new PrintStream(err, true, UTF_8), onTerminal);
    return new Outcome(status, out.toString(UTF_8), err.toString(UTF_8));
  }

  /** The first group of a pattern that the report must have. */
  String found(String pattern) {
    Matcher matcher = Pattern.compile(pattern, Pattern.MULTILINE).matcher(out);
    assertTrue(matcher.find(), () -> pattern + " is not found in:\n" + out);
    return matcher.group(1);
  }

  long value() {
    return Long.parseLong(found("^  value +(-?\\d+) m"));
  }

  String proof() {
    return found("^  proof +(\\w+)");
  }
}
