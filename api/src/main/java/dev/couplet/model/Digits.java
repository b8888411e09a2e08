package dev.couplet.model;

import java.util.ArrayList;
import java.util.List;

/**
 * The binary digits that a {@link Count} has for literals: powers of two, and a top digit cut so
 * that all of them together are exactly the width of the range. Every pattern is a value; a value
 * may have several patterns, of which the one that takes the largest digits first is its own.
 */
final class Digits {
  private Digits() {}

  /** The amounts of the digits, ascending but for the last. */
  static long[] of(long width) {
    List<Long> amounts = new ArrayList<>();
    long held = 0;
    for (long power = 1; held < width; power *= 2) {
      long amount = Math.min(power, width - held);
      amounts.add(amount);
      held += amount;
    }
    return amounts.stream().mapToLong(Long::longValue).toArray();
  }

  /** Whether each digit is set in the pattern of a value from 0 to the width. */
  static boolean[] pattern(long value, long[] amounts) {
    boolean[] set = new boolean[amounts.length];
    long left = value;
    for (int k = amounts.length - 1; k >= 0; k--) {
      set[k] = left >= amounts[k];
      left -= set[k] ? amounts[k] : 0;
    }
    return set;
  }
}
