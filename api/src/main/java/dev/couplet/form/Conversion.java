package dev.couplet.form;

/**
 * Passes coefficients from 0/1 variables to spins and back, by {@code x = (1 - s) / 2}. Both
 * directions keep the pairs where they are. All factors are powers of two: what rounds are sums.
 */
final class Conversion {
  private Conversion() {}

  /**
   * {@code x_i} is {@code 1/2 - s_i/2}, {@code x_i x_j} is {@code (1 - s_i - s_j + s_i s_j) / 4}.
   */
  static Quadratic toSpins(Quadratic bits) {
    double[] field = new double[bits.size()];
    double constant = bits.constant;
    for (int i = 0; i < field.length; i++) {
      field[i] = -bits.linear[i] / 2;
      constant += bits.linear[i] / 2;
    }
    for (int i = 0; i < field.length; i++) {
      for (int k = bits.rowStart[i]; k < bits.rowStart[i + 1]; k++) {
        double quarter = bits.value[k] / 4;
        constant += quarter;
        field[i] -= quarter;
        field[bits.column[k]] -= quarter;
      }
    }
    return bits.rescaled(constant, field, 0.25);
  }

  /** {@code s_i} is {@code 1 - 2 x_i}, {@code s_i s_j} is {@code 1 - 2 x_i - 2 x_j + 4 x_i x_j}. */
  static Quadratic toBits(Quadratic spins) {
    double[] linear = new double[spins.size()];
    double constant = spins.constant;
    for (int i = 0; i < linear.length; i++) {
      linear[i] = -2 * spins.linear[i];
      constant += spins.linear[i];
    }
    for (int i = 0; i < linear.length; i++) {
      for (int k = spins.rowStart[i]; k < spins.rowStart[i + 1]; k++) {
        double coupling = spins.value[k];
        constant += coupling;
        linear[i] -= 2 * coupling;
        linear[spins.column[k]] -= 2 * coupling;
      }
    }
    return spins.rescaled(constant, linear, 4);
  }

  static Quadratic times(Quadratic form, double factor) {
    Check.finite("the factor", factor);
    double[] linear = new double[form.size()];
    for (int i = 0; i < linear.length; i++) {
      linear[i] = form.linear[i] * factor;
    }
    return form.rescaled(form.constant * factor, linear, factor);
  }
}
