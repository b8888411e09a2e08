package dev.couplet.exact;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Vigil;
import java.util.Optional;
import java.util.OptionalDouble;

/** One elimination for every assignment of the conditioned variables of a form. */
final class ConditionedSweeps {
  private final Qubo form;
  private final EliminationOrder order;
  private final int[] conditioned;
  private final boolean flipped;
  private final double[][] pair;
  private boolean complete;
  private double lowest = Double.POSITIVE_INFINITY;
  private double minima;
  private boolean[] best = new boolean[0];

  ConditionedSweeps(Qubo form, int width, int most) {
    this.form = form;
    EliminationOrder plain = EliminationOrder.of(form, width, most);
    flipped = form.size() > 0 && unchangedByFlip(form);
    order = flipped ? EliminationOrder.of(form, width, most, first(plain)) : plain;
    conditioned = order.conditioned();
    pair = new double[conditioned.length][form.size()];
    int[] index = new int[form.size()];
    for (int c = 0; c < conditioned.length; c++) {
      index[conditioned[c]] = c + 1;
    }
    form.forEachPair(
        (i, j, value) -> {
          if (index[i] > 0) {
            pair[index[i] - 1][j] = value;
          }
          if (index[j] > 0) {
            pair[index[j] - 1][i] = value;
          }
        });
  }

  /** The variable to set if all spins can be flipped: where the order would need it most. */
  private static int first(EliminationOrder plain) {
    int[] conditioned = plain.conditioned();
    if (conditioned.length > 0) {
      return conditioned[0];
    }
    int widest = 0;
    for (int k = 0; k < plain.eliminated(); k++) {
      if (plain.scope(k).length > plain.scope(widest).length) {
        widest = k;
      }
    }
    return plain.variable(widest);
  }

  /** Whether energies stay the same when every bit is flipped: no spin has a field. */
  private static boolean unchangedByFlip(Qubo form) {
    double[] field = new double[form.size()];
    for (int i = 0; i < field.length; i++) {
      field[i] = 2 * form.linear(i);
    }
    form.forEachPair(
        (i, j, value) -> {
          field[i] += value;
          field[j] += value;
        });
    for (double h : field) {
      if (h != 0) {
        return false;
      }
    }
    return form.exact() && form.times(4).exact();
  }

  boolean possible() {
    return order.complete();
  }

  int width() {
    return order.width();
  }

  /** How many assignments are tried. */
  private double assignments() {
    return Math.scalb(1.0, conditioned.length - (flipped ? 1 : 0));
  }

  double steps() {
    return assignments() * new BucketTree(form, order).steps();
  }

  double bytes() {
    return 8.2 * new BucketTree(form, order).held();
  }

  void run(int threads, boolean counting, Vigil vigil) {
    BucketSweep sweep = new BucketSweep(new BucketTree(form, order), counting, threads, vigil);
    long assignments = (long) assignments();
    for (long a = 0; a < assignments; a++) {
      // The first of the conditioned variables stays 0 if all spins can be flipped.
      long values = flipped ? a << 1 : a;
      if (vigil.over() || !sweep.run(linear(values))) {
        return;
      }
      take(sweep, values, counting);
      vigil.report(
          OptionalDouble.of((a + 1.0) / assignments),
          OptionalDouble.of(lowest),
          OptionalDouble.empty());
    }
    complete = true;
    minima = flipped ? 2 * minima : minima;
  }

  private void take(BucketSweep sweep, long values, boolean counting) {
    double energy = constant(values) + sweep.minimum();
    if (energy < lowest) {
      lowest = energy;
      minima = 0;
      best = new boolean[form.size()];
      for (int c = 0; c < conditioned.length; c++) {
        best[conditioned[c]] = one(values, c);
      }
      sweep.assign(best);
    }
    if (counting && energy == lowest) {
      minima += sweep.minima();
    }
  }

  private static boolean one(long values, int c) {
    return (values >>> c & 1) != 0;
  }

  private double constant(long values) {
    double sum = form.constant();
    for (int c = 0; c < conditioned.length; c++) {
      if (one(values, c)) {
        sum += form.linear(conditioned[c]);
        for (int d = 0; d < c; d++) {
          sum += one(values, d) ? pair[c][conditioned[d]] : 0;
        }
      }
    }
    return sum;
  }

  private double[] linear(long values) {
    double[] linear = new double[form.size()];
    for (int i = 0; i < linear.length; i++) {
      linear[i] = form.linear(i);
    }
    for (int c = 0; c < conditioned.length; c++) {
      if (one(values, c)) {
        for (int i = 0; i < linear.length; i++) {
          linear[i] += pair[c][i];
        }
      }
    }
    return linear;
  }

  /** Whether every assignment was tried. */
  boolean complete() {
    return complete;
  }

  double lowest() {
    return lowest;
  }

  double minima() {
    return minima;
  }

  /** A state of the lowest energy so far, if there was time for any. */
  Optional<State> best() {
    return lowest == Double.POSITIVE_INFINITY ? Optional.empty() : Optional.of(State.of(best));
  }
}
