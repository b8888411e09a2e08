package dev.couplet.sampling;

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
}
