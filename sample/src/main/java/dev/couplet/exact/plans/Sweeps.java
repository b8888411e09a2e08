package dev.couplet.exact.plans;

/**
 * Moves costs between pairs and variables, one variable after the other along an order and back, so
 * that more and more of them end up in the constant, where they are a bound.
 *
 * <p>At a variable, what each of its values costs at the least in each of its pairs is moved from
 * the pair to the value; what every value costs goes to the base; and the rest is shared out over
 * the pairs with variables still to come in this direction. No cost gets negative, so that the base
 * only rises. A sweep takes O(entries of the tables of open variables).
 *
 * <p>Source: Kolmogorov (2006), with whole numbers and without messages: the shifts of a pair are
 * what its messages add up to. One thread.
 */
final class Sweeps {
  /** Beyond this many on one path shifts might overflow. */
  private static final int MOST = 1 << 12;

  private final Network network;
  private final Variables variables;
  private final Propagation propagation;
  private final long[] part;

  Sweeps(Network network, Propagation propagation) {
    this.network = network;
    this.variables = network.variables;
    this.propagation = propagation;
    int widest = 0;
    for (int i = 0; i < variables.count(); i++) {
      widest = Math.max(widest, variables.values(i));
    }
    this.part = new long[widest];
  }

  /** A sweep there and back, or a part of it if the run is over; false if no plan is left. */
  boolean run(Partial partial) {
    if (partial.sweeps >= MOST) {
      return settle(partial);
    }
    partial.sweeps++;
    for (int i = 0; i < variables.count(); i++) {
      if (partial.settled[i] < 0 && !propagation.over() && !visit(partial, i, true)) {
        return false;
      }
    }
    for (int i = variables.count() - 1; i >= 0; i--) {
      if (partial.settled[i] < 0 && !propagation.over() && !visit(partial, i, false)) {
        return false;
      }
    }
    return settle(partial);
  }

  /** Brings the costs of all values to 0 or more, and removes values beyond the limit. */
  boolean settle(Partial partial) {
    for (int i = 0; i < variables.count(); i++) {
      if (partial.settled[i] < 0 && !gatherLeast(partial, i)) {
        return false;
      }
    }
    return propagation.run(partial);
  }

  private boolean visit(Partial partial, int variable, boolean upward) {
    int before = 0;
    int after = 0;
    for (int p : network.pairsOf[variable]) {
      Pair pair = network.pairs[p];
      int other = pair.one() == variable ? pair.other() : pair.one();
      if (partial.settled[other] < 0) {
        before += other < variable ? 1 : 0;
        after += other > variable ? 1 : 0;
        if (!gather(partial, pair, variable, other)) {
          return false;
        }
      }
    }
    if (!gatherLeast(partial, variable)) {
      return false;
    }
    int coming = upward ? after : before;
    if (coming > 0) {
      share(partial, variable, upward, Math.max(before, after));
    }
    return true;
  }

  /** Moves what each value costs at the least in a pair to the value. */
  private boolean gather(Partial partial, Pair pair, int variable, int other) {
    boolean rows = pair.one() == variable;
    int width = variables.values(pair.other());
    int first = variables.first(variable);
    int count = variables.values(variable);
    int otherFirst = variables.first(other);
    int otherCount = variables.values(other);
    int shift = pair.shift() + (rows ? 0 : variables.values(pair.one()));
    int otherShift = pair.shift() + (rows ? variables.values(pair.one()) : 0);
    propagation.steps += (long) count * otherCount;
    for (int a = 0; a < count; a++) {
      if (!partial.left[first + a]) {
        continue;
      }
      long least = Pair.NEVER;
      for (int b = 0; b < otherCount; b++) {
        long cost = pair.costs()[rows ? a * width + b : b * width + a];
        if (cost != Pair.NEVER && partial.left[otherFirst + b]) {
          least = Math.min(least, cost + partial.shifts[otherShift + b]);
        }
      }
      if (least == Pair.NEVER) {
        if (!propagation.remove(partial, first + a)) {
          propagation.clear();
          return false;
        }
      } else {
        long moved = least + partial.shifts[shift + a];
        partial.costs[first + a] += moved;
        partial.shifts[shift + a] -= moved;
      }
    }
    return true;
  }

  /** Moves what every value of a variable costs to the base; removes values beyond the limit. */
  private boolean gatherLeast(Partial partial, int variable) {
    long least = Long.MAX_VALUE;
    for (int v = variables.first(variable); v < variables.end(variable); v++) {
      least = partial.left[v] ? Math.min(least, partial.costs[v]) : least;
    }
    partial.base += least;
    for (int v = variables.first(variable); v < variables.end(variable); v++) {
      if (partial.left[v]) {
        partial.costs[v] -= least;
        boolean beyond = partial.base + partial.costs[v] > propagation.removing();
        if (beyond && !propagation.remove(partial, v)) {
          propagation.clear();
          return false;
        }
      }
    }
    return true;
  }

  private void share(Partial partial, int variable, boolean upward, int parts) {
    int first = variables.first(variable);
    int count = variables.values(variable);
    for (int a = 0; a < count; a++) {
      part[a] = partial.left[first + a] ? partial.costs[first + a] / parts : 0;
    }
    for (int p : network.pairsOf[variable]) {
      Pair pair = network.pairs[p];
      boolean rows = pair.one() == variable;
      int other = rows ? pair.other() : pair.one();
      if (partial.settled[other] < 0 && upward == other > variable) {
        int shift = pair.shift() + (rows ? 0 : variables.values(pair.one()));
        for (int a = 0; a < count; a++) {
          partial.costs[first + a] -= part[a];
          partial.shifts[shift + a] += part[a];
        }
      }
    }
  }
}
