package dev.couplet.exact.plans;

import java.util.ArrayList;
import java.util.List;

/**
 * A statement as variables, costs alone and in pairs, and rows; immutable. Costs are whole numbers
 * of fine units, to be minimised.
 */
final class Network {
  final Variables variables;
  final Scale scale;
  final long constant;
  final long[] costs;
  final Pair[] pairs;
  final Row[] rows;

  /** The pairs and the rows that each variable is in. */
  final int[][] pairsOf;

  final int[][] rowsOf;

  /** The number of shifts of all pairs. */
  final int shifts;

  /** Costs of plans differ by multiples of this; 0 if they are all the same. */
  final long grain;

  /** No plan costs more. */
  final long ceiling;

  Network(
      Variables variables,
      Scale scale,
      long constant,
      long[] costs,
      List<Pair> pairs,
      List<Row> rows,
      long grain) {
    this.variables = variables;
    this.scale = scale;
    this.constant = constant;
    this.costs = costs;
    this.pairs = pairs.toArray(Pair[]::new);
    this.rows = rows.toArray(Row[]::new);
    this.grain = grain;
    this.pairsOf = pairsOf();
    this.rowsOf = rowsOf();
    this.shifts = shifts();
    this.ceiling = ceiling();
  }

  private int shifts() {
    int shifts = 0;
    for (Pair pair : pairs) {
      shifts += variables.values(pair.one()) + variables.values(pair.other());
    }
    return shifts;
  }

  private int[][] pairsOf() {
    List<List<Integer>> lists = lists();
    for (int p = 0; p < pairs.length; p++) {
      lists.get(pairs[p].one()).add(p);
      lists.get(pairs[p].other()).add(p);
    }
    return arrays(lists);
  }

  private int[][] rowsOf() {
    List<List<Integer>> lists = lists();
    for (int r = 0; r < rows.length; r++) {
      for (int variable : rows[r].variables) {
        lists.get(variable).add(r);
      }
    }
    return arrays(lists);
  }

  private List<List<Integer>> lists() {
    List<List<Integer>> lists = new ArrayList<>();
    for (int i = 0; i < variables.count(); i++) {
      lists.add(new ArrayList<>());
    }
    return lists;
  }

  private static int[][] arrays(List<List<Integer>> lists) {
    return lists.stream()
        .map(list -> list.stream().mapToInt(Integer::intValue).toArray())
        .toArray(int[][]::new);
  }

  private long ceiling() {
    long most = constant;
    for (int i = 0; i < variables.count(); i++) {
      long dearest = Long.MIN_VALUE;
      for (int v = variables.first(i); v < variables.end(i); v++) {
        dearest = costs[v] == Pair.NEVER ? dearest : Math.max(dearest, costs[v]);
      }
      most += Math.max(dearest, -Pair.NEVER);
    }
    for (Pair pair : pairs) {
      long dearest = 0;
      for (long cost : pair.costs()) {
        dearest = cost == Pair.NEVER ? dearest : Math.max(dearest, cost);
      }
      most += dearest;
    }
    for (Row row : rows) {
      most += row.required() ? 0 : dearest(row);
    }
    return most;
  }

  private static long dearest(Row row) {
    long least = 0;
    long most = 0;
    for (long[] values : row.coefficients) {
      long low = Long.MAX_VALUE;
      long high = Long.MIN_VALUE;
      for (long value : values) {
        low = Math.min(low, value);
        high = Math.max(high, value);
      }
      least += low;
      most += high;
    }
    long within = row.step == 1 ? 0 : row.charge(row.lowest + row.step / 2);
    return Math.max(within, Math.max(row.charge(least), row.charge(most)));
  }

  /** Whether anything costs something. */
  boolean costless() {
    return grain == 0;
  }

  /**
   * A lower bound in fine units as one in the model's own: up to what a plan can cost, then down.
   */
  double value(long bound) {
    long above = bound - constant;
    long reached = grain == 0 ? 0 : Math.floorDiv(above + grain - 1, grain) * grain;
    return scale.value(Math.floorDiv(constant + reached, scale.fine()));
  }

  /** The number of entries of all tables. */
  long entries() {
    long entries = 0;
    for (Pair pair : pairs) {
      entries += pair.costs().length;
    }
    return entries;
  }
}
