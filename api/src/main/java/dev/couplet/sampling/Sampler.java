package dev.couplet.sampling;

import dev.couplet.form.Qubo;

/**
 * A method that looks for states of low energy.
 *
 * <p>Implementations are immutable and thread-safe: one instance serves many threads. They keep the
 * promises listed in the package's documentation.
 */
@FunctionalInterface
public interface Sampler {
  /**
   * Draws states of a form.
   *
   * <p>The result holds at least one draw, also when the run is stopped before it begins.
   *
   * @throws IllegalArgumentException if the run does not suit the form or the method, naming what
   *     is wrong and how to mend it
   */
  Draws sample(Qubo form, Run run);

  /** Draws states of a form with the given effort, unwatched. */
  default Draws sample(Qubo form, Effort effort) {
    return sample(form, Run.of(effort));
  }
}
