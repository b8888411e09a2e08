package dev.couplet.bound;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;

/**
 * A method that proves that no state of a form has an energy below some number.
 *
 * <p>Implementations are immutable and thread-safe. The number is never wrong by rounding: it is at
 * most the lowest of the energies that {@link Qubo#value} computes. Work on it can be ended at any
 * time; more work never gives a lower number.
 */
@FunctionalInterface
public interface Bound {
  /**
   * A number that no energy of the form is below; negative infinity if nothing better is found.
   *
   * <p>Of the effort, the time limit and the number of sweeps (rounds of improvement) count; the
   * method's own settings decide what is left open.
   */
  double below(Qubo form, Run run);

  /** A number that no energy of the form is below, with the method's own amount of work. */
  default double below(Qubo form) {
    return below(form, Run.of(Effort.draws(1)));
  }
}
