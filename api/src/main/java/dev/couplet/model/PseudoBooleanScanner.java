package dev.couplet.model;

import dev.couplet.form.FormatException;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.Reader;
import java.util.function.Consumer;

/**
 * Splits an OPB text into numbers, literals, relations and the words {@code min:} and {@code ;},
 * with or without white space between them, and knows the place of each. Comment lines go to the
 * caller whole.
 */
final class PseudoBooleanScanner {
  private static final String SYMBOLS = ";<>=";

  private final String source;
  private final BufferedReader reader;
  private final Consumer<String> comments;
  private String text = "";
  private int line;
  private int next;
  private int tokenLine = 1;
  private int tokenStart;
  private String token = "";

  PseudoBooleanScanner(String source, Reader reader, Consumer<String> comments) {
    this.source = source;
    this.reader = reader instanceof BufferedReader buffered ? buffered : new BufferedReader(reader);
    this.comments = comments;
  }

  /** Moves to the next token; false at the end of the text, whose place then is the token's. */
  boolean advance() throws IOException {
    while (!seek()) {
      String read = reader.readLine();
      if (read == null) {
        token = "";
        tokenLine = Math.max(line, 1);
        tokenStart = text.length();
        return false;
      }
      text = read;
      line++;
      next = 0;
      if (read.stripLeading().startsWith("*")) {
        tokenLine = line;
        tokenStart = read.indexOf('*');
        token = read;
        next = read.length();
        comments.accept(read);
      }
    }
    tokenLine = line;
    tokenStart = next;
    next = end();
    token = text.substring(tokenStart, next);
    return true;
  }

  private boolean seek() {
    while (next < text.length() && Character.isWhitespace(text.charAt(next))) {
      next++;
    }
    return next < text.length();
  }

  /** Where the token that begins here ends. */
  private int end() {
    char first = text.charAt(next);
    if (SYMBOLS.indexOf(first) >= 0) {
      boolean two = (first == '<' || first == '>') && text.startsWith("=", next + 1);
      return next + (two ? 2 : 1);
    }
    int end = next + 1;
    while (end < text.length() && goesOn(text.charAt(end))) {
      end++;
      if (text.charAt(end - 1) == ':') {
        return end;
      }
    }
    return end;
  }

  private static boolean goesOn(char c) {
    return !Character.isWhitespace(c) && SYMBOLS.indexOf(c) < 0 && c != '~';
  }

  /** The current token; empty at the end of the text. */
  String token() {
    return token;
  }

  boolean is(String word) {
    return token.equals(word);
  }

  /** Whether the token is a literal, as far as its beginning tells. */
  boolean isLiteral() {
    return token.startsWith("x") || token.startsWith("~");
  }

  /** The current token for a message. */
  String shown() {
    String cut = token.length() > 40 ? token.substring(0, 40) + "..." : token;
    return token.isEmpty() ? "the end of the text" : "'" + cut + "'";
  }

  /** A fault at the current token. */
  FormatException fault(String what) {
    return at(tokenLine, tokenStart, what);
  }

  /** A fault at a place that was remembered. */
  FormatException at(int faultLine, int start, String what) {
    return new FormatException(source, faultLine, start + 1, what);
  }

  int tokenLine() {
    return tokenLine;
  }

  int tokenStart() {
    return tokenStart;
  }
}
