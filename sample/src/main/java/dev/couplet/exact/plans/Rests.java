package dev.couplet.exact.plans;

/**
 * What rows have yet to charge, whatever is decided: adds it to the bound and removes values with
 * which it would be too much. O(entries of the rows). One thread.
 */
final class Rests {
  private final Network network;
  private final Propagation propagation;
  private final long[] least;
  private final long[] most;

  Rests(Network network, Propagation propagation) {
    this.network = network;
    this.propagation = propagation;
    this.least = new long[network.rows.length];
    this.most = new long[network.rows.length];
  }

  /** Works out the rests; false if no plan below the limit is left. */
  boolean run(Partial partial) {
    long sum = 0;
    for (int r = 0; r < network.rows.length; r++) {
      Row row = network.rows[r];
      if (charging(partial, r)) {
        least[r] = 0;
        most[r] = 0;
        for (int k = 0; k < row.variables.length; k++) {
          least[r] += propagation.least(partial, row, k);
          most[r] += propagation.most(partial, row, k);
          propagation.steps += row.coefficients[k].length;
        }
        sum += row.rest(least[r], most[r], partial.multipliers[r]);
      }
    }
    partial.rest = sum;
    return partial.bound() <= propagation.limit && filter(partial);
  }

  private boolean charging(Partial partial, int r) {
    return !network.rows[r].required() || partial.multipliers[r] != 0;
  }

  private boolean filter(Partial partial) {
    for (int r = 0; r < network.rows.length; r++) {
      Row row = network.rows[r];
      if (!row.required()) {
        for (int k = 0; k < row.variables.length; k++) {
          if (partial.choices[row.variables[k]] > 1 && !filter(partial, row, r, k)) {
            propagation.clear();
            return false;
          }
        }
      }
    }
    return propagation.run(partial);
  }

  private boolean filter(Partial partial, Row row, int r, int k) {
    long others = least[r] - propagation.least(partial, row, k);
    long othersMost = most[r] - propagation.most(partial, row, k);
    long multiplier = partial.multipliers[r];
    long known = partial.bound() - row.rest(least[r], most[r], multiplier);
    int first = network.variables.first(row.variables[k]);
    for (int a = 0; a < row.coefficients[k].length; a++) {
      if (partial.left[first + a]) {
        long own = row.coefficients[k][a];
        long bound = known + row.rest(others + own, othersMost + own, multiplier);
        boolean beyond = bound + partial.costs[first + a] > propagation.removing();
        if (beyond && !propagation.remove(partial, first + a)) {
          return false;
        }
      }
    }
    return true;
  }
}
