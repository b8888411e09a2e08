package dev.couplet.form;

import java.util.function.BooleanSupplier;

/**
 * A quadratic form in 0/1 variables, to be minimised: {@code constant + sum a_i x_i + sum_{i<j}
 * b_ij x_i x_j}.
 *
 * <p>Each pair stands once and multiplies its product once. Coefficients are finite; those that are
 * zero are not stored. If all are integers, or multiples of one power of two, and {@link #exact()}
 * holds, every energy is exact.
 *
 * <p>Immutable; two forms are equal if their coefficients are. Memory: 12 bytes a pair and 12 a
 * variable.
 */
@CheckReturnValue
public final class Qubo {
  /** Receives the pairs of a quadratic form, one at a time, rows ascending, then columns. */
  @FunctionalInterface
  public interface PairVisitor {
    /**
     * Receives one pair.
     *
     * @param i the lower variable
     * @param j the higher variable
     * @param value the coefficient of their product
     */
    void visit(int i, int j, double value);
  }

  private final Quadratic form;

  Qubo(Quadratic form) {
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

  /** The energy of the state of zeros. */
  public double constant() {
    return form.constant;
  }

  /** The coefficient of variable {@code i}. */
  public double linear(int i) {
    return form.linear(i);
  }

  /** The coefficient of {@code x_i x_j}, 0 if there is none; O(log m). */
  public double pair(int i, int j) {
    return form.pair(i, j);
  }

  /** Passes every pair with a non-zero coefficient to the visitor. */
  public void forEachPair(PairVisitor visitor) {
    form.forEachPair(visitor);
  }

  /**
   * Passes pairs on until {@code over} says so, which is asked after at most 2^16 variables and
   * pairs: for work that has a deadline.
   *
   * @return whether all pairs were passed
   */
  public boolean forEachPairUntil(BooleanSupplier over, PairVisitor visitor) {
    return form.forEachPairUntil(over, visitor);
  }

  /**
   * The energy of a state; O(n + m).
   *
   * @throws IllegalArgumentException if the state is of another size
   */
  public double value(State state) {
    Check.stateSize(state, size());
    long[] words = state.words();
    double sum = form.constant;
    for (int w = 0; w < words.length; w++) {
      for (long ones = words[w]; ones != 0; ones &= ones - 1) {
        int i = (w << 6) + Long.numberOfTrailingZeros(ones);
        sum = plusPairs(sum + form.linear[i], i, words);
      }
    }
    return sum;
  }

  /** Without a branch that guesses at the other bit; a product with 0 leaves the sum as it is. */
  private double plusPairs(double before, int i, long[] words) {
    int[] column = form.column;
    double[] value = form.value;
    double sum = before;
    for (int k = form.rowStart[i], end = form.rowStart[i + 1]; k < end; k++) {
      sum += value[k] * (words[column[k] >> 6] >>> column[k] & 1);
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
  public Qubo times(double factor) {
    return new Qubo(Conversion.times(form, factor));
  }

  /**
   * The same energies over spins, {@code x = (1 - s) / 2}; O(n + m). Spin coefficients are quarters
   * of sums of these; exact for integer coefficients within the builder's limit.
   *
   * @throws IllegalArgumentException if a sum overflows
   */
  public Ising toIsing() {
    return new Ising(Conversion.toSpins(form));
  }

  /** The same form as a polynomial of degree at most 2. */
  public Polynomial toPolynomial() {
    Polynomial.Builder polynomial = Polynomial.builder(size()).add(constant());
    for (int i = 0; i < size(); i++) {
      polynomial.add(linear(i), i);
    }
    forEachPair((i, j, value) -> polynomial.add(value, i, j));
    return polynomial.build();
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof Qubo other && form.equals(other.form);
  }

  @Override
  public int hashCode() {
    return form.hashCode();
  }

  @Override
  public String toString() {
    return form.describe("Qubo");
  }

  /** Collects the coefficients of a {@link Qubo}; entries for the same place add up. */
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
    public Builder add(Qubo other, double factor) {
      return add(other.form, factor);
    }

    /**
     * Adds a polynomial, every coefficient multiplied by {@code factor}; as adding its terms one by
     * one, in its order.
     *
     * @throws IllegalArgumentException if it has more variables than this builder, its degree is
     *     above 2, or a product is not finite
     */
    public Builder add(Polynomial polynomial, double factor) {
      polynomial.addTo(this, factor);
      return this;
    }

    /**
     * The form; the builder can go on and build again.
     *
     * @throws IllegalArgumentException if a sum overflows, or integer coefficients are too large
     *     for exact energies and {@link #allowRounding()} was not called
     */
    @CheckReturnValue
    public Qubo build() {
      return new Qubo(finish());
    }
  }
}
