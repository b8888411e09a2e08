package dev.couplet.exact;

import dev.couplet.form.State;
import java.util.Optional;

/**
 * What a search of a form below a cutoff came to.
 *
 * @param state the best state found whose energy is below the cutoff, if there is one
 * @param energy its energy; infinite if there is none
 * @param bound a number that no energy of the form is below
 */
record Outcome(Optional<State> state, double energy, double bound) {
  static Outcome found(State state, double energy, double bound) {
    return new Outcome(Optional.of(state), energy, Math.min(energy, bound));
  }

  static Outcome none(double bound) {
    return new Outcome(Optional.empty(), Double.POSITIVE_INFINITY, bound);
  }
}
