package dev.couplet.reduce;

import dev.couplet.form.Qubo;
import java.util.Arrays;

/**
 * A form that can be changed: bits leave it, coefficients add up.
 *
 * <p>Bit i has the neighbours {@code neighbour[i][k]}, k below {@code degree[i]}, in no particular
 * but a deterministic order. Every addition that rounds adds its error, computed without error
 * (Knuth, The Art of Computer Programming 2, section 4.2.2), to {@link #slack}.
 */
final class Graph {
  final int size;
  final double[] linear;
  final int[] degree;
  final int[][] neighbour;
  final double[][] weight;
  final boolean[] gone;
  double constant;
  double slack;

  Graph(Qubo form) {
    size = form.size();
    linear = new double[size];
    degree = new int[size];
    gone = new boolean[size];
    neighbour = new int[size][];
    weight = new double[size][];
    constant = form.constant();
    form.forEachPair(
        (i, j, value) -> {
          degree[i]++;
          degree[j]++;
        });
    for (int i = 0; i < size; i++) {
      linear[i] = form.linear(i);
      neighbour[i] = new int[degree[i]];
      weight[i] = new double[degree[i]];
      degree[i] = 0;
    }
    form.forEachPair(
        (i, j, value) -> {
          append(i, j, value);
          append(j, i, value);
        });
  }

  /** The sum, its rounding error noted. */
  double sum(double a, double b) {
    double sum = a + b;
    double part = sum - a;
    slack += Math.abs((a - (sum - part)) + (b - part));
    return sum;
  }

  void addConstant(double value) {
    constant = sum(constant, value);
  }

  void addLinear(int i, double value) {
    linear[i] = sum(linear[i], value);
  }

  void addPair(int i, int j, double value) {
    int at = find(i, j);
    if (at < 0) {
      if (value != 0) {
        append(i, j, value);
        append(j, i, value);
      }
      return;
    }
    double sum = sum(weight[i][at], value);
    if (sum == 0) {
      removeAt(i, at);
      removeAt(j, find(j, i));
    } else {
      weight[i][at] = sum;
      weight[j][find(j, i)] = sum;
    }
  }

  /** Takes a bit out with all its pairs. */
  void remove(int i) {
    for (int k = 0; k < degree[i]; k++) {
      int j = neighbour[i][k];
      removeAt(j, find(j, i));
    }
    degree[i] = 0;
    neighbour[i] = new int[0];
    weight[i] = new double[0];
    gone[i] = true;
  }

  /** Takes a bit out at a value. */
  void fix(int i, boolean value) {
    if (value) {
      addConstant(linear[i]);
      for (int k = 0; k < degree[i]; k++) {
        addLinear(neighbour[i][k], weight[i][k]);
      }
    }
    remove(i);
  }

  private int find(int i, int j) {
    int[] row = neighbour[i];
    for (int k = 0; k < degree[i]; k++) {
      if (row[k] == j) {
        return k;
      }
    }
    return -1;
  }

  private void append(int i, int j, double value) {
    int at = degree[i]++;
    if (at == neighbour[i].length) {
      neighbour[i] = Arrays.copyOf(neighbour[i], 2 * at + 2);
      weight[i] = Arrays.copyOf(weight[i], 2 * at + 2);
    }
    neighbour[i][at] = j;
    weight[i][at] = value;
  }

  private void removeAt(int i, int at) {
    int last = --degree[i];
    neighbour[i][at] = neighbour[i][last];
    weight[i][at] = weight[i][last];
  }

  /** The bits that are left, ascending. */
  int[] left() {
    int[] left = new int[size];
    int count = 0;
    for (int i = 0; i < size; i++) {
      if (!gone[i]) {
        left[count++] = i;
      }
    }
    return Arrays.copyOf(left, count);
  }

  /** The form in the given bits, closed under neighbours, renumbered in that order. */
  Qubo form(int[] bits, int[] position, double ownConstant) {
    Qubo.Builder form = Qubo.builder(bits.length).allowRounding().addConstant(ownConstant);
    for (int p = 0; p < bits.length; p++) {
      position[bits[p]] = p;
    }
    for (int p = 0; p < bits.length; p++) {
      int i = bits[p];
      form.addLinear(p, linear[i]);
      for (int k = 0; k < degree[i]; k++) {
        int q = position[neighbour[i][k]];
        if (p < q) {
          form.addPair(p, q, weight[i][k]);
        }
      }
    }
    return form.build();
  }
}
