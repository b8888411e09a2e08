package dev.couplet.form;

import java.util.Arrays;

/**
 * Collects the coefficients of a quadratic form. Repeated entries add up, in the order of arrival;
 * sums that come to zero are left out. Building takes time and memory linear in the number of
 * variables and entries.
 */
abstract class FormBuilder<B extends FormBuilder<B>> {
  private final int size;
  private final double[] linear;
  private double constant;
  private int[] rows = new int[16];
  private int[] columns = new int[16];
  private double[] values = new double[16];
  private int count;
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
    if (count == rows.length) {
      grow();
    }
    rows[count] = Math.min(i, j);
    columns[count] = Math.max(i, j);
    values[count++] = value;
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
    int[] order = PairOrder.of(rows, columns, count, size);
    int[] rowStart = new int[size + 1];
    int[] column = new int[count];
    double[] value = new double[count];
    int kept = 0;
    for (int p = 0; p < count; ) {
      int row = rows[order[p]];
      int col = columns[order[p]];
      double sum = 0;
      while (p < count && rows[order[p]] == row && columns[order[p]] == col) {
        sum += values[order[p++]];
      }
      if (sum != 0) {
        Check.finite("the coefficient of pair (" + row + ", " + col + ")", sum);
        column[kept] = col;
        value[kept++] = sum;
        rowStart[row + 1]++;
      }
    }
    for (int i = 0; i < size; i++) {
      rowStart[i + 1] += rowStart[i];
    }
    return checked(rowStart, trim(column, kept), trim(value, kept));
  }

  private Quadratic checked(int[] rowStart, int[] column, double[] value) {
    double[] own = new double[size];
    for (int i = 0; i < size; i++) {
      own[i] = Quadratic.normal(Check.finite("the linear coefficient of variable " + i, linear[i]));
    }
    double offset = Quadratic.normal(Check.finite("the constant", constant));
    Quadratic form = new Quadratic(offset, own, rowStart, column, value);
    if (!rounding && form.magnitude() >= Check.EXACT_LIMIT && form.unitExponent() >= 0) {
      throw new IllegalArgumentException(
          "the integer coefficients add up to "
              + form.magnitude()
              + ", energies are exact below 2^51; divide the coefficients by a common factor, or"
              + " call allowRounding()");
    }
    return form;
  }

  private static int[] trim(int[] array, int length) {
    return array.length == length ? array : Arrays.copyOf(array, length);
  }

  private static double[] trim(double[] array, int length) {
    return array.length == length ? array : Arrays.copyOf(array, length);
  }
}
