package dev.couplet.form;

import dev.couplet.form.Qubo.PairVisitor;
import java.util.Arrays;
import java.util.function.BooleanSupplier;

/**
 * The coefficients of a quadratic form: a constant, one linear coefficient a variable, and each
 * non-zero pair once.
 *
 * <p>Pairs lie in compressed rows: those of row i are {@code column[k], value[k]} for {@code
 * rowStart[i] <= k < rowStart[i + 1]}, with i &lt; column[k] ascending: 12 bytes a pair and 4 a
 * variable. Nobody writes to the arrays; forms with the same pairs may share the places.
 */
final class Quadratic {
  private static final int LOOK_EVERY = 1 << 16;

  final double constant;
  final double[] linear;
  final int[] rowStart;
  final int[] column;
  final double[] value;
  private final double magnitude;
  private final int unitExponent;

  private Quadratic(
      double constant, double[] linear, int[] rowStart, int[] column, double[] value) {
    this.constant = constant;
    this.linear = linear;
    this.rowStart = rowStart;
    this.column = column;
    this.value = value;
    this.magnitude = sumOfMagnitudes();
    this.unitExponent = leastUnitExponent();
  }

  /**
   * Takes over the arrays. Negative zeros, which would tell equal forms apart, are made positive.
   *
   * @throws IllegalArgumentException naming the first coefficient that is not finite, or if no
   *     double holds the sum of all magnitudes, and so an energy
   */
  static Quadratic of(
      double constant, double[] linear, int[] rowStart, int[] column, double[] value) {
    for (int i = 0; i < linear.length; i++) {
      if (!Double.isFinite(linear[i])) {
        Check.finite("the linear coefficient of variable " + i, linear[i]);
      }
      linear[i] += 0.0;
    }
    Quadratic form =
        new Quadratic(
            Check.finite("the constant", constant) + 0.0, linear, rowStart, column, value);
    if (!Double.isFinite(form.magnitude())) {
      form.forEachPair(Quadratic::requireFinite);
      throw new IllegalArgumentException(
          "the magnitudes of the coefficients add up to more than a double holds; divide all"
              + " coefficients by a common factor");
    }
    return form;
  }

  private static void requireFinite(int i, int j, double value) {
    if (!Double.isFinite(value)) {
      Check.finite("the coefficient of pair (" + i + ", " + j + ")", value);
    }
  }

  /**
   * A form in the same pairs, each coefficient multiplied; those that come to zero are left out.
   */
  Quadratic rescaled(double newConstant, double[] newLinear, double factor) {
    double[] scaled = new double[value.length];
    int kept = 0;
    for (int k = 0; k < scaled.length; k++) {
      scaled[k] = value[k] * factor;
      kept += scaled[k] == 0 ? 0 : 1;
    }
    return kept == scaled.length
        ? of(newConstant, newLinear, rowStart, column, scaled)
        : withoutZeros(newConstant, newLinear, scaled, kept);
  }

  private Quadratic withoutZeros(
      double newConstant, double[] newLinear, double[] scaled, int kept) {
    int[] start = new int[rowStart.length];
    int[] place = new int[kept];
    double[] own = new double[kept];
    int next = 0;
    for (int i = 0; i < linear.length; i++) {
      for (int k = rowStart[i]; k < rowStart[i + 1]; k++) {
        if (scaled[k] != 0) {
          place[next] = column[k];
          own[next++] = scaled[k];
        }
      }
      start[i + 1] = next;
    }
    return of(newConstant, newLinear, start, place, own);
  }

  int size() {
    return linear.length;
  }

  double linear(int i) {
    return linear[Check.variable(i, size())];
  }

  double pair(int i, int j) {
    Check.variable(i, size());
    Check.variable(j, size());
    if (i == j) {
      throw new IllegalArgumentException(
          "pair (" + i + ", " + j + ") names one variable twice; its coefficient is linear");
    }
    int row = Math.min(i, j);
    int found = Arrays.binarySearch(column, rowStart[row], rowStart[row + 1], Math.max(i, j));
    return found < 0 ? 0 : value[found];
  }

  void forEachPair(PairVisitor visitor) {
    for (int i = 0; i < linear.length; i++) {
      for (int k = rowStart[i]; k < rowStart[i + 1]; k++) {
        visitor.visit(i, column[k], value[k]);
      }
    }
  }

  /**
   * Passes pairs on until {@code over} says so, which is asked at most 2^16 pairs and rows apart;
   * whether all were passed.
   */
  boolean forEachPairUntil(BooleanSupplier over, PairVisitor visitor) {
    int left = LOOK_EVERY;
    for (int i = 0; i < linear.length; i++) {
      for (int k = rowStart[i]; k < rowStart[i + 1]; k++) {
        visitor.visit(i, column[k], value[k]);
        if (--left <= 0) {
          left = LOOK_EVERY;
          if (over.getAsBoolean()) {
            return false;
          }
        }
      }
      left--;
    }
    return true;
  }

  /** The sum of the magnitudes of all coefficients, the constant among them. */
  double magnitude() {
    return magnitude;
  }

  private double sumOfMagnitudes() {
    double sum = Math.abs(constant);
    for (double a : linear) {
      sum += Math.abs(a);
    }
    for (double b : value) {
      sum += Math.abs(b);
    }
    return sum;
  }

  /** The exponent of the coarsest power of two that divides every coefficient. */
  int unitExponent() {
    return unitExponent;
  }

  private int leastUnitExponent() {
    int exponent = unitExponent(constant);
    for (double a : linear) {
      exponent = Math.min(exponent, unitExponent(a));
    }
    for (double b : value) {
      exponent = Math.min(exponent, unitExponent(b));
    }
    return exponent;
  }

  /** Whether every partial sum of coefficients is held by a double without rounding. */
  boolean exact() {
    double sum = magnitude();
    return sum == 0 || sum < Math.scalb(1.0, Math.min(53 + unitExponent(), Double.MAX_EXPONENT));
  }

  private static int unitExponent(double number) {
    if (number == 0) {
      return Double.MAX_EXPONENT;
    }
    long bits = Double.doubleToRawLongBits(number);
    int exponent = Math.max(Math.getExponent(number), Double.MIN_EXPONENT) - 52;
    long mantissa = bits & 0xfffffffffffffL;
    boolean normal = Math.getExponent(number) >= Double.MIN_EXPONENT;
    return exponent + Long.numberOfTrailingZeros(normal ? mantissa | 1L << 52 : mantissa);
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof Quadratic other
        && constant == other.constant
        && Arrays.equals(linear, other.linear)
        && Arrays.equals(rowStart, other.rowStart)
        && Arrays.equals(column, other.column)
        && Arrays.equals(value, other.value);
  }

  @Override
  public int hashCode() {
    int hash = Double.hashCode(constant);
    hash = 31 * hash + Arrays.hashCode(linear);
    hash = 31 * hash + Arrays.hashCode(column);
    return 31 * hash + Arrays.hashCode(value);
  }

  String describe(String name) {
    return name
        + "("
        + size()
        + " variables, "
        + value.length
        + " pairs, constant "
        + constant
        + ")";
  }
}
