package dev.couplet.audit;

/**
 * A quantity over bit patterns that is kept up to date while single bits flip.
 *
 * <p>Between two calls of {@link #reset} rounding errors add up, if the numbers round at all; the
 * walk resets often enough to bound them.
 */
interface Flips {
  /** Begins afresh at a pattern. */
  void reset(long pattern);

  /** One bit has flipped; {@code pattern} is the new pattern. */
  void flip(int bit, long pattern);
}
