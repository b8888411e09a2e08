package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.List;

/**
 * How a count becomes bits: each bit adds an amount to the lowest number of its range.
 * Implementations are immutable and give the same code for the same width every time.
 */
public interface CountEncoding {
  /** The name, for reports. */
  String name();

  /** The code of a whole number from 0 to a width of at least 1. */
  Code code(long width);

  /**
   * Powers of two, and a top amount cut so that no higher number exists: {@code floor(log2 width) +
   * 1} bits, amounts up to half the width.
   */
  static CountEncoding binary() {
    return BoundedDigits.UNBOUNDED;
  }

  /**
   * As in binary, but no amount above a bound: more bits, smaller coefficients. Source: Karimi and
   * Ronagh (2019), bounded-coefficient codes of whole numbers.
   *
   * @throws IllegalArgumentException unless the bound is at least 1
   */
  static CountEncoding bounded(long largest) {
    if (largest < 1) {
      throw new IllegalArgumentException(
          "the largest amount is " + largest + ", it must be 1 or more");
    }
    return new BoundedDigits(largest);
  }

  /** As many bits as the width, each worth 1, in any order: the smallest coefficients. */
  static CountEncoding unary() {
    return new Unary(false);
  }

  /**
   * As many bits as the width, ones before zeros, kept by a penalty: one pattern a number. Source:
   * Chancellor, "Domain wall encoding of discrete variables for quantum annealing and QAOA" (2019).
   */
  static CountEncoding domainWall() {
    return new Unary(true);
  }

  /**
   * A code over its own bits, numbered from 0.
   *
   * @param amounts what each bit adds, at least 1 each, the width together
   * @param penalty 0 where the bits stand for a number, 1 or more elsewhere; of degree 2 at most
   * @param form how the penalty was made, in words
   */
  record Code(List<Long> amounts, Polynomial penalty, String form) {
    /** Copies the amounts. */
    public Code {
      amounts = List.copyOf(amounts);
    }

    /** The pattern that a number is written with: bits from the last on, the first for ties. */
    boolean[] pattern(long number) {
      boolean[] set = new boolean[amounts.size()];
      long left = number;
      for (long amount :
          amounts.stream().distinct().sorted((a, b) -> Long.compare(b, a)).toList()) {
        for (int bit = 0; bit < set.length && left >= amount; bit++) {
          if (amounts.get(bit) == amount) {
            set[bit] = true;
            left -= amount;
          }
        }
      }
      return set;
    }
  }
}
