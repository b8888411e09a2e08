package dev.couplet.kernel;

import dev.couplet.form.Qubo;
import java.util.Optional;

/**
 * A form laid out by rows, each pair in the rows of both its variables.
 *
 * <p>The pairs of variable i are {@code neighbour[k], weight[k]} for {@code start[i] <= k < start[i
 * + 1]}, neighbours ascending. Weights and linear coefficients are the form's own. The arrays are
 * shared, not copied: whoever takes one must not write to it. Built in O(n + m); 12 bytes a place
 * of a row (24 a pair) and 12 a variable.
 */
public final class Adjacency {
  private final int[] start;
  private final int[] neighbour;
  private final double[] weight;
  private final double[] linear;
  private final double constant;
  private final boolean exact;
  private final int[] portions;

  /** The variable at each place, if the rows were arranged; else empty. */
  private final int[] order;

  private Adjacency(
      int[] start,
      int[] neighbour,
      double[] weight,
      double[] linear,
      double constant,
      boolean exact,
      int[] order) {
    this.order = order;
    this.start = start;
    this.neighbour = neighbour;
    this.weight = weight;
    this.linear = linear;
    this.constant = constant;
    this.exact = exact;
    this.portions = Portions.of(start);
  }

  /**
   * The rows of a form.
   *
   * @throws IllegalArgumentException if the form has more than 2^30 pairs
   */
  public static Adjacency of(Qubo form) {
    return of(form, Pace.free()).orElseThrow();
  }

  /**
   * The rows of a form, unless the pace ends before they are built.
   *
   * @throws IllegalArgumentException if the form has more than 2^30 pairs
   */
  public static Optional<Adjacency> of(Qubo form, Pace pace) {
    int n = form.size();
    if (form.pairs() > 1 << 30) {
      throw new IllegalArgumentException(
          "the form has " + form.pairs() + " pairs, its rows can hold at most " + (1 << 30));
    }
    int[] next = new int[n + 1];
    boolean counted =
        form.forEachPairUntil(
            pace::look,
            (i, j, value) -> {
              next[i]++;
              next[j]++;
            });
    return counted ? filled(form, starts(next), next, pace) : Optional.empty();
  }

  /** Where rows of the given lengths begin; lengths become the same. */
  private static int[] starts(int[] next) {
    int[] start = new int[next.length];
    for (int i = 0; i + 1 < next.length; i++) {
      start[i + 1] = start[i] + next[i];
      next[i] = start[i];
    }
    return start;
  }

  private static Optional<Adjacency> filled(Qubo form, int[] start, int[] next, Pace pace) {
    if (pace.lookBefore(12L * start[form.size()])) {
      return Optional.empty();
    }
    int n = form.size();
    int[] neighbour = new int[start[n]];
    double[] weight = new double[start[n]];
    // Pairs arrive with i ascending, then j: so every row fills up in ascending order.
    boolean filled =
        form.forEachPairUntil(
            pace::look,
            (i, j, value) -> {
              neighbour[next[i]] = j;
              weight[next[i]++] = value;
              neighbour[next[j]] = i;
              weight[next[j]++] = value;
            });
    if (!filled) {
      return Optional.empty();
    }
    double[] linear = new double[n];
    for (int i = 0; i < n; i++) {
      linear[i] = form.linear(i);
    }
    return Optional.of(
        new Adjacency(start, neighbour, weight, linear, form.constant(), form.exact(), new int[0]));
  }

  /**
   * The same rows in another order, unless the pace ends before they are built: row p is that of
   * variable {@code order[p]}, and neighbours are named by their places. Whoever knows variables
   * has to ask {@link #variable}.
   */
  Optional<Adjacency> arranged(int[] newOrder, Pace pace) {
    int[] place = new int[newOrder.length];
    for (int p = 0; p < place.length; p++) {
      place[newOrder[p]] = p;
    }
    int[] newStart = new int[start.length];
    int[] newNeighbour = new int[neighbour.length];
    double[] newWeight = new double[weight.length];
    double[] newLinear = new double[linear.length];
    int next = 0;
    for (int p = 0; p < place.length && !pace.ended(); p++) {
      int i = newOrder[p];
      newLinear[p] = linear[i];
      for (int k = start[i]; k < start[i + 1]; k++) {
        newNeighbour[next] = place[neighbour[k]];
        newWeight[next++] = weight[k];
      }
      newStart[p + 1] = next;
      if (pace.after(1L + degree(i))) {
        return Optional.empty();
      }
    }
    return Optional.of(
        new Adjacency(newStart, newNeighbour, newWeight, newLinear, constant, exact, newOrder));
  }

  /** The variable whose row stands at a place. */
  int variable(int place) {
    return order.length == 0 ? place : order[place];
  }

  /** Whether rows stand elsewhere than at the number of their variable. */
  boolean rearranged() {
    return order.length > 0;
  }

  /** The number of variables n. */
  public int size() {
    return linear.length;
  }

  /** The number of pairs m. */
  public int pairs() {
    return neighbour.length / 2;
  }

  /** The number of pairs of variable {@code i}. */
  public int degree(int i) {
    return start[i + 1] - start[i];
  }

  /** Where each row begins: n + 1 numbers. */
  public int[] start() {
    return start;
  }

  /** The other variable of each pair, row by row: 2m numbers. */
  public int[] neighbour() {
    return neighbour;
  }

  /** The coefficient of each pair, row by row: 2m numbers. */
  public double[] weight() {
    return weight;
  }

  /** The coefficient of each variable: n numbers. */
  public double[] linear() {
    return linear;
  }

  /** The constant of the form. */
  public double constant() {
    return constant;
  }

  /** Whether sums of coefficients are free of rounding. */
  public boolean exact() {
    return exact;
  }

  /**
   * Boundaries of ranges of rows of which one pass does not outlast a {@link Pace}: 0 first, n
   * last.
   */
  int[] portions() {
    return portions;
  }

  /** The sum of the magnitudes of the coefficients that variable {@code i} has a part in. */
  public double magnitude(int i) {
    double sum = Math.abs(linear[i]);
    for (int k = start[i]; k < start[i + 1]; k++) {
      sum += Math.abs(weight[k]);
    }
    return sum;
  }
}
