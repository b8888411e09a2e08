package dev.couplet.form;

import java.io.IOException;
import java.io.Reader;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Locale;

/**
 * Reads and writes a {@link Qubo} as a symmetric matrix A in Matrix Market coordinate text: the
 * form is {@code constant + x'Ax}, to be minimised.
 *
 * <p>The text holds the lower triangle. An off-diagonal entry stands for two places of the matrix,
 * so it is half the coefficient of its pair; a diagonal entry is a linear coefficient. The format
 * has no place for a constant: it is written as the comment line {@code %couplet constant VALUE},
 * which other readers skip.
 *
 * <p>Writing and reading again gives an equal form. Source of the format: Boisvert, Pozo and
 * Remington, "The Matrix Market exchange formats: initial design" (1996), from memory.
 */
public final class MatrixMarket {
  private static final String HEADER = "%%MatrixMarket matrix coordinate real symmetric";
  private static final String CONSTANT = "%couplet constant";

  private MatrixMarket() {}

  /**
   * Reads a form; linear in the length of the text.
   *
   * @param source the name of the text in error messages
   * @throws FormatException with line and column of the first fault
   * @throws IOException if the reader fails
   */
  @CheckReturnValue
  public static Qubo read(String source, Reader reader) throws IOException {
    TokenReader text = new TokenReader(source, reader);
    readHeader(text);
    double constant = readComments(text);
    int size = text.integer("the number of rows", 0, Integer.MAX_VALUE - 8);
    int columns = text.integer("the number of columns", 0, Integer.MAX_VALUE - 8);
    if (columns != size) {
      throw text.fault("the matrix is " + size + " by " + columns + ", it must be square");
    }
    long places = (long) size * (size + 1) / 2;
    int entries =
        text.integer("the number of entries", 0, (int) Math.min(places, Integer.MAX_VALUE - 8));
    text.endOfLine();
    return readEntries(text, size, entries, constant);
  }

  private static void readHeader(TokenReader text) throws IOException {
    text.nextLine();
    String[] words = {"%%matrixmarket", "matrix", "coordinate", "real", "symmetric"};
    for (String expected : words) {
      String word = text.token("the header '" + HEADER + "'").toLowerCase(Locale.ROOT);
      boolean whole = expected.equals("real") && word.equals("integer");
      if (!word.equals(expected) && !whole) {
        throw text.fault("the header says '" + word + "' where '" + expected + "' is needed");
      }
    }
    text.endOfLine();
  }

  private static double readComments(TokenReader text) throws IOException {
    double constant = 0;
    while (true) {
      if (!text.nextLine()) {
        throw text.fault("the text ends before the line of sizes");
      }
      if (text.line().startsWith(CONSTANT)) {
        text.token("%couplet");
        text.token("constant");
        constant = text.number("the constant");
        text.endOfLine();
      } else if (!text.line().startsWith("%") && text.hasToken()) {
        return constant;
      }
    }
  }

  private static Qubo readEntries(TokenReader text, int size, int entries, double constant)
      throws IOException {
    Qubo.Builder form = Qubo.builder(size).allowRounding().addConstant(constant);
    for (int e = 0; e < entries; e++) {
      text.seekToken("entry " + (e + 1) + " of " + entries);
      int row = text.integer("the row", 1, size);
      int column = text.integer("the column", 1, size);
      if (column > row) {
        throw text.fault(
            "entry ("
                + row
                + ", "
                + column
                + ") lies above the diagonal; a symmetric matrix is written by its lower triangle");
      }
      double value = text.number("the value");
      if (!Double.isFinite(2 * value)) {
        throw text.fault("the value " + value + " stands for two places and overflows");
      }
      text.endOfLine();
      if (row == column) {
        form.addLinear(row - 1, value);
      } else {
        form.addPair(row - 1, column - 1, 2 * value);
      }
    }
    while (text.nextLine()) {
      text.endOfLine();
    }
    return form.build();
  }

  /**
   * Writes a form; linear in n + m.
   *
   * @throws IllegalArgumentException if half a coefficient is not a double (a pair below 2^-1073)
   * @throws IOException if the output fails
   */
  public static void write(Qubo form, Appendable out) throws IOException {
    StringBuilder text = new StringBuilder();
    int diagonal = 0;
    for (int i = 0; i < form.size(); i++) {
      diagonal += form.linear(i) != 0 ? 1 : 0;
    }
    text.append(HEADER).append('\n');
    if (form.constant() != 0) {
      text.append(CONSTANT).append(' ').append(number(form.constant())).append('\n');
    }
    text.append(form.size()).append(' ').append(form.size()).append(' ');
    text.append(diagonal + form.pairs()).append('\n');
    for (int i = 0; i < form.size(); i++) {
      if (form.linear(i) != 0) {
        entry(text, i, i, form.linear(i));
      }
    }
    out.append(text);
    text.setLength(0);
    form.forEachPair((i, j, value) -> entry(text, j, i, half(i, j, value)));
    out.append(text);
  }

  private static double half(int i, int j, double value) {
    double half = value / 2;
    if (half * 2 != value) {
      throw new IllegalArgumentException(
          "half the coefficient " + value + " of pair (" + i + ", " + j + ") is not a double");
    }
    return half;
  }

  private static void entry(StringBuilder text, int row, int column, double value) {
    text.append(row + 1).append(' ').append(column + 1).append(' ');
    text.append(number(value)).append('\n');
  }

  /** Seventeen digits bring every double back, and are the same on every JDK. */
  private static String number(double value) {
    if (value == Math.rint(value) && Math.abs(value) < 0x1p53) {
      return Long.toString((long) value);
    }
    return new BigDecimal(value).round(new MathContext(17)).toString();
  }
}
