package dev.couplet.form;

import java.io.IOException;
import java.io.Reader;
import java.util.Locale;

/** Reads one Matrix Market text. */
final class MatrixReader {
  private static final String[] WORDS = {
    "%%matrixmarket", "matrix", "coordinate", "real", "symmetric"
  };
  private static final int LARGEST = Integer.MAX_VALUE - 8;
  private static final int BYTES_A_VARIABLE = 12;

  private final TokenReader text;
  private double constant;
  private boolean constantRead;

  MatrixReader(String source, Reader reader) {
    this.text = new TokenReader(source, reader);
  }

  Qubo read() throws IOException {
    readHeader();
    readComments();
    int size = text.integer("the number of rows", 0, LARGEST);
    int columns = text.integer("the number of columns", 0, LARGEST);
    if (columns != size) {
      throw text.fault("the matrix is " + size + " by " + columns + ", it must be square");
    }
    requireRoomFor(size);
    long places = (long) size * (size + 1) / 2;
    int entries = text.integer("the number of entries", 0, (int) Math.min(places, LARGEST));
    text.endOfLine();
    Qubo.Builder form = Qubo.builder(size).allowRounding().addConstant(constant);
    for (int e = 1; e <= entries; e++) {
      text.seekToken("entry " + e + " of " + entries);
      readEntry(form, size);
    }
    while (text.nextLine()) {
      text.endOfLine();
    }
    return built(form);
  }

  /** A size that is a slip of the pen is pointed at, before it exhausts the memory. */
  private void requireRoomFor(int size) {
    long heap = Runtime.getRuntime().maxMemory();
    if (size > heap / BYTES_A_VARIABLE) {
      throw text.fault(
          "a form in "
              + size
              + " variables takes more than the "
              + (heap >> 20)
              + " MiB of memory that this program may use");
    }
  }

  private void readHeader() throws IOException {
    text.nextLine();
    for (String expected : WORDS) {
      String word = text.token("the header '" + MatrixMarket.HEADER + "'");
      String lower = word.toLowerCase(Locale.ROOT);
      boolean whole = expected.equals("real") && lower.equals("integer");
      if (!lower.equals(expected) && !whole) {
        throw text.fault(
            "the header says '"
                + word
                + "' where '"
                + expected
                + "' is needed: '"
                + MatrixMarket.HEADER
                + "'");
      }
    }
    text.endOfLine();
  }

  private void readComments() throws IOException {
    while (true) {
      if (!text.nextLine()) {
        throw text.fault("the text ends before the line of sizes");
      }
      String line = text.line();
      if (line.equals(MatrixMarket.CONSTANT) || line.startsWith(MatrixMarket.CONSTANT + " ")) {
        readConstant();
      } else if (!line.startsWith("%") && text.hasToken()) {
        return;
      }
    }
  }

  private void readConstant() {
    text.token("%couplet");
    text.token("constant");
    if (constantRead) {
      throw text.fault("the constant stands for the second time; leave one of the lines out");
    }
    constant = text.number("the constant");
    constantRead = true;
    text.endOfLine();
  }

  private void readEntry(Qubo.Builder form, int size) {
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
    if (row != column && !Double.isFinite(2 * value)) {
      throw text.fault("the value " + value + " stands for two places and overflows");
    }
    text.endOfLine();
    if (row == column) {
      form.addLinear(row - 1, value);
    } else {
      form.addPair(row - 1, column - 1, 2 * value);
    }
  }

  private Qubo built(Qubo.Builder form) {
    try {
      return form.build();
    } catch (IllegalArgumentException overflow) {
      throw text.fault(String.valueOf(overflow.getMessage()));
    }
  }
}
