package dev.couplet.search;

import dev.couplet.sampling.Effort;

/** Iterations that a draw has left. */
final class Budget {
  private long left;

  private Budget(long iterations) {
    this.left = iterations;
  }

  /** As many iterations as the effort has sweeps, without limit if it names none. */
  static Budget of(Effort effort) {
    return new Budget(effort.sweeps().isPresent() ? effort.sweeps().getAsInt() : Long.MAX_VALUE);
  }

  /** Whether nothing is left. */
  boolean spent() {
    return left <= 0;
  }

  /** Takes one iteration, if there is one left. */
  boolean take() {
    return left-- > 0;
  }
}
