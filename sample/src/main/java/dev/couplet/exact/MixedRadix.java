package dev.couplet.exact;

/**
 * Walks all tuples of digits so that one digit moves by one a step.
 *
 * <p>Source: Knuth, The Art of Computer Programming 4A (2011), 7.2.1.1, Algorithm H (loopless
 * reflected mixed-radix Gray generation).
 */
final class MixedRadix {
  private final int[] radix;
  private final int[] digit;
  private final int[] direction;
  private final int[] focus;

  /** All digits at 0; every radix must be 2 or more. */
  MixedRadix(int[] radix) {
    this.radix = radix.clone();
    digit = new int[radix.length];
    direction = new int[radix.length];
    focus = new int[radix.length + 1];
    for (int d = 0; d < radix.length; d++) {
      direction[d] = 1;
      focus[d] = d;
    }
    focus[radix.length] = radix.length;
  }

  /** The value of a digit. */
  int digit(int d) {
    return digit[d];
  }

  /** Moves one digit and returns its number; -1 once every tuple has been seen. */
  int step() {
    int moved = focus[0];
    if (moved == radix.length) {
      return -1;
    }
    focus[0] = 0;
    digit[moved] += direction[moved];
    if (digit[moved] == 0 || digit[moved] == radix[moved] - 1) {
      direction[moved] = -direction[moved];
      focus[moved] = focus[moved + 1];
      focus[moved + 1] = moved + 1;
    }
    return moved;
  }
}
