package dev.couplet.reduce;

import java.util.ArrayDeque;
import java.util.Deque;

/**
 * Removes bits by looking at their own coefficients and pairs only, until no rule applies.
 *
 * <p>Strict rules keep every minimum: they demand that the removed bit's best value be the only
 * best one. Otherwise a tie may be settled either way.
 */
final class LocalRules {
  private final Graph graph;
  private final History history;
  private final boolean strict;
  private final Deque<Integer> open = new ArrayDeque<>();
  private final boolean[] waiting;

  LocalRules(Graph graph, History history, boolean strict) {
    this.graph = graph;
    this.history = history;
    this.strict = strict;
    this.waiting = new boolean[graph.size];
  }

  /** Looks at this bit again. */
  void reopen(int i) {
    if (!graph.gone[i] && !waiting[i]) {
      waiting[i] = true;
      open.add(i);
    }
  }

  void reopenNeighbours(int i) {
    for (int k = 0; k < graph.degree[i]; k++) {
      reopen(graph.neighbour[i][k]);
    }
  }

  /** Applies rules to waiting bits for at most so many steps; false when none waits. */
  boolean work(int steps) {
    for (int done = 0; done < steps && !open.isEmpty(); done++) {
      int i = open.remove();
      waiting[i] = false;
      if (!graph.gone[i]) {
        done += graph.degree[i];
        look(i);
      }
    }
    return !open.isEmpty();
  }

  private void look(int i) {
    double low = graph.linear[i];
    double high = graph.linear[i];
    double magnitude = Math.abs(low);
    for (int k = 0; k < graph.degree[i]; k++) {
      double weight = graph.weight[i][k];
      low += Math.min(0, weight);
      high += Math.max(0, weight);
      magnitude += Math.abs(weight);
    }
    // What these sums can be wrong by, if they are rounded at all.
    double error = history.exact() ? 0 : (graph.degree[i] + 4) * 0x1p-52 * magnitude;
    if (positive(low - error)) {
      fix(i, false);
    } else if (positive(-high - error)) {
      fix(i, true);
    } else if (!copy(i, low, high, error)) {
      eliminate(i);
    }
  }

  private boolean positive(double value) {
    return strict ? value > 0 : value >= 0;
  }

  private void fix(int i, boolean value) {
    reopenNeighbours(i);
    history.fixed(Removal.SIGN, i, value);
    graph.fix(i, value);
  }

  /** Looks for a pair that decides bit i, whichever value the other bit has. */
  private boolean copy(int i, double low, double high, double error) {
    for (int k = 0; k < graph.degree[i]; k++) {
      double weight = graph.weight[i][k];
      double lowAt0 = low - Math.min(0, weight) - error;
      double highAt0 = high - Math.max(0, weight) + error;
      double lowAt1 = lowAt0 + weight - error;
      double highAt1 = highAt0 + weight + error;
      boolean same = positive(lowAt0) && positive(-highAt1);
      if (same || (positive(-highAt0) && positive(lowAt1))) {
        substitute(i, graph.neighbour[i][k], weight, !same);
        return true;
      }
    }
    return false;
  }

  /** Replaces bit i by bit j or its negation. */
  private void substitute(int i, int j, double weight, boolean negated) {
    reopenNeighbours(i);
    history.copied(i, j, negated);
    double linear = graph.linear[i];
    int[] others = graph.neighbour[i];
    double[] weights = graph.weight[i];
    int degree = graph.degree[i];
    graph.remove(i);
    graph.addLinear(j, negated ? -linear : linear);
    if (negated) {
      graph.addConstant(linear);
    } else {
      graph.addLinear(j, weight);
    }
    for (int k = 0; k < degree; k++) {
      if (others[k] != j) {
        if (negated) {
          graph.addLinear(others[k], weights[k]);
        }
        graph.addPair(j, others[k], negated ? -weights[k] : weights[k]);
      }
    }
  }

  private void eliminate(int i) {
    double a = graph.linear[i];
    if (graph.degree[i] == 0 && !strict) {
      fix(i, a < 0);
    } else if (graph.degree[i] == 1) {
      leaf(i, a, graph.neighbour[i][0], graph.weight[i][0]);
    } else if (graph.degree[i] == 2) {
      int[] ends = graph.neighbour[i];
      chain(i, a, ends[0], graph.weight[i][0], ends[1], graph.weight[i][1]);
    }
  }

  private void leaf(int i, double a, int y, double b) {
    double at1 = graph.sum(a, b);
    if (strict && (a == 0 || at1 == 0)) {
      return;
    }
    reopen(y);
    history.leaf(i, a, y, b);
    graph.remove(i);
    graph.addConstant(Math.min(0, a));
    graph.addLinear(y, graph.sum(Math.min(0, at1), -Math.min(0, a)));
  }

  private void chain(int i, double a, int y, double b, int z, double c) {
    double aty = graph.sum(a, b);
    double atz = graph.sum(a, c);
    double both = graph.sum(aty, c);
    if (strict && (a == 0 || aty == 0 || atz == 0 || both == 0)) {
      return;
    }
    reopen(y);
    reopen(z);
    history.chain(i, a, y, b, z, c);
    graph.remove(i);
    double none = Math.min(0, a);
    double onlyY = graph.sum(Math.min(0, aty), -none);
    double onlyZ = graph.sum(Math.min(0, atz), -none);
    graph.addConstant(none);
    graph.addLinear(y, onlyY);
    graph.addLinear(z, onlyZ);
    graph.addPair(y, z, graph.sum(graph.sum(Math.min(0, both), -none), -graph.sum(onlyY, onlyZ)));
  }
}
