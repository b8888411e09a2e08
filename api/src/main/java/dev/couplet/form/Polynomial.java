package dev.couplet.form;

import java.util.Arrays;
import org.jspecify.annotations.Nullable;

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

  /** The sum of the magnitudes of all coefficients: no value is larger in magnitude. */
  public double magnitude() {
    double sum = 0;
    for (double one : coefficient) {
      sum += Math.abs(one);
    }
    return sum;
  }

  /** The constant and all negative coefficients added up: no value is lower. */
  public double lowest() {
    double sum = constant();
    for (int t = constantTerms(); t < coefficient.length; t++) {
      sum += Math.min(0, coefficient[t]);
    }
    return sum;
  }

  /** The constant and all positive coefficients added up: no value is higher. */
  public double highest() {
    double sum = constant();
    for (int t = constantTerms(); t < coefficient.length; t++) {
      sum += Math.max(0, coefficient[t]);
    }
    return sum;
  }

  /** How many terms have no variable: 0 or 1. */
  private int constantTerms() {
    return coefficient.length > 0 && width(0) == 0 ? 1 : 0;
  }

  /** Whether every coefficient is a whole number. */
  public boolean whole() {
    for (double one : coefficient) {
      if (one != Math.rint(one)) {
        return false;
      }
    }
    return true;
  }

  /**
   * This polynomial with every coefficient multiplied by {@code number}; linear in its terms, whose
   * places are shared.
   *
   * @throws IllegalArgumentException if a product is not finite
   */
  @CheckReturnValue
  public Polynomial times(double number) {
    if (number == 1) {
      return this;
    }
    double[] scaled = new double[coefficient.length];
    boolean zeros = false;
    for (int t = 0; t < scaled.length; t++) {
      scaled[t] = number * coefficient[t];
      zeros |= scaled[t] == 0;
      if (!Double.isFinite(scaled[t])) {
        int[] product = Arrays.copyOfRange(factor, start[t], start[t + 1]);
        Check.finite("the coefficient of the product of " + Arrays.toString(product), scaled[t]);
      }
    }
    return zeros
        ? builder(size).add(this, number).build()
        : new Polynomial(size, start, factor, scaled);
  }

  /** The product with another polynomial in the same variables; all pairs of terms are formed. */
  @CheckReturnValue
  public Polynomial times(Polynomial other) {
    requireSameSize(other);
    if (degree() <= 1 && equals(other)) {
      return LinearSquare.of(this);
    }
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
    return Qubo.builder(size).add(this, 1).build();
  }

  /** Adds every term, multiplied, to a form in at least as many variables. */
  void addTo(Qubo.Builder form, double number) {
    requireQuadratic();
    for (int t = 0; t < coefficient.length; t++) {
      double amount = number * coefficient[t];
      int first = start[t];
      switch (start[t + 1] - first) {
        case 0 -> form.addConstant(amount);
        case 1 -> form.addLinear(factor[first], amount);
        default -> form.addPair(factor[first], factor[first + 1], amount);
      }
    }
  }

  private void requireQuadratic() {
    if (degree() > 2) {
      int[] longest = Arrays.copyOfRange(factor, start[terms() - 1], start[terms()]);
      throw new IllegalArgumentException(
          "the product of "
              + Arrays.toString(longest)
              + " has "
              + longest.length
              + " variables, a Qubo holds products of at most 2; reduce the degree first");
    }
  }

  /** The coefficient of a term by its place in the order. */
  double coefficientAt(int term) {
    return coefficient[term];
  }

  /** The first variable of a term by its place in the order. */
  int variableAt(int term) {
    return factor[start[term]];
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
    private boolean ordered = true;

    private Builder(int size) {
      Check.size(size);
      this.size = size;
    }

    /** Adds {@code value} times the product of the variables; no variables add to the constant. */
    public Builder add(double value, int... variables) {
      if (!Double.isFinite(value)) {
        Check.finite("the coefficient of the product of " + Arrays.toString(variables), value);
      }
      reserve(1, variables.length);
      int from = start[terms];
      int end = from;
      for (int variable : variables) {
        factor[end++] = Check.variable(variable, size);
      }
      coefficient[terms++] = value;
      start[terms] = TermOrder.canonical(factor, from, end);
      ordered &= terms == 1 || TermOrder.compare(start, factor, terms - 2, terms - 1) <= 0;
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
      if (polynomial.terms() > 0) {
        append(polynomial, number);
      }
      return this;
    }

    private void append(Polynomial polynomial, double number) {
      int more = polynomial.terms();
      int factors = polynomial.start[more];
      reserve(more, factors);
      int from = start[terms];
      System.arraycopy(polynomial.factor, 0, factor, from, factors);
      for (int t = 0; t < more; t++) {
        double value = number * polynomial.coefficient[t];
        int end = from + polynomial.start[t + 1];
        if (!Double.isFinite(value)) {
          int[] product = Arrays.copyOfRange(factor, start[terms], end);
          Check.finite("the coefficient of the product of " + Arrays.toString(product), value);
        }
        coefficient[terms++] = value;
        start[terms] = end;
      }
      int first = terms - more;
      ordered &= first == 0 || TermOrder.compare(start, factor, first - 1, first) <= 0;
    }

    /** Makes room for all products of up to two of so many variables. */
    void reserveProducts(int variables) {
      long pairs = (long) variables * (variables - 1) / 2;
      Check.entries(2 * pairs + variables);
      reserve((int) pairs + variables + 1, (int) (2 * pairs) + variables);
    }

    /** Makes room for more terms of so many variables together. */
    private void reserve(int more, int width) {
      int starts = Check.capacity(start.length, terms + 1L + more);
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
      return ordered ? summed(null) : summed(TermOrder.of(start, factor, terms, size));
    }

    /** Adds up equal products, which are neighbours in the order; without one, as they lie. */
    private Polynomial summed(int @Nullable [] order) {
      int[] ownStart = new int[terms + 1];
      int[] ownFactor = new int[start[terms]];
      double[] own = new double[terms];
      int kept = 0;
      for (int p = 0; p < terms; ) {
        int first = at(order, p);
        double sum = 0;
        while (p < terms && TermOrder.same(start, factor, first, at(order, p))) {
          sum += coefficient[at(order, p++)];
        }
        if (!Double.isFinite(sum)) {
          int[] product = Arrays.copyOfRange(factor, start[first], start[first + 1]);
          Check.finite("the sum of the coefficients of " + Arrays.toString(product), sum);
        }
        if (sum != 0) {
          int to = ownStart[kept];
          for (int k = start[first]; k < start[first + 1]; k++) {
            ownFactor[to++] = factor[k];
          }
          own[kept++] = sum;
          ownStart[kept] = to;
        }
      }
      return new Polynomial(
          size, cut(ownStart, kept + 1), cut(ownFactor, ownStart[kept]), cut(own, kept));
    }

    private static int at(int @Nullable [] order, int position) {
      return order == null ? position : order[position];
    }

    private static int[] cut(int[] array, int length) {
      return array.length == length ? array : Arrays.copyOf(array, length);
    }

    private static double[] cut(double[] array, int length) {
      return array.length == length ? array : Arrays.copyOf(array, length);
    }
  }
}
