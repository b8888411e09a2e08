package dev.couplet.form;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.Reader;

/**
 * Reads a text as tokens separated by white space, and knows file, line and column of each, so that
 * readers of formats can point at what is wrong.
 *
 * <p>Reads on demand, one line at a time; belongs to one thread; does not close the reader under
 * it.
 */
public final class TokenReader {
  private final String source;
  private final BufferedReader reader;
  private String text = "";
  private int line;
  private int next;
  private int tokenStart;

  /** Reads from {@code reader}; {@code source} names the text in error messages. */
  public TokenReader(String source, Reader reader) {
    this.source = source;
    this.reader = reader instanceof BufferedReader buffered ? buffered : new BufferedReader(reader);
  }

  /** Moves to the start of the next line; false at the end of the text. */
  public boolean nextLine() throws IOException {
    String read = reader.readLine();
    line++;
    next = 0;
    tokenStart = 0;
    text = read == null ? "" : read;
    return read != null;
  }

  /** The whole of the current line. */
  @CheckReturnValue
  public String line() {
    return text;
  }

  /** Whether the current line has another token. */
  public boolean hasToken() {
    while (next < text.length() && Character.isWhitespace(text.charAt(next))) {
      next++;
    }
    return next < text.length();
  }

  /**
   * The next token of the current line.
   *
   * @throws FormatException if the line has none left, saying that {@code what} is missing
   */
  public String token(String what) {
    boolean found = hasToken();
    tokenStart = next;
    if (!found) {
      throw fault(what + " is missing");
    }
    while (next < text.length() && !Character.isWhitespace(text.charAt(next))) {
      next++;
    }
    return text.substring(tokenStart, next);
  }

  /**
   * Moves over line ends until there is a token.
   *
   * @throws FormatException if the text ends before, saying that {@code what} is missing
   */
  public void seekToken(String what) throws IOException {
    while (!hasToken()) {
      if (!nextLine()) {
        throw fault("the text ends where " + what + " should stand");
      }
    }
  }

  /**
   * The next token of the current line as a whole number in a range.
   *
   * @throws FormatException if it is not one
   */
  public int integer(String what, int lowest, int highest) {
    String token = token(what);
    try {
      long number = Long.parseLong(token);
      if (number >= lowest && number <= highest) {
        return (int) number;
      }
    } catch (NumberFormatException notWhole) {
      // Told below, in the same words.
    }
    throw fault(
        what + " is '" + token + "', it must be a whole number from " + lowest + " to " + highest);
  }

  /**
   * The next token of the current line as a finite decimal number, such as -1.5 or 2e-3.
   *
   * @throws FormatException if it is not one
   */
  public double number(String what) {
    String token = token(what);
    try {
      double number = isDecimal(token) ? Double.parseDouble(token) : Double.NaN;
      if (Double.isFinite(number)) {
        return number;
      }
    } catch (NumberFormatException notANumber) {
      // Told below, in the same words.
    }
    throw fault(what + " is '" + token + "', it must be a finite number");
  }

  /** Whether there is no letter but e in it: Java's own suffixes and hexadecimals stay outside. */
  private static boolean isDecimal(String token) {
    for (int k = 0; k < token.length(); k++) {
      char c = token.charAt(k);
      if ((c < '0' || c > '9') && "+-.eE".indexOf(c) < 0) {
        return false;
      }
    }
    return true;
  }

  /**
   * Insists that the current line is used up.
   *
   * @throws FormatException naming the first token too many
   */
  public void endOfLine() {
    if (hasToken()) {
      tokenStart = next;
      throw fault("nothing more was expected on this line, found '" + token("") + "'");
    }
  }

  /** A fault at the token read last. */
  @CheckReturnValue
  public FormatException fault(String what) {
    return new FormatException(source, Math.max(line, 1), tokenStart + 1, what);
  }
}
