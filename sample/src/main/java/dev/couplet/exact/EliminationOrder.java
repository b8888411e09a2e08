package dev.couplet.exact;

import dev.couplet.form.Qubo;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.PriorityQueue;

/**
 * The order in which the variables of a form are eliminated: always one whose neighbours lack the
 * fewest pairs among themselves when its own neighbours last changed, then one of fewest neighbours
 * (minimum fill; Rose 1972). Where every variable has more neighbours than the width allows, one
 * with the most is conditioned instead: its two values are tried in turn, and it leaves the graph.
 */
final class EliminationOrder {
  private record Entry(long key, int variable) implements Comparable<Entry> {
    @Override
    public int compareTo(Entry other) {
      int byKey = Long.compare(key, other.key);
      return byKey != 0 ? byKey : Integer.compare(variable, other.variable);
    }
  }

  private final int limit;
  private final int[][] neighbours;
  private final long[] key;
  private final PriorityQueue<Entry> queue = new PriorityQueue<>();
  private final List<Integer> conditioned = new ArrayList<>();
  private final int[] order;
  private final int[][] scope;
  private int eliminated;

  private EliminationOrder(Qubo form, int limit) {
    this.limit = limit;
    int size = form.size();
    neighbours = new int[size][];
    key = new long[size];
    order = new int[size];
    scope = new int[size][];
    int[] degree = new int[size];
    form.forEachPair(
        (i, j, value) -> {
          degree[i]++;
          degree[j]++;
        });
    for (int i = 0; i < size; i++) {
      neighbours[i] = new int[degree[i]];
      degree[i] = 0;
    }
    form.forEachPair(
        (i, j, value) -> {
          neighbours[i][degree[i]++] = j;
          neighbours[j][degree[j]++] = i;
        });
    for (int[] row : neighbours) {
      Arrays.sort(row);
    }
  }

  /**
   * Finds an order whose tables have at most {@code limit} variables.
   *
   * @param mostConditioned the search ends, with an unusable order, beyond so many conditioned ones
   * @param fixed variables that are conditioned from the start
   */
  static EliminationOrder of(Qubo form, int limit, int mostConditioned, int... fixed) {
    EliminationOrder order = new EliminationOrder(form, limit);
    order.run(mostConditioned, fixed);
    if (!order.complete() || order.conditioned.size() == fixed.length) {
      return order;
    }
    // Once more, without the variables that turned out to be in the way.
    return of(form, limit, mostConditioned, order.conditioned());
  }

  private void run(int mostConditioned, int[] fixed) {
    for (int variable : fixed) {
      condition(variable);
    }
    for (int i = 0; i < key.length; i++) {
      if (key[i] >= 0) {
        rate(i);
      }
    }
    while (eliminated + conditioned.size() < order.length) {
      int next = next();
      if (neighbours[next].length <= limit) {
        eliminate(next);
      } else if (conditioned.size() <= mostConditioned) {
        condition(mostNeighbours());
      } else {
        return;
      }
    }
  }

  private int next() {
    while (true) {
      Entry entry = queue.element();
      if (key[entry.variable] == entry.key) {
        return entry.variable;
      }
      queue.remove();
    }
  }

  private int mostNeighbours() {
    int most = -1;
    for (int i = 0; i < key.length; i++) {
      if (key[i] >= 0 && (most < 0 || neighbours[i].length > neighbours[most].length)) {
        most = i;
      }
    }
    return most;
  }

  private void eliminate(int variable) {
    int[] around = neighbours[variable];
    order[eliminated] = variable;
    scope[eliminated++] = around;
    key[variable] = -1;
    for (int j : around) {
      neighbours[j] = merged(neighbours[j], around, j, variable);
    }
    for (int j : around) {
      rate(j);
    }
  }

  private void condition(int variable) {
    conditioned.add(variable);
    key[variable] = -1;
    for (int j : neighbours[variable]) {
      neighbours[j] = merged(neighbours[j], new int[0], j, variable);
      if (!queue.isEmpty()) {
        rate(j);
      }
    }
  }

  /** The union of two ascending rows without two of the variables. */
  private static int[] merged(int[] left, int[] right, int without, int alsoWithout) {
    int[] union = new int[left.length + right.length];
    int count = 0;
    int a = 0;
    int b = 0;
    while (a < left.length || b < right.length) {
      int next;
      if (b == right.length || (a < left.length && left[a] <= right[b])) {
        next = left[a++];
        if (b < right.length && right[b] == next) {
          b++;
        }
      } else {
        next = right[b++];
      }
      if (next != without && next != alsoWithout) {
        union[count++] = next;
      }
    }
    return Arrays.copyOf(union, count);
  }

  /** Those with more neighbours than the limit come last, by their number. */
  private void rate(int i) {
    int degree = neighbours[i].length;
    long fill = degree > limit ? Integer.MAX_VALUE : missing(neighbours[i]);
    key[i] = fill << 31 | degree;
    queue.add(new Entry(key[i], i));
  }

  private int missing(int[] around) {
    int missing = 0;
    for (int a = 0; a < around.length; a++) {
      int[] row = neighbours[around[a]];
      for (int b = a + 1; b < around.length; b++) {
        if (Arrays.binarySearch(row, around[b]) < 0) {
          missing++;
        }
      }
    }
    return missing;
  }

  /** Whether every variable is eliminated or conditioned. */
  boolean complete() {
    return eliminated + conditioned.size() == order.length;
  }

  /** How many variables are eliminated. */
  int eliminated() {
    return eliminated;
  }

  /** The variable eliminated as number k. */
  int variable(int k) {
    return order[k];
  }

  /** The neighbours it has at that time, ascending. */
  int[] scope(int k) {
    return scope[k];
  }

  /** The variables whose values are tried in turn. */
  int[] conditioned() {
    return conditioned.stream().mapToInt(i -> i).toArray();
  }

  /** The largest number of neighbours of a variable when it is eliminated. */
  int width() {
    int width = 0;
    for (int k = 0; k < eliminated; k++) {
      width = Math.max(width, scope[k].length);
    }
    return width;
  }
}
