package dev.couplet.form;

import java.util.Arrays;

/**
 * A multilinear form of any degree in 0/1 variables: a sum of coefficients times products of
 * different variables, to be minimised.
 *
 * <p>Each product stands once, with a non-zero finite coefficient; terms are ordered by degree,
 * then by their variables. Since {@code x * x = x}, repeated variables of a product count once.
 *
 * <p>Immutable; two polynomials are equal if their terms are. Memory: 12 bytes a term and 4 a
 * factor.
 */
public final class Polynomial {
  private final int size;
  private final int[] start;
  private final int[] factor;
  private final double[] coefficient;

  Polynomial(int size, int[] start, int[] factor, double[] coefficient) {
    this.size = size;
    this.start = start;
    this.factor = factor;
    this.coefficient = coefficient;
  }

  /** A builder of polynomials in {@code size} variables. */
  @CheckReturnValue
  public static Builder builder(int size) {
    return new Builder(size);
  }

  /** The number of variables. */
  public int size() {
    return size;
  }

  /** The number of terms, the constant among them if it is not zero. */
  public int terms() {
    return coefficient.length;
  }

  /** The largest number of variables in a term; 0 for a constant. */
  public int degree() {
    return coefficient.length == 0 ? 0 : width(coefficient.length - 1);
  }

  /** The value at the state of zeros. */
  public double constant() {
    return coefficient.length > 0 && width(0) == 0 ? coefficient[0] : 0;
  }

  /** The coefficient of the product of the variables, 0 if there is none; O(log terms). */
  public double coefficient(int... variables) {
    for (int variable : variables) {
      Check.variable(variable, size);
    }
    int[] product = variables.clone();
    int width = TermOrder.canonical(product, 0, product.length);
    int low = 0;
    int high = coefficient.length - 1;
    while (low <= high) {
      int middle = (low + high) >>> 1;
      int order = TermOrder.compare(factor, start[middle], start[middle + 1], product, 0, width);
      if (order == 0) {
        return coefficient[middle];
      }
      if (order < 0) {
        low = middle + 1;
      } else {
        high = middle - 1;
      }
    }
    return 0;
  }

  /**
   * The same terms in {@code newSize} variables, which must be no fewer; O(1), the terms are
   * shared.
   */
  public Polynomial inVariables(int newSize) {
    if (newSize < size) {
      throw new IllegalArgumentException(
          "cannot bring a polynomial in " + size + " variables to " + newSize + ", which is fewer");
    }
    return new Polynomial(newSize, start, factor, coefficient);
  }

  /** Passes every term to the visitor, lowest degree first. */
  public void forEachTerm(TermVisitor visitor) {
    for (int t = 0; t < coefficient.length; t++) {
      visitor.visit(coefficient[t], Arrays.copyOfRange(factor, start[t], start[t + 1]));
    }
  }

  /**
   * The value of a state; linear in the size of the polynomial.
   *
   * @throws IllegalArgumentException if the state is of another size
   */
  @CheckReturnValue
  public double value(State state) {
    Check.stateSize(state, size);
    double sum = 0;
    for (int t = 0; t < coefficient.length; t++) {
      if (holds(t, state)) {
        sum += coefficient[t];
      }
    }
    return sum;
  }

  private boolean holds(int term, State state) {
    for (int k = start[term]; k < start[term + 1]; k++) {
      if (!state.get(factor[k])) {
        return false;
      }
    }
    return true;
  }

  /** This polynomial plus another in the same variables. */
  @CheckReturnValue
  public Polynomial plus(Polynomial other) {
    return builder(size).add(this, 1).add(other, 1).build();
  }

  /** This polynomial with every coefficient multiplied by {@code number}. */
  @CheckReturnValue
  public Polynomial times(double number) {
    return number == 1 ? this : builder(size).add(this, number).build();
  }

  /** The product with another polynomial in the same variables; all pairs of terms are formed. */
  @CheckReturnValue
  public Polynomial times(Polynomial other) {
    requireSameSize(other);
    Builder product = builder(size);
    forEachTerm(
        (left, ours) ->
            other.forEachTerm(
                (right, theirs) -> product.add(left * right, TermOrder.join(ours, theirs))));
    return product.build();
  }

  /**
   * The same form as a {@link Qubo}.
   *
   * @throws IllegalArgumentException if the degree is above 2
   */
  @CheckReturnValue
  public Qubo toQubo() {
    if (degree() > 2) {
      int[] longest = Arrays.copyOfRange(factor, start[terms() - 1], start[terms()]);
      throw new IllegalArgumentException(
          "the product of "
              + Arrays.toString(longest)
              + " has "
              + longest.length
              + " variables, a Qubo holds products of at most 2; reduce the degree first");
    }
    Qubo.Builder qubo = Qubo.builder(size);
    for (int t = 0; t < coefficient.length; t++) {
      switch (width(t)) {
        case 0 -> qubo.addConstant(coefficient[t]);
        case 1 -> qubo.addLinear(factor[start[t]], coefficient[t]);
        default -> qubo.addPair(factor[start[t]], factor[start[t] + 1], coefficient[t]);
      }
    }
    return qubo.build();
  }

  private int width(int term) {
    return start[term + 1] - start[term];
  }

  private void requireSameSize(Polynomial other) {
    if (other.size != size) {
      throw new IllegalArgumentException(
          "cannot combine polynomials in " + size + " and " + other.size + " variables");
    }
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof Polynomial other
        && size == other.size
        && Arrays.equals(start, other.start)
        && Arrays.equals(factor, other.factor)
        && Arrays.equals(coefficient, other.coefficient);
  }

  @Override
  public int hashCode() {
    return 31 * (31 * Arrays.hashCode(factor) + Arrays.hashCode(coefficient)) + size;
  }

  @Override
  public String toString() {
    return "Polynomial(" + size + " variables, " + terms() + " terms, degree " + degree() + ")";
  }

  /** Receives the terms of a polynomial, one at a time, in the polynomial's order. */
  @FunctionalInterface
  public interface TermVisitor {
    /**
     * Receives one term.
     *
     * @param coefficient what the product is multiplied by
     * @param variables the variables of the product, ascending, a new array; none for the constant
     */
    void visit(double coefficient, int[] variables);
  }

  /** Collects the terms of a {@link Polynomial}; terms with the same product add up. */
  public static final class Builder {
    private final int size;
    private int[] start = new int[16];
    private int[] factor = new int[32];
    private double[] coefficient = new double[16];
    private int terms;

    private Builder(int size) {
      Check.size(size);
      this.size = size;
    }

    /** Adds {@code value} times the product of the variables; no variables add to the constant. */
    public Builder add(double value, int... variables) {
      if (!Double.isFinite(value)) {
        Check.finite("the coefficient of the product of " + Arrays.toString(variables), value);
      }
      reserve(variables.length);
      int from = start[terms];
      int end = from;
      for (int variable : variables) {
        factor[end++] = Check.variable(variable, size);
      }
      coefficient[terms++] = value;
      start[terms] = TermOrder.canonical(factor, from, end);
      return this;
    }

    /**
     * Adds {@code number} times a polynomial.
     *
     * @throws IllegalArgumentException if it has more variables than this builder
     */
    public Builder add(Polynomial polynomial, double number) {
      if (polynomial.size > size) {
        throw new IllegalArgumentException(
            "cannot add a polynomial in "
                + polynomial.size
                + " variables to one in "
                + size
                + " variables");
      }
      polynomial.forEachTerm((value, variables) -> add(number * value, variables));
      return this;
    }

    /** Makes room for one more term of so many variables. */
    private void reserve(int width) {
      int starts = Check.capacity(start.length, terms + 2L);
      if (starts > start.length) {
        start = Arrays.copyOf(start, starts);
        coefficient = Arrays.copyOf(coefficient, starts);
      }
      int factors = Check.capacity(factor.length, (long) start[terms] + width);
      if (factors > factor.length) {
        factor = Arrays.copyOf(factor, factors);
      }
    }

    /**
     * The polynomial; the builder can go on and build again.
     *
     * @throws IllegalArgumentException if a sum of coefficients overflows
     */
    @CheckReturnValue
    public Polynomial build() {
      int[] order = TermOrder.of(start, factor, terms, size);
      int[] ownStart = new int[terms + 1];
      int[] ownFactor = new int[start[terms]];
      double[] own = new double[terms];
      int kept = 0;
      for (int p = 0; p < terms; ) {
        int first = order[p];
        double sum = 0;
        while (p < terms && TermOrder.sameProduct(start, factor, first, order[p])) {
          sum += coefficient[order[p++]];
        }
        if (!Double.isFinite(sum)) {
          int[] product = Arrays.copyOfRange(factor, start[first], start[first + 1]);
          Check.finite("the sum of the coefficients of " + Arrays.toString(product), sum);
        }
        if (sum != 0) {
          int width = start[first + 1] - start[first];
          System.arraycopy(factor, start[first], ownFactor, ownStart[kept], width);
          own[kept++] = sum;
          ownStart[kept] = ownStart[kept - 1] + width;
        }
      }
      return new Polynomial(
          size,
          Arrays.copyOf(ownStart, kept + 1),
          Arrays.copyOf(ownFactor, ownStart[kept]),
          Arrays.copyOf(own, kept));
    }
  }
}
