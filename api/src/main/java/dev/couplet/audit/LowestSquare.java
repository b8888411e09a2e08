package dev.couplet.audit;

import java.util.Arrays;

/**
 * The lowest value of a form whose pairs are those of a square, {@code W (sum c_k x_k)^2 + sum (a_k
 * + f_k) x_k}, for f that are multiples of c: slacks of inequalities are such forms.
 *
 * <p>With t the sum of the c_k x_k, f = v c and D(t) the least that the rest of the linear part can
 * be for that t, the value is {@code W t^2 + D(t) + v t}: for all t these are points whose lower
 * convex hull answers for every v by bisection. D comes from adding one bit after the other; the
 * number of different t is limited. Whatever does not fit this is left to the search.
 */
final class LowestSquare implements Minimum {
  private static final int MOST_SUMS = 1 << 20;
  private static final double CLOSE = 0x1p-46;

  private final double[] ratio;
  private final int unit;
  private final double[] sums;
  private final double[] values;
  private final Minimum otherwise;

  private LowestSquare(
      double[] ratio, int unit, double[] sums, double[] values, Minimum otherwise) {
    this.ratio = ratio;
    this.unit = unit;
    this.sums = sums;
    this.values = values;
    this.otherwise = otherwise;
  }

  static Minimum of(double[] base, double[][] pair, Minimum otherwise) {
    int unit = 0;
    for (int k = 1; k < pair.length; k++) {
      unit = magnitude(pair[k]) < magnitude(pair[unit]) ? k : unit;
    }
    double[] ratio = ratios(pair, unit);
    double weight = ratio.length == 0 ? 0 : weight(pair, ratio, unit);
    if (weight == 0 || !isSquare(pair, ratio, weight)) {
      return otherwise;
    }
    double[][] points = points(base, ratio, weight);
    if (points.length == 0) {
      return otherwise;
    }
    for (int k = 0; k < points[0].length; k++) {
      points[1][k] += weight * points[0][k] * points[0][k];
    }
    double[][] hull = hull(points[0], points[1]);
    return new LowestSquare(ratio, unit, hull[0], hull[1], otherwise);
  }

  private static double magnitude(double[] row) {
    return Arrays.stream(row).map(Math::abs).sum();
  }

  /** The c_k over that of the unit, read off two columns; empty if a pair is missing. */
  private static double[] ratios(double[][] pair, int unit) {
    int first = unit == 0 ? 1 : 0;
    int second = unit <= 1 ? 2 : 1;
    double[] ratio = new double[pair.length];
    for (int k = 0; k < pair.length; k++) {
      int column = k == first ? second : first;
      double quotient = k == unit ? 1 : pair[k][column] / pair[unit][column];
      double whole = Math.rint(quotient);
      ratio[k] = Math.abs(quotient - whole) <= CLOSE * Math.abs(whole) ? whole : quotient;
      if (!(Math.abs(ratio[k]) > 0) || !Double.isFinite(ratio[k])) {
        return new double[0];
      }
    }
    return ratio;
  }

  private static double weight(double[][] pair, double[] ratio, int unit) {
    int other = unit == 0 ? 1 : 0;
    return pair[unit][other] / (2 * ratio[other]);
  }

  private static boolean isSquare(double[][] pair, double[] ratio, double weight) {
    for (int k = 0; k < ratio.length; k++) {
      for (int l = 0; l < k; l++) {
        double square = 2 * weight * ratio[k] * ratio[l];
        if (!close(pair[k][l], square)) {
          return false;
        }
      }
    }
    return true;
  }

  private static boolean close(double a, double b) {
    return Math.abs(a - b) <= CLOSE * Math.min(Math.abs(a), Math.abs(b));
  }

  /** All sums t, ascending, and D(t); nothing if there are too many. */
  private static double[][] points(double[] base, double[] ratio, double weight) {
    double[] sums = {0};
    double[] costs = {0};
    for (int k = 0; k < ratio.length; k++) {
      double cost = base[k] - weight * ratio[k] * ratio[k];
      double[][] merged = merge(sums, costs, ratio[k], cost);
      sums = merged[0];
      costs = merged[1];
      if (sums.length > MOST_SUMS) {
        return new double[0][];
      }
    }
    return new double[][] {sums, costs};
  }

  private static double[][] merge(double[] sums, double[] costs, double step, double cost) {
    double[] mergedSums = new double[2 * sums.length];
    double[] mergedCosts = new double[2 * sums.length];
    int count = 0;
    for (int a = 0, b = 0; a < sums.length || b < sums.length; count++) {
      double without = a < sums.length ? sums[a] : Double.POSITIVE_INFINITY;
      double with = b < sums.length ? sums[b] + step : Double.POSITIVE_INFINITY;
      double sum = Math.min(without, with);
      double best = Double.POSITIVE_INFINITY;
      if (without == sum) {
        best = costs[a++];
      }
      if (with == sum) {
        best = Math.min(best, costs[b++] + cost);
      }
      mergedSums[count] = sum;
      mergedCosts[count] = best;
    }
    return new double[][] {Arrays.copyOf(mergedSums, count), Arrays.copyOf(mergedCosts, count)};
  }

  /** The corners of the lower convex hull of points with ascending x. */
  private static double[][] hull(double[] x, double[] y) {
    int[] corner = new int[x.length];
    int count = 0;
    for (int p = 0; p < x.length; p++) {
      while (count >= 2 && !turnsUp(x, y, corner[count - 2], corner[count - 1], p)) {
        count--;
      }
      corner[count++] = p;
    }
    double[][] hull = new double[2][count];
    for (int k = 0; k < count; k++) {
      hull[0][k] = x[corner[k]];
      hull[1][k] = y[corner[k]];
    }
    return hull;
  }

  /** Whether the way a, b, c bends upwards at b; the products are compared without rounding. */
  private static boolean turnsUp(double[] x, double[] y, int a, int b, int c) {
    double run = x[b] - x[a];
    double rise = y[b] - y[a];
    double nextRun = x[c] - x[b];
    double nextRise = y[c] - y[b];
    double left = rise * nextRun;
    double right = nextRise * run;
    double leftRest = Math.fma(rise, nextRun, -left);
    double rightRest = Math.fma(nextRise, run, -right);
    return left == right ? leftRest < rightRest : left < right;
  }

  @Override
  public double of(double[] change) {
    double slope = change[unit];
    for (int k = 0; k < ratio.length; k++) {
      double expected = slope * ratio[k];
      if (change[k] != expected && !close(change[k], expected)) {
        return otherwise.of(change);
      }
    }
    int low = 0;
    int high = sums.length - 1;
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (at(middle, slope) <= at(middle + 1, slope)) {
        high = middle;
      } else {
        low = middle + 1;
      }
    }
    return at(low, slope);
  }

  private double at(int corner, double slope) {
    return values[corner] + slope * sums[corner];
  }
}
