package dev.couplet.anneal;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.OptionalDouble;

/** The lowest state that any replica of a draw has had after a sweep. */
final class Lowest {
  private final Qubo form;
  private final double target;
  private State state;
  private double energy = Double.POSITIVE_INFINITY;
  private boolean reached;

  /**
   * Nothing seen yet.
   *
   * @param begin what to give as long as nothing has been seen
   * @param target an energy that is low enough, if there is one
   */
  Lowest(Qubo form, State begin, OptionalDouble target) {
    this.form = form;
    this.state = begin;
    this.target = target.orElse(Double.NEGATIVE_INFINITY);
  }

  /** Keeps the replica's state if it is lower than all before. */
  void offer(Replica replica) {
    if (replica.energy() < energy) {
      energy = replica.energy();
      state = replica.fields().state();
      // Whether it is low enough is for the form to say, once it comes near.
      reached |= energy <= target + slack() && form.value(state) <= target;
    }
  }

  private double slack() {
    return form.exact() ? 0 : 0x1p-30 * form.magnitude();
  }

  /** Whether any state has been seen. */
  boolean any() {
    return energy < Double.POSITIVE_INFINITY;
  }

  /** Whether a state has met the target. */
  boolean reached() {
    return reached;
  }

  /** The lowest state. */
  State state() {
    return state;
  }
}
