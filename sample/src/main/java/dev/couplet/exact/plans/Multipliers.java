package dev.couplet.exact.plans;

import dev.couplet.sampling.Vigil;

/**
 * Raises the bound of a partial by moving rows into costs in part: Lagrangian relaxation, the
 * multipliers by the subgradient method, and sweeps in between.
 *
 * <p>For any multipliers the cost of every plan that keeps the rows is the same as before, so that
 * each round gives a bound; the best is kept. A multiplier moves by how much its row is missed when
 * every variable takes its cheapest value.
 *
 * <p>Source: Held, Wolfe and Crowder, "Validation of subgradient optimization" (1974); the step
 * length is Polyak's, from the gap to the limit. One thread.
 */
final class Multipliers {
  private static final int PATIENCE = 8;
  private static final double LEAST_SHARE = 1e-3;

  private final Network network;
  private final Propagation propagation;
  private final Sweeps sweeps;
  private final Rests rests;
  private final ProofLog log;
  private final Vigil vigil;
  private final long most;
  private final long[] missed;

  Multipliers(
      Network network,
      Propagation propagation,
      Sweeps sweeps,
      Rests rests,
      ProofLog log,
      Vigil vigil) {
    this.log = log;
    this.network = network;
    this.propagation = propagation;
    this.sweeps = sweeps;
    this.rests = rests;
    this.vigil = vigil;
    this.most = (1L << 57) / Math.max(1, network.rows.length);
    this.missed = new long[network.rows.length];
  }

  /** Raises the bound within so many rounds; false if no plan below the limit is left. */
  boolean run(Partial best, int rounds) {
    Partial moving = new Partial(network);
    moving.copy(best);
    double share = 1;
    int since = 0;
    for (int round = 0; round < rounds && share > LEAST_SHARE && !vigil.over(); round++) {
      if (!move(moving, share)) {
        return true;
      }
      if (!sweeps.run(moving) || !rests.run(moving)) {
        log.close(network, moving, propagation.limit);
        return false;
      }
      if (moving.bound() > best.bound()) {
        best.copy(moving);
        since = 0;
      } else if (++since == PATIENCE) {
        moving.copy(best);
        share /= 2;
        since = 0;
      }
    }
    return true;
  }

  /** Moves every multiplier along how much its row is missed; false if none is. */
  private boolean move(Partial partial, double share) {
    double square = 0;
    for (int r = 0; r < missed.length; r++) {
      missed[r] = network.rows[r].movable() ? missed(partial, r) : 0;
      square += (double) missed[r] * missed[r];
    }
    if (square == 0) {
      return false;
    }
    double length = share * (propagation.limit - partial.bound() + 1) / square;
    for (int r = 0; r < missed.length; r++) {
      if (missed[r] != 0) {
        move(partial, r, length * missed[r]);
      }
    }
    partial.level(network.variables);
    return true;
  }

  private long missed(Partial partial, int r) {
    Row row = network.rows[r];
    long sum = 0;
    for (int k = 0; k < row.variables.length; k++) {
      sum += cheapest(partial, row, k);
    }
    long multiplier = partial.multipliers[r];
    if (sum > row.highest || multiplier > 0) {
      return sum - row.highest;
    }
    return sum < row.lowest || multiplier < 0 ? sum - row.lowest : 0;
  }

  private long cheapest(Partial partial, Row row, int k) {
    int variable = row.variables[k];
    int first = network.variables.first(variable);
    if (partial.settled[variable] >= 0) {
      return row.coefficients[k][partial.settled[variable] - first];
    }
    long cost = Long.MAX_VALUE;
    long own = 0;
    for (int a = 0; a < row.coefficients[k].length; a++) {
      if (partial.left[first + a] && partial.costs[first + a] < cost) {
        cost = partial.costs[first + a];
        own = row.coefficients[k][a];
      }
    }
    return own;
  }

  private void move(Partial partial, int r, double by) {
    Row row = network.rows[r];
    long before = partial.multipliers[r];
    double reach = (double) most / reach(row);
    double wanted = Math.max(-reach, Math.min(reach, before + by));
    long after = row.allowed(Math.round(wanted));
    long moved = after - before;
    partial.multipliers[r] = after;
    partial.base += row.offset(before) - row.offset(after);
    for (int k = 0; k < row.variables.length; k++) {
      int variable = row.variables[k];
      int first = network.variables.first(variable);
      if (partial.settled[variable] >= 0) {
        partial.base += moved * row.coefficients[k][partial.settled[variable] - first];
      } else {
        for (int a = 0; a < row.coefficients[k].length; a++) {
          partial.costs[first + a] += moved * row.coefficients[k][a];
        }
      }
    }
  }

  /** The largest number that a multiplier of the row is multiplied by. */
  private static long reach(Row row) {
    long reach = 1;
    reach += Math.abs(row.lowest) == Row.FREE ? 0 : Math.abs(row.lowest);
    reach += Math.abs(row.highest) == Row.FREE ? 0 : Math.abs(row.highest);
    for (long[] values : row.coefficients) {
      long largest = 0;
      for (long value : values) {
        largest = Math.max(largest, Math.abs(value));
      }
      reach += largest;
    }
    return reach;
  }
}
