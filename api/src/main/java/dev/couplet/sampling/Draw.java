package dev.couplet.sampling;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;

/**
 * One state that a sampler found.
 *
 * @param state the state
 * @param energy its energy under the form that was sampled
 * @param multiplicity how many draws ended in it
 */
public record Draw(State state, double energy, int multiplicity) {
  /** Refuses a multiplicity below 1. */
  public Draw {
    Check.positive("the multiplicity", multiplicity);
  }

  /** One draw that ended in a state, its energy computed here from the form; O(n + m). */
  public static Draw of(Qubo form, State state) {
    return new Draw(state, form.value(state), 1);
  }
}
