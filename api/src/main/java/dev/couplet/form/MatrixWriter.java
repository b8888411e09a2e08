package dev.couplet.form;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.math.MathContext;

/** Writes one Matrix Market text, some kilobytes at a time. */
final class MatrixWriter {
  private static final int CHUNK = 1 << 14;

  private final Appendable out;
  private final StringBuilder text = new StringBuilder(CHUNK + 100);

  private MatrixWriter(Appendable out) {
    this.out = out;
  }

  static void write(Qubo form, Appendable out) throws IOException {
    requireHalves(form);
    try {
      new MatrixWriter(out).write(form);
    } catch (UncheckedIOException failed) {
      throw failed.getCause();
    }
  }

  static void requireHalves(Qubo form) {
    form.forEachPair(
        (i, j, value) -> {
          if (value / 2 * 2 != value) {
            throw new IllegalArgumentException(
                "half the coefficient " + value + " of pair (" + i + ", " + j + ") is no double");
          }
        });
  }

  private void write(Qubo form) {
    int diagonal = 0;
    for (int i = 0; i < form.size(); i++) {
      diagonal += form.linear(i) != 0 ? 1 : 0;
    }
    text.append(MatrixMarket.HEADER).append('\n');
    if (form.constant() != 0) {
      text.append(MatrixMarket.CONSTANT).append(' ').append(number(form.constant())).append('\n');
    }
    text.append(form.size()).append(' ').append(form.size()).append(' ');
    text.append((long) diagonal + form.pairs()).append('\n');
    for (int i = 0; i < form.size(); i++) {
      if (form.linear(i) != 0) {
        entry(i, i, form.linear(i));
      }
    }
    form.forEachPair((i, j, value) -> entry(j, i, value / 2));
    flush();
  }

  private void entry(int row, int column, double value) {
    text.append(row + 1).append(' ').append(column + 1).append(' ');
    text.append(number(value)).append('\n');
    if (text.length() >= CHUNK) {
      flush();
    }
  }

  private void flush() {
    try {
      out.append(text);
    } catch (IOException failed) {
      throw new UncheckedIOException(failed);
    }
    text.setLength(0);
  }

  /** Seventeen digits bring every double back, and are the same on every JDK. */
  private static String number(double value) {
    if (value == Math.rint(value) && Math.abs(value) < 0x1p53) {
      return Long.toString((long) value);
    }
    return new BigDecimal(value).round(new MathContext(17)).toString();
  }
}
