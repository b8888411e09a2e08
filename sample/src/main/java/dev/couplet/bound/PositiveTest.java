package dev.couplet.bound;

import dev.couplet.sampling.Vigil;

/**
 * How far from positive semidefinite a symmetric matrix is, proved by Cholesky factors.
 *
 * <p>If the factorisation of {@code A} runs to its end in double arithmetic, the smallest
 * eigenvalue of A is at least {@code -g / (1 - g)} times its trace, g = (n + 1) u / (1 - (n + 1)
 * u), u = 2^-53 (Rump, Verification of positive definiteness, 2006). Twice that is taken, which
 * covers the rounding of the shifted diagonal.
 */
final class PositiveTest {
  private static final int HALVINGS = 6;

  private final int size;
  private final double[][] factor;

  private final Vigil vigil;
  private boolean cut;

  PositiveTest(int size, Vigil vigil) {
    this.size = size;
    this.vigil = vigil;
    this.factor = new double[size][size];
  }

  /**
   * A number d, 0 or more, such that {@code A + d I} has no negative eigenvalue; infinite if the
   * run ends before one is found.
   *
   * @param matrix the lower triangle of A without its diagonal
   */
  double shift(double[][] matrix, double[] diagonal) {
    double scale = Double.MIN_NORMAL;
    for (double value : diagonal) {
      scale = Math.max(scale, Math.abs(value));
    }
    double fails = 0;
    double passes = scale * 0x1p-40;
    while (!factorise(matrix, diagonal, passes)) {
      if (cut) {
        return Double.POSITIVE_INFINITY;
      }
      fails = passes;
      passes *= 4;
    }
    for (int k = 0; k < HALVINGS && fails > 0; k++) {
      double middle = (fails + passes) / 2;
      if (factorise(matrix, diagonal, middle)) {
        passes = middle;
      } else {
        fails = middle;
      }
    }
    return passes + rounding(diagonal, passes);
  }

  private double rounding(double[] diagonal, double shift) {
    double trace = 0;
    for (double value : diagonal) {
      trace += Math.abs(value) + shift;
    }
    return 2 * (size + 4) * 0x1p-52 * trace;
  }

  private boolean factorise(double[][] matrix, double[] diagonal, double shift) {
    int work = 0;
    for (int i = 0; i < size; i++) {
      work += i * i;
      if (work > Vigil.STEPS / 2) {
        work = 0;
        cut = cut || vigil.over();
      }
      if (cut) {
        return false;
      }
      double[] row = factor[i];
      double rest = diagonal[i] + shift;
      for (int j = 0; j < i; j++) {
        double[] other = factor[j];
        double sum = matrix[i][j];
        for (int k = 0; k < j; k++) {
          sum -= row[k] * other[k];
        }
        row[j] = sum / other[j];
        rest -= row[j] * row[j];
      }
      if (!(rest > 0)) {
        return false;
      }
      row[i] = Math.sqrt(rest);
    }
    return true;
  }
}
