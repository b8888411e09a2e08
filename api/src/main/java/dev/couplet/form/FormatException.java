package dev.couplet.form;

/** A text is not in the format it should be in; says where and what to mend. */
public final class FormatException extends IllegalArgumentException {
  private static final long serialVersionUID = 1L;

  private final String source;
  private final int line;
  private final int column;

  /**
   * The fault at one place of a text.
   *
   * @param source the file's name, or another name for the text
   * @param line counted from 1
   * @param column counted from 1
   * @param what what is wrong and how to mend it
   */
  public FormatException(String source, int line, int column, String what) {
    super(source + ":" + line + ":" + column + ": " + what);
    this.source = source;
    this.line = line;
    this.column = column;
  }

  /** The file's name, or another name for the text. */
  public String source() {
    return source;
  }

  /** The line at fault, counted from 1. */
  public int line() {
    return line;
  }

  /** The column at fault, counted from 1. */
  public int column() {
    return column;
  }
}
