package dev.couplet.form;

import java.util.Arrays;

/**
 * Collects the coefficients of a quadratic form. Repeated entries add up, in the order of arrival;
 * sums that come to zero are left out. Building takes time linear in the number of variables and
 * entries.
 *
 * <p>Memory: 16 bytes an entry, half as much again while it grows, and the form that is built;
 * entries that do not arrive in order take 8 more while they are sorted.
 */
abstract class FormBuilder<B extends FormBuilder<B>> {
  private final int size;
  private final double[] linear;
  private double constant;
  private int[] rows = new int[16];
  private int[] columns = new int[16];
  private double[] values = new double[16];
  private int count;
  private boolean ordered = true;
  private boolean rounding;

  FormBuilder(int size) {
    Check.size(size);
    this.size = size;
    this.linear = new double[size];
  }

  abstract B self();

  /** Adds to the constant. */
  public B addConstant(double value) {
    constant += Check.finite("the constant", value);
    return self();
  }

  /** Adds to the coefficient of variable {@code i}. */
  public B addLinear(int i, double value) {
    Check.variable(i, size);
    if (!Double.isFinite(value)) {
      Check.finite("the linear coefficient of variable " + i, value);
    }
    linear[i] += value;
    return self();
  }

  /** Adds to the coefficient of the product of two different variables, in either order. */
  public B addPair(int i, int j, double value) {
    Check.variable(i, size);
    Check.variable(j, size);
    if (i == j) {
      throw new IllegalArgumentException(
          "pair (" + i + ", " + j + ") names one variable twice; add it to the linear part");
    }
    if (!Double.isFinite(value)) {
      Check.finite("the coefficient of pair (" + i + ", " + j + ")", value);
    }
    append(Math.min(i, j), Math.max(i, j), value);
    return self();
  }

  private void append(int row, int column, double value) {
    if (count == rows.length) {
      grow();
    }
    if (ordered && count > 0) {
      int last = rows[count - 1];
      ordered = last < row || (last == row && columns[count - 1] <= column);
    }
    rows[count] = row;
    columns[count] = column;
    values[count++] = value;
  }

  B add(Quadratic other, double factor) {
    Check.finite("the factor", factor);
    if (other.size() > size) {
      throw new IllegalArgumentException(
          "cannot add a form in "
              + other.size()
              + " variables to one in "
              + size
              + "; give the builder at least as many");
    }
    Quadratic scaled = Conversion.times(other, factor);
    constant += scaled.constant;
    for (int i = 0; i < scaled.size(); i++) {
      linear[i] += scaled.linear[i];
    }
    scaled.forEachPair(this::append);
    return self();
  }

  /**
   * Accepts integer coefficients whose magnitudes add up to 2^51 or more: energies of the form are
   * then rounded like those of any form with real coefficients.
   */
  public B allowRounding() {
    rounding = true;
    return self();
  }

  private void grow() {
    int capacity = Check.capacity(rows.length, count + 1L);
    rows = Arrays.copyOf(rows, capacity);
    columns = Arrays.copyOf(columns, capacity);
    values = Arrays.copyOf(values, capacity);
  }

  Quadratic finish() {
    merge();
    int[] rowStart = new int[size + 1];
    for (int p = 0; p < count; p++) {
      rowStart[rows[p] + 1]++;
    }
    for (int i = 0; i < size; i++) {
      rowStart[i + 1] += rowStart[i];
    }
    int[] column = Arrays.copyOf(columns, count);
    double[] value = Arrays.copyOf(values, count);
    Quadratic form = Quadratic.of(constant, linear.clone(), rowStart, column, value);
    if (!rounding && form.magnitude() >= Check.EXACT_LIMIT && form.unitExponent() >= 0) {
      throw new IllegalArgumentException(
          "the integer coefficients add up to "
              + form.magnitude()
              + ", energies are exact below 2^51; divide the coefficients by a common factor, or"
              + " call allowRounding()");
    }
    return form;
  }

  /** Brings the entries in order, adds up those of one pair, and drops sums of zero. */
  private void merge() {
    if (!ordered) {
      PairOrder.sort(rows, columns, values, count, size);
      ordered = true;
    }
    int kept = 0;
    for (int p = 0; p < count; ) {
      int row = rows[p];
      int column = columns[p];
      double sum = 0;
      while (p < count && rows[p] == row && columns[p] == column) {
        sum += values[p++];
      }
      if (sum != 0) {
        rows[kept] = row;
        columns[kept] = column;
        values[kept++] = sum;
      }
    }
    count = kept;
  }
}
