package dev.couplet.examples.rounds;

import java.io.PrintStream;
import picocli.CommandLine;
import picocli.CommandLine.Help.Ansi;

/**
 * The example's main class: a mobile library decides which van serves which village.
 *
 * <p>Prints a report on standard output. Exit status: 0 for a plan that keeps all required rules, 1
 * if none was found, 2 for bad use or input, with one line on standard error that says what is
 * wrong.
 */
public final class Rounds {
  private static final int BAD_USE = 2;

  private Rounds() {}

  /** Runs the example; ends the JVM only if the status is not 0. */
  public static void main(String[] args) {
    int status = run(args, System.out, System.err, onTerminal());
    if (status != 0) {
      System.exit(status);
    }
  }

  /** Whether somebody watches; on JDK 22 to 24 a console is there in any case. */
  @SuppressWarnings("SystemConsoleNull")
  private static boolean onTerminal() {
    return System.console() != null;
  }

  /**
   * Runs the example and returns the exit status.
   *
   * @param out where the report goes
   * @param err where faults go, and the progress
   * @param onTerminal whether somebody watches, so that progress is worth showing
   */
  static int run(String[] args, PrintStream out, PrintStream err, boolean onTerminal) {
    Options options = new Options();
    CommandLine line = new CommandLine(options).setColorScheme(plain());
    try {
      line.parseArgs(args);
      if (options.help()) {
        line.usage(out, plain());
        return 0;
      }
      return new Report(options.checked(), out, err, onTerminal).print();
    } catch (CommandLine.ParameterException | BadInput fault) {
      err.println("rounds: " + oneLine(String.valueOf(fault.getMessage())));
      return BAD_USE;
    } finally {
      out.flush();
    }
  }

  private static CommandLine.Help.ColorScheme plain() {
    return CommandLine.Help.defaultColorScheme(Ansi.OFF);
  }

  private static String oneLine(String message) {
    return message.replaceAll("\\R+", " ");
  }
}
