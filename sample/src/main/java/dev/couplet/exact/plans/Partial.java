package dev.couplet.exact.plans;

/**
 * What is left of a network once some variables are decided: the values that may still be taken,
 * and costs moved about so that {@link #base} is as large as can be.
 *
 * <p>Invariant: for every plan that takes values that are left only, {@code base} plus the costs of
 * its values, the costs of its pairs of open variables with their shifts, and the rests of all rows
 * at the multipliers is what the plan costs in the network; all of these are 0 or more.
 */
final class Partial {
  final boolean[] left;
  final int[] choices;

  /** The value of a variable that is settled: its costs are in the base, its pairs' in others. */
  final int[] settled;

  final long[] costs;
  final long[] shifts;
  final long[] multipliers;
  long base;

  /** The sum of the rests of all rows, as far as it is known. */
  long rest;

  int open;
  int sweeps;

  /** All of a network, nothing decided yet. */
  Partial(Network network) {
    Variables variables = network.variables;
    left = new boolean[variables.values()];
    choices = new int[variables.count()];
    settled = new int[variables.count()];
    costs = network.costs.clone();
    shifts = new long[network.shifts];
    multipliers = new long[network.rows.length];
    base = network.constant;
    open = variables.count();
    for (int i = 0; i < variables.count(); i++) {
      settled[i] = -1;
      for (int v = variables.first(i); v < variables.end(i); v++) {
        left[v] = costs[v] != Pair.NEVER;
        choices[i] += left[v] ? 1 : 0;
      }
    }
    level(variables);
  }

  /** Brings the costs of open variables to 0 or more: what every value costs goes to the base. */
  void level(Variables variables) {
    for (int i = 0; i < variables.count(); i++) {
      if (settled[i] < 0 && choices[i] > 0) {
        level(variables, i);
      }
    }
  }

  private void level(Variables variables, int variable) {
    long least = Long.MAX_VALUE;
    for (int v = variables.first(variable); v < variables.end(variable); v++) {
      least = left[v] ? Math.min(least, costs[v]) : least;
    }
    base += least;
    for (int v = variables.first(variable); v < variables.end(variable); v++) {
      costs[v] -= left[v] ? least : 0;
    }
  }

  /** Becomes a copy of another partial of the same network. */
  void copy(Partial other) {
    System.arraycopy(other.left, 0, left, 0, left.length);
    System.arraycopy(other.choices, 0, choices, 0, choices.length);
    System.arraycopy(other.settled, 0, settled, 0, settled.length);
    System.arraycopy(other.costs, 0, costs, 0, costs.length);
    System.arraycopy(other.shifts, 0, shifts, 0, shifts.length);
    System.arraycopy(other.multipliers, 0, multipliers, 0, multipliers.length);
    base = other.base;
    rest = other.rest;
    open = other.open;
    sweeps = other.sweeps;
  }

  /** No plan that takes values that are left costs less. */
  long bound() {
    return base + rest;
  }
}
