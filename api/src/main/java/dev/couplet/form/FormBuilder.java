package dev.couplet.form;

/**
 * Collects the coefficients of a quadratic form. Repeated entries add up, in the order of arrival;
 * sums that come to zero are left out. Building takes time linear in the number of variables and
 * entries.
 *
 * <p>Memory: 16 bytes an entry, and 12 more while the form is built; entries that do not arrive in
 * order take those twice, but no longer the 16.
 */
abstract class FormBuilder<B extends FormBuilder<B>> {
  private final int size;
  private final double[] linear;
  private double constant;
  private final PairLog pairs;
  private boolean rounding;

  FormBuilder(int size) {
    Check.size(size);
    this.size = size;
    this.linear = new double[size];
    this.pairs = new PairLog(size);
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
    pairs.add(Math.min(i, j), Math.max(i, j), value);
    return self();
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
    scaled.forEachPair(pairs::add);
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

  Quadratic finish() {
    PairLog.Rows rows = pairs.compress();
    Quadratic form = Quadratic.of(constant, linear.clone(), rows.start, rows.column, rows.value);
    if (!rounding && form.magnitude() >= Check.EXACT_LIMIT && form.unitExponent() >= 0) {
      throw new IllegalArgumentException(
          "the integer coefficients add up to "
              + form.magnitude()
              + ", energies are exact below 2^51; divide the coefficients by a common factor, or"
              + " call allowRounding()");
    }
    return form;
  }
}
