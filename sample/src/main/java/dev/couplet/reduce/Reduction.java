package dev.couplet.reduce;

import dev.couplet.bound.Roof;
import dev.couplet.bound.RoofDual;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Vigil;

/**
 * Makes a form smaller: removes bits by rules on their own coefficients (Boros, Hammer and Tavares,
 * Preprocessing of unconstrained quadratic binary optimization, 2006) and by the roof dual, in
 * turns, until neither removes any more, and splits the rest into connected parts.
 *
 * <p>Bits of at most two pairs always go, so that what is left has three pairs a bit or more,
 * unless every minimum is to be kept. Time near linear in n + m on sparse forms, but for the roof
 * dual. A run that ends early leaves the form as far as it was reduced. Immutable and thread-safe.
 */
public final class Reduction {
  private static final int LOOK_EVERY = 1 << 16;

  private final boolean every;
  private final boolean roof;

  private Reduction(boolean every, boolean roof) {
    this.every = every;
    this.roof = roof;
  }

  /** All rules; keeps at least one minimum. */
  public static Reduction standard() {
    return new Reduction(false, true);
  }

  /** Only the steps that keep every minimum: for counting them. */
  public Reduction keepEveryMinimum() {
    return new Reduction(true, roof);
  }

  /** Without the roof dual: linear time, and rules on each bit's own coefficients only. */
  public Reduction localOnly() {
    return new Reduction(every, false);
  }

  /** Reduces a form. Of the run, what ends it matters. */
  public Reduced reduce(Qubo form, Run run) {
    return reduce(form, run.begin());
  }

  /** Reduces a form, as a stage of a run that has begun. */
  public Reduced reduce(Qubo form, Vigil vigil) {
    Graph graph = new Graph(form);
    History history = new History(form.exact());
    LocalRules rules = new LocalRules(graph, history, every);
    for (int i = 0; i < graph.size; i++) {
      rules.reopen(i);
    }
    double bound = Double.NEGATIVE_INFINITY;
    while (true) {
      while (!vigil.over() && rules.work(LOOK_EVERY)) {
        // Rules go on until no bit waits.
      }
      int[] left = graph.left();
      if (!roof || left.length == 0 || vigil.over()) {
        break;
      }
      Roof fixed = RoofDual.standard().roof(graph.form(left, new int[graph.size], 0), vigil);
      bound = Math.max(bound, graph.constant + fixed.bound() - graph.slack);
      if (!apply(fixed, left, graph, history, rules)) {
        break;
      }
    }
    return new Reduced(form, graph, history, bound);
  }

  /** Removes what the roof dual of the rest fixes; whether that is anything. */
  private boolean apply(Roof fixed, int[] left, Graph graph, History history, LocalRules rules) {
    State which = every ? fixed.strong() : fixed.weak();
    graph.slack += which.ones() == 0 ? 0 : fixed.slack();
    for (int p = 0; p < left.length; p++) {
      if (which.get(p)) {
        rules.reopenNeighbours(left[p]);
        history.fixed(Removal.ROOF, left[p], fixed.values().get(p));
        graph.fix(left[p], fixed.values().get(p));
      }
    }
    return which.ones() > 0;
  }
}
