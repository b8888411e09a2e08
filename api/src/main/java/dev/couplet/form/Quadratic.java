package dev.couplet.form;

import java.util.Arrays;

/**
 * The coefficients of a quadratic form: a constant, one linear coefficient a variable, and each
 * non-zero pair once.
 *
 * <p>Pairs lie in compressed rows: those of row i are {@code column[k], value[k]} for {@code
 * rowStart[i] <= k < rowStart[i + 1]}, with i &lt; column[k] ascending: 12 bytes a pair and 4 a
 * variable.
 */
final class Quadratic {
  final double constant;
  final double[] linear;
  final int[] rowStart;
  final int[] column;
  final double[] value;

  Quadratic(double constant, double[] linear, int[] rowStart, int[] column, double[] value) {
    this.constant = constant;
    this.linear = linear;
    this.rowStart = rowStart;
    this.column = column;
    this.value = value;
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

  /** The sum of the magnitudes of all coefficients, the constant among them. */
  double magnitude() {
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
    return sum == 0 || sum < Math.scalb(1.0, Math.min(53 + unitExponent(), 1023));
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

  /** Without the negative zero, which would tell equal forms apart. */
  static double normal(double number) {
    return number == 0 ? 0.0 : number;
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
