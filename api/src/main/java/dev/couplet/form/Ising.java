package dev.couplet.form;

import dev.couplet.form.Qubo.PairVisitor;

/**
 * A quadratic form in spins, each +1 or -1, to be minimised: {@code constant + sum h_i s_i +
 * sum_{i<j} J_ij s_i s_j}.
 *
 * <p>Each pair stands once; a negative pair aligns its two spins. A state holds the spins by {@code
 * s = 1 - 2x}: a 0 is +1, a 1 is -1. Coefficients are finite; those that are zero are not stored.
 *
 * <p>Immutable; two forms are equal if their coefficients are. Memory: 12 bytes a pair and 12 a
 * variable.
 */
@CheckReturnValue
public final class Ising {
  private final Quadratic form;

  Ising(Quadratic form) {
    this.form = form;
  }

  /** A builder of forms in {@code size} variables. */
  public static Builder builder(int size) {
    return new Builder(size);
  }

  /** The number of variables n. */
  public int size() {
    return form.size();
  }

  /** The number of pairs m with a non-zero coefficient. */
  public int pairs() {
    return form.value.length;
  }

  /** The part of every energy that depends on no spin. */
  public double constant() {
    return form.constant;
  }

  /** The coefficient of spin {@code i}: the field on it. */
  public double linear(int i) {
    return form.linear(i);
  }

  /** The coefficient of {@code s_i s_j}, 0 if there is none; O(log m). */
  public double pair(int i, int j) {
    return form.pair(i, j);
  }

  /** Passes every pair with a non-zero coefficient to the visitor. */
  public void forEachPair(PairVisitor visitor) {
    form.forEachPair(visitor);
  }

  /**
   * The energy of a state; O(n + m).
   *
   * @throws IllegalArgumentException if the state is of another size
   */
  public double value(State state) {
    Check.stateSize(state, size());
    double sum = form.constant;
    for (int i = 0; i < form.linear.length; i++) {
      double field = form.linear[i];
      for (int k = form.rowStart[i]; k < form.rowStart[i + 1]; k++) {
        field += state.spin(form.column[k]) * form.value[k];
      }
      sum += state.spin(i) * field;
    }
    return sum;
  }

  /** Whether every energy of this form is computed without rounding. */
  public boolean exact() {
    return form.exact();
  }

  /** The sum of the magnitudes of all coefficients: no energy is larger in magnitude. */
  public double magnitude() {
    return form.magnitude();
  }

  /**
   * This form with every coefficient multiplied by {@code factor}.
   *
   * @throws IllegalArgumentException if the factor or a product is not finite
   */
  public Ising times(double factor) {
    return new Ising(Conversion.times(form, factor));
  }

  /**
   * The same energies over 0/1 variables, {@code s = 1 - 2x}; O(n + m). Exact for integer
   * coefficients within the builder's limit, and for the spin form of such a {@link Qubo}.
   *
   * @throws IllegalArgumentException if a sum overflows
   */
  public Qubo toQubo() {
    return new Qubo(Conversion.toBits(form));
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof Ising other && form.equals(other.form);
  }

  @Override
  public int hashCode() {
    return form.hashCode();
  }

  @Override
  public String toString() {
    return form.describe("Ising");
  }

  /** Collects the coefficients of a {@link Ising}; entries for the same place add up. */
  public static final class Builder extends FormBuilder<Builder> {
    private Builder(int size) {
      super(size);
    }

    @Override
    Builder self() {
      return this;
    }

    /**
     * Adds a form, every coefficient multiplied by {@code factor}.
     *
     * @throws IllegalArgumentException if it has more variables than this builder, or a product is
     *     not finite
     */
    public Builder add(Ising other, double factor) {
      return add(other.form, factor);
    }

    /**
     * The form; the builder can go on and build again.
     *
     * @throws IllegalArgumentException if a sum overflows, or integer coefficients are too large
     *     for exact energies and {@link #allowRounding()} was not called
     */
    @CheckReturnValue
    public Ising build() {
      return new Ising(finish());
    }
  }
}
