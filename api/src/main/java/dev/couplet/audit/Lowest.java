package dev.couplet.audit;

import java.util.Arrays;
import java.util.Comparator;
import java.util.stream.IntStream;

/**
 * The lowest value of {@code sum (a_k + f_k) x_k + sum_{k<l} b_kl x_k x_l} for given f, again and
 * again with the same a and b: depth first, cutting off where even the negative coefficients left
 * would not win. Exact; exponential in the number of bits at the worst.
 *
 * <p>Bits are decided in the order of the magnitude of their pairs. Once those that are left have
 * no pairs among them, each is best alone and the bound is the value: so bits that are only coupled
 * to a few others cost nothing.
 */
final class Lowest implements Minimum {
  private final double[] base;
  private final int[] order;
  private final double[][] pair;
  private final double[] negativePairs;
  private final boolean[] alone;
  private final double[][] fields;
  private double lowest;

  /** {@code pair} is symmetric with a zero diagonal. */
  Lowest(double[] base, double[][] pair) {
    int n = pair.length;
    this.base = base.clone();
    this.order = order(pair);
    this.pair = new double[n][n];
    this.negativePairs = new double[n + 1];
    this.alone = new boolean[n + 1];
    this.fields = new double[n + 1][n];
    alone[n] = true;
    for (int k = n - 1; k >= 0; k--) {
      negativePairs[k] = negativePairs[k + 1];
      alone[k] = alone[k + 1];
      for (int l = 0; l < n; l++) {
        double value = pair[order[k]][order[l]];
        this.pair[k][l] = value;
        if (l > k) {
          negativePairs[k] += Math.min(0, value);
          alone[k] &= value == 0;
        }
      }
    }
  }

  private static int[] order(double[][] pair) {
    double[] weight = new double[pair.length];
    for (int k = 0; k < pair.length; k++) {
      weight[k] = -Arrays.stream(pair[k]).map(Math::abs).sum();
    }
    return IntStream.range(0, pair.length)
        .boxed()
        .sorted(Comparator.comparingDouble(k -> weight[k]))
        .mapToInt(Integer::intValue)
        .toArray();
  }

  @Override
  public double of(double[] change) {
    for (int k = 0; k < order.length; k++) {
      fields[0][k] = base[order[k]] + change[order[k]];
    }
    lowest = 0;
    descend(0, 0);
    return lowest;
  }

  private void descend(int k, double energy) {
    double[] field = fields[k];
    double bound = energy + negativePairs[k];
    for (int l = k; l < field.length; l++) {
      bound += Math.min(0, field[l]);
    }
    if (bound >= lowest) {
      return;
    }
    if (alone[k]) {
      lowest = bound;
      return;
    }
    boolean first = field[k] < 0;
    decide(k, first, energy);
    decide(k, !first, energy);
  }

  private void decide(int k, boolean one, double energy) {
    double[] field = fields[k];
    double[] next = fields[k + 1];
    for (int l = k + 1; l < field.length; l++) {
      next[l] = one ? field[l] + pair[k][l] : field[l];
    }
    descend(k + 1, one ? energy + field[k] : energy);
  }
}
