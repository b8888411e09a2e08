package dev.couplet.exact;

import dev.couplet.bound.RoofDual;
import dev.couplet.bound.Rounding;
import dev.couplet.bound.SemidefiniteBound;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.reduce.Reduced;
import dev.couplet.reduce.Reduction;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The tree of one branch and bound: a form is reduced, its parts are solved by themselves, a part
 * that is small enough by enumeration or elimination, any other by setting one bit to either value.
 *
 * <p>Every search is for states below a cutoff, the energy of the best state known. What cannot be
 * below is left out; the rest is searched depth first.
 */
final class Branching {
  /** Parts of at most so many bits are enumerated. */
  private static final int FEW_BITS = 20;

  /** The whole form, if it is dense, is enumerated up to so many bits: branching would not pay. */
  private static final int FEW_DENSE_BITS = 30;

  /** Parts whose elimination takes at most so many steps are eliminated. */
  private static final double FEW_STEPS = 1 << 20;

  private static final int MOST_SEMIDEFINITE = 300;
  private static final int ROUNDS = 200;
  private static final int ROOT_ROUNDS = 300;
  private static final int FEW_ROUNDS = 41;

  private final Vigil vigil;
  private final long mostNodes;
  private final int threads;
  private long nodes;

  Branching(long mostNodes, int threads, Vigil vigil) {
    this.threads = threads;
    this.mostNodes = mostNodes;
    this.vigil = vigil;
  }

  private boolean over() {
    return nodes >= mostNodes || vigil.over();
  }

  /** Looks for the best state of a form below the cutoff. */
  Outcome solve(Qubo form, double cutoff, double known) {
    if (over()) {
      return Outcome.none(known);
    }
    nodes++;
    Reduced reduced = Reduction.standard().reduce(form, vigil);
    double bound = Math.max(known, reduced.bound());
    if (bound >= cutoff) {
      return Outcome.none(bound);
    }
    List<Qubo> parts = reduced.parts();
    double[] partBound = new double[parts.size()];
    double sum = reduced.constant() - reduced.slack();
    for (int p = 0; p < partBound.length; p++) {
      partBound[p] =
          partBound.length == 1
              ? bound - sum
              : RoofDual.standard().roof(parts.get(p), vigil).bound();
    }
    List<State> states = new ArrayList<>();
    for (int p = 0; p < partBound.length; p++) {
      double others = sum;
      for (int q = 0; q < partBound.length; q++) {
        others += q == p ? 0 : partBound[q];
      }
      Outcome part = solvePart(parts.get(p), cutoff - others, partBound[p]);
      partBound[p] = part.bound();
      if (part.state().isEmpty()) {
        return Outcome.none(Math.max(bound, others + part.bound()));
      }
      states.add(part.state().get());
    }
    for (double own : partBound) {
      sum += own;
    }
    State state = reduced.restore(states);
    double energy = form.value(state);
    double proved = Math.max(bound, sum);
    return energy < cutoff ? Outcome.found(state, energy, proved) : Outcome.none(proved);
  }

  private Outcome solvePart(Qubo part, double cutoff, double bound) {
    if (part.size() <= FEW_BITS || (nodes == 1 && small(part))) {
      return enumerate(part, cutoff, bound);
    }
    Optional<Outcome> direct = eliminate(part);
    if (direct.isPresent()) {
      Outcome all = direct.get();
      return all.energy() < cutoff ? all : Outcome.none(all.bound());
    }
    double raised = Math.max(bound, semidefinite(part, cutoff));
    return over() || raised >= cutoff ? Outcome.none(raised) : branch(part, cutoff, raised);
  }

  private static boolean small(Qubo part) {
    return dense(part) && part.size() <= FEW_DENSE_BITS;
  }

  private static boolean dense(Qubo part) {
    return 4L * part.pairs() > (long) part.size() * part.size();
  }

  private Outcome enumerate(Qubo part, double cutoff, double bound) {
    Levels levels = Enumeration.lowest(part, cutoff, threads, vigil);
    double rounding = 2 * Rounding.ofEnergy(part);
    if (!levels.complete()) {
      return Outcome.none(bound);
    }
    if (levels.levels().isEmpty() || levels.minimum() >= cutoff) {
      return Outcome.none(Math.max(bound, cutoff - rounding));
    }
    return Outcome.found(levels.lowest().get(0), levels.minimum(), levels.minimum() - rounding);
  }

  private Optional<Outcome> eliminate(Qubo part) {
    if (part.pairs() > 3L * part.size()) {
      return Optional.empty();
    }
    Elimination elimination = Elimination.standard().width(18).conditioned(0);
    OptionalDouble steps = elimination.steps(part);
    if (steps.isEmpty() || steps.getAsDouble() > FEW_STEPS) {
      return Optional.empty();
    }
    Draws draws = elimination.sample(part, Run.of(Effort.draws(1)));
    double bound = draws.bound().orElseThrow();
    return Optional.of(Outcome.found(draws.best().state(), draws.best().energy(), bound));
  }

  /**
   * The bound for dense parts, and for the whole form, so that a search cut short has a good one.
   */
  private double semidefinite(Qubo part, double cutoff) {
    boolean whole = nodes == 1 && part.pairs() > 3L * part.size();
    if (part.size() > MOST_SEMIDEFINITE || over() || !(whole || dense(part))) {
      return Double.NEGATIVE_INFINITY;
    }
    SemidefiniteBound method = SemidefiniteBound.standard();
    if (nodes > 1) {
      return method.rounds(ROUNDS).below(part, cutoff, vigil);
    }
    // However far it is from enough: this is what a search cut short will have.
    int rounds = dense(part) ? ROOT_ROUNDS : FEW_ROUNDS;
    return method.rounds(rounds).below(part, Double.POSITIVE_INFINITY, vigil);
  }

  private Outcome branch(Qubo part, double cutoff, double bound) {
    int bit = heaviest(part);
    boolean first = part.linear(bit) + field(part, bit) / 2 < 0;
    Outcome one = child(part, bit, first, cutoff, bound);
    Outcome two = child(part, bit, !first, Math.min(cutoff, one.energy()), bound);
    double proved = Math.min(one.bound(), two.bound());
    Outcome better = two.energy() < one.energy() ? two : one;
    return new Outcome(better.state(), better.energy(), proved);
  }

  private Outcome child(Qubo part, int bit, boolean value, double cutoff, double bound) {
    double slack = Rounding.ofSums(part, 2);
    Outcome below = solve(fixed(part, bit, value), cutoff + slack, bound - slack);
    double proved = Math.max(bound, below.bound() - slack);
    if (below.state().isEmpty()) {
      return Outcome.none(proved);
    }
    State state = with(below.state().get(), bit, value);
    double energy = part.value(state);
    return energy < cutoff ? Outcome.found(state, energy, proved) : Outcome.none(proved);
  }

  /** The bit whose pairs weigh most: without it the rest is bound best. */
  private static int heaviest(Qubo part) {
    double[] weight = new double[part.size()];
    part.forEachPair(
        (i, j, value) -> {
          weight[i] += Math.abs(value);
          weight[j] += Math.abs(value);
        });
    int heaviest = 0;
    for (int i = 1; i < weight.length; i++) {
      heaviest = weight[i] > weight[heaviest] ? i : heaviest;
    }
    return heaviest;
  }

  private static double field(Qubo part, int bit) {
    double[] sum = {0};
    part.forEachPair((i, j, value) -> sum[0] += i == bit || j == bit ? value : 0);
    return sum[0];
  }

  /** The form with one bit set; the bits above it move down by one. */
  private static Qubo fixed(Qubo part, int bit, boolean value) {
    Qubo.Builder form = Qubo.builder(part.size() - 1).allowRounding();
    form.addConstant(part.constant() + (value ? part.linear(bit) : 0));
    for (int i = 0; i < part.size(); i++) {
      if (i != bit) {
        form.addLinear(i < bit ? i : i - 1, part.linear(i));
      }
    }
    part.forEachPair(
        (i, j, weight) -> {
          if (i == bit || j == bit) {
            int other = i == bit ? j : i;
            form.addLinear(other < bit ? other : other - 1, value ? weight : 0);
          } else {
            form.addPair(i < bit ? i : i - 1, j < bit ? j : j - 1, weight);
          }
        });
    return form.build();
  }

  private static State with(State rest, int bit, boolean value) {
    boolean[] values = new boolean[rest.size() + 1];
    for (int i = 0; i < values.length; i++) {
      values[i] = i == bit ? value : rest.get(i < bit ? i : i - 1);
    }
    return State.of(values);
  }
}
