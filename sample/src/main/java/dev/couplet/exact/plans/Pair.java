package dev.couplet.exact.plans;

/**
 * What the values of two variables cost together, in fine units, 0 or more; {@link #NEVER} where
 * they exclude each other.
 */
final class Pair {
  /** Two values that cannot both be taken; larger than any cost. */
  static final long NEVER = 1L << 60;

  private final int one;
  private final int other;
  private final long[] costs;
  private final int shift;

  /**
   * A pair of variables.
   *
   * @param one the variable of the rows
   * @param other the variable of the columns
   * @param costs the table, row by row; not copied
   * @param shift where the shifts of this pair begin: one a row, then one a column
   */
  Pair(int one, int other, long[] costs, int shift) {
    this.one = one;
    this.other = other;
    this.costs = costs;
    this.shift = shift;
  }

  /** The variable of the rows. */
  int one() {
    return one;
  }

  /** The variable of the columns. */
  int other() {
    return other;
  }

  /** The table, row by row; not to be changed. */
  long[] costs() {
    return costs;
  }

  /** Where the shifts of this pair begin. */
  int shift() {
    return shift;
  }
}
