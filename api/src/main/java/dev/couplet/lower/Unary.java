package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.Collections;

/** Bits worth 1 each; if ordered, a penalty counts the zeros that a one follows. */
record Unary(boolean ordered) implements CountEncoding {
  private static final int MOST = 1 << 16;

  @Override
  public String name() {
    return ordered ? "domain wall" : "unary";
  }

  @Override
  public Code code(long width) {
    if (width > MOST) {
      throw new IllegalArgumentException(
          "a count of a range of width "
              + width
              + " would take as many bits in the code '"
              + name()
              + "'; leave it in binary");
    }
    int bits = (int) width;
    Polynomial.Builder walls = Polynomial.builder(bits);
    for (int bit = 1; bit < bits && ordered; bit++) {
      walls.add(1, bit).add(-1, bit - 1, bit);
    }
    String form = ordered ? "walls too many" : "nothing, every pattern is a number";
    return new Code(Collections.nCopies(bits, 1L), walls.build(), form);
  }
}
