package dev.couplet.bound;

import dev.couplet.sampling.Vigil;
import java.util.Arrays;
import java.util.SplittableRandom;

/**
 * The semidefinite relaxation of a quadratic form in spins: each spin becomes a unit vector, a
 * product of spins an inner product. Minimised by turning one vector after the other to where it is
 * best (Wang, Chang and Kolter, The mixing method, 2017), which converges to the optimum if the
 * vectors have more than {@code sqrt(2 n)} dimensions.
 */
final class UnitVectors {
  private final int size;
  private final Vigil vigil;
  private final int rank;
  private final double[][] vector;

  /** The length of each vector's field: what is gained by its being where it is. */
  final double[] pull;

  UnitVectors(int size, Vigil vigil) {
    this.size = size;
    this.vigil = vigil;
    this.rank = (int) Math.ceil(Math.sqrt(2.0 * size)) + 1;
    this.vector = new double[size][rank];
    this.pull = new double[size];
    SplittableRandom random = new SplittableRandom(size);
    for (double[] own : vector) {
      for (int k = 0; k < rank; k++) {
        own[k] = random.nextDouble() - 0.5;
      }
      normalise(own, length(own), 1);
    }
  }

  private static double length(double[] own) {
    double sum = 0;
    for (double value : own) {
      sum += value * value;
    }
    return Math.sqrt(sum);
  }

  private static void normalise(double[] own, double length, double sign) {
    for (int k = 0; k < own.length; k++) {
      own[k] *= sign / length;
    }
  }

  /**
   * Turns every vector once, unless the run ends; returns the energy, the sum over all ordered
   * pairs of the matrix times the inner product, as it was met on the way.
   */
  double sweep(double[][] matrix) {
    double[] field = new double[rank];
    double sum = 0;
    int lookEvery = 1 + Vigil.STEPS / 2 / (size * rank);
    for (int i = 0; i < size; i++) {
      if (i % lookEvery == 0 && vigil.over()) {
        break;
      }
      double length = field(matrix[i], i, field);
      pull[i] = length;
      sum -= length;
      if (length > 0) {
        double[] own = vector[i];
        for (int k = 0; k < rank; k++) {
          own[k] = -field[k] / length;
        }
      }
    }
    return sum;
  }

  /** Computes every vector's pull where the vectors are now. */
  void measure(double[][] matrix) {
    double[] field = new double[rank];
    for (int i = 0; i < size; i++) {
      pull[i] = field(matrix[i], i, field);
    }
  }

  private double field(double[] row, int i, double[] field) {
    Arrays.fill(field, 0);
    for (int j = 0; j < size; j++) {
      double weight = row[j];
      if (j != i && weight != 0) {
        double[] other = vector[j];
        for (int k = 0; k < rank; k++) {
          field[k] += weight * other[k];
        }
      }
    }
    return length(field);
  }

  /** The inner product of two vectors. */
  double product(int i, int j) {
    double[] a = vector[i];
    double[] b = vector[j];
    double sum = 0;
    for (int k = 0; k < rank; k++) {
      sum += a[k] * b[k];
    }
    return sum;
  }
}
