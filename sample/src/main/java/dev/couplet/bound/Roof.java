package dev.couplet.bound;

import dev.couplet.form.State;

/**
 * What the roof dual of a form says: a bound, and values of bits.
 *
 * <p>A bit's value is strong if every minimum has it; all weak values together (the strong ones
 * among them) are those of at least one minimum. For forms whose energies are rounded, "minimum"
 * means: up to {@link Rounding#ofEnergy} and the rounding of the coefficients to some 2^-58 of
 * their sum. Immutable.
 */
public final class Roof {
  private final double bound;
  private final double slack;
  private final State strong;
  private final State weak;
  private final State values;

  private Roof(double bound, double slack, State strong, State weak, State values) {
    this.bound = bound;
    this.slack = slack;
    this.strong = strong;
    this.weak = weak;
    this.values = values;
  }

  static Roof unknown(int size, double bound) {
    State none = State.zeros(size);
    return new Roof(bound, 0, none, none, none);
  }

  /** Reads the values off a network with a maximum flow. */
  static Roof of(Implications network, double bound, double slack) {
    int size = network.nodes / 2 - 1;
    boolean[] strong = new boolean[size];
    boolean[] weak = new boolean[size];
    boolean[] values = new boolean[size];
    int[] component = Components.of(network);
    for (int i = 0; i < size; i++) {
      boolean zero = network.distance[2 * i] != Implications.UNREACHED;
      boolean one = network.distance[2 * i + 1] != Implications.UNREACHED;
      strong[i] = zero || one;
      weak[i] = strong[i] || component[2 * i] != component[2 * i + 1];
      // Implications lead from higher to lower components: the lower literal is safe to be true.
      values[i] = strong[i] ? one : weak[i] && component[2 * i] < component[2 * i + 1];
    }
    return new Roof(bound, slack, State.of(strong), State.of(weak), State.of(values));
  }

  /** A number that no energy of the form is below. */
  public double bound() {
    return bound;
  }

  /** By how much rounding may have moved the minimum: 0 if the form's energies are exact. */
  public double slack() {
    return slack;
  }

  /** The bits whose value is the same in every minimum: those that are 1 here. */
  public State strong() {
    return strong;
  }

  /** The bits that one minimum has with all the {@link #values} at once: those that are 1 here. */
  public State weak() {
    return weak;
  }

  /** The values of the bits that are fixed; 0 elsewhere. */
  public State values() {
    return values;
  }
}
