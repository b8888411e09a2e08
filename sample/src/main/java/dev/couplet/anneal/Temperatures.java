package dev.couplet.anneal;

import dev.couplet.kernel.Adjacency;
import dev.couplet.kernel.Pace;
import dev.couplet.sampling.Structure;
import java.util.Arrays;

/**
 * Hot and cold temperatures that suit a form.
 *
 * <p>The scale of a variable is the root mean square of its energy change over uniformly random
 * states. Hot is twice the largest scale: there nearly every flip is accepted. Cold is a twentieth
 * of the scale that all but a tenth of the variables exceed, or half of the coefficient that all
 * but a tenth exceed, whichever is lower: there a local minimum holds.
 */
record Temperatures(double hot, double cold) {
  private static final int SAMPLE = 1 << 12;

  /** The temperatures of a form; those of a part of it if the pace ends. */
  static Temperatures of(Adjacency rows, Structure structure, Pace pace) {
    double[] scale = scales(rows, pace);
    double[] coefficient = Coefficients.sample(rows, structure, SAMPLE);
    if (scale.length == 0 || coefficient.length == 0) {
      return new Temperatures(1, 1);
    }
    double hot = limited(2 * scale[scale.length - 1]);
    double cold = Math.min(tenth(scale) / 20, tenth(coefficient) / 2);
    return new Temperatures(hot, Math.min(hot, limited(cold)));
  }

  /** Within a range whose inverses are ordinary numbers. */
  private static double limited(double temperature) {
    return Math.max(0x1p-1000, Math.min(0x1p1000, temperature));
  }

  private static double tenth(double[] sorted) {
    return sorted[sorted.length / 10];
  }

  /** The scales above zero, ascending; a spread sample of the variables if there are many. */
  private static double[] scales(Adjacency rows, Pace pace) {
    int n = rows.size();
    int step = 1 + n / SAMPLE;
    double[] scale = new double[(n + step - 1) / step];
    int count = 0;
    for (int i = 0; i < n && !pace.after(rows.degree(i)); i += step) {
      double value = scale(rows, i);
      if (value > 0) {
        scale[count++] = value;
      }
    }
    Arrays.sort(scale, 0, count);
    return Arrays.copyOf(scale, count);
  }

  /**
   * With x uniform, the change of energy has the square mean of (a + sum b / 2) and the variance
   * sum b^2 / 4. All is taken relative to the row's magnitude, so that no square overflows.
   */
  private static double scale(Adjacency rows, int i) {
    double unit = rows.magnitude(i);
    if (unit == 0) {
      return 0;
    }
    double mean = rows.linear()[i] / unit;
    double square = 0;
    for (int k = rows.start()[i]; k < rows.start()[i + 1]; k++) {
      double half = rows.weight()[k] / unit / 2;
      mean += half;
      square += half * half;
    }
    return unit * Math.sqrt(mean * mean + square);
  }
}
