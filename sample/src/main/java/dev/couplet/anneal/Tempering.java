package dev.couplet.anneal;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Qubo;
import dev.couplet.kernel.Adjacency;
import dev.couplet.kernel.DrawLoop;
import dev.couplet.kernel.Drawer;
import dev.couplet.kernel.Pace;
import dev.couplet.kernel.SweepOrder;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Vigil;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.Supplier;

/**
 * Replica exchange, also known as parallel tempering: states on a ladder of temperatures make
 * Metropolis sweeps, and neighbours on the ladder change places, so that a state that is stuck in
 * the cold is warmed up and comes back.
 *
 * <p>Each draw is a run of its own, with a ladder of its own. A sweep of the effort is a sweep of
 * every rung and one round of exchanges. If the effort leaves the number of sweeps open, a draw of
 * a counted effort makes 1,000, fewer if form and ladder are large; draws of a timed effort become
 * longer, each twice as long as the one before. A draw ends early when it reaches the target. It
 * gives the lowest state seen, brought to a local minimum; with {@link Finish#NONE} the state on
 * the coldest rung after the last sweep, which is a sample at that temperature.
 *
 * <p>Temperatures grow by one factor from rung to rung, between ends that follow from the form
 * unless they are set; the number of rungs follows from the number of variables. With clusters,
 * each draw has two ladders, and states on the same cold rung trade clusters in which they differ:
 * worth its price on sparse forms alone, and the standard where variables have four pairs or fewer
 * on average, as on square lattices.
 *
 * <p>Where the run knows exactly-one sets, each sweep also tries to move the 1 of every set, as in
 * {@link Annealing}.
 *
 * <p>Cost: a sweep takes r times the O(n + d) steps of a sweep of annealing, r rungs (twice that
 * with clusters, and O(n + m) a rung for them). Memory: 24 bytes a pair, as much again on sparse
 * forms, and 16 r bytes a variable, ladder and thread. Immutable and thread-safe.
 *
 * <p>Sources: Hukushima and Nemoto, "Exchange Monte Carlo method and application to spin glass
 * simulations" (1996); for the clusters Zhu, Ochoa and Katzgraber, "Efficient cluster algorithm for
 * spin glasses in any space dimension" (2015).
 */
@CheckReturnValue
public final class Tempering implements Sampler {
  private static final int LEAST_RUNGS = 8;
  private static final int MOST_RUNGS = 32;
  private static final int MOST_VARIABLES = 1 << 24;

  /** Of so many pairs a variable, what differs between two cold states falls into many clusters. */
  private static final int CLUSTERED_DEGREE = 4;

  /** The hot end of annealing, where nearly every flip is accepted, is hotter than need be. */
  private static final double HOT_SHARE = 0.25;

  private static final Tempering STANDARD =
      new Tempering(
          OptionalInt.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalInt.empty(),
          Finish.DESCENT);

  private final OptionalInt rungs;
  private final OptionalDouble hot;
  private final OptionalDouble cold;
  private final OptionalInt ladders;
  private final Finish finish;

  private Tempering(
      OptionalInt rungs,
      OptionalDouble hot,
      OptionalDouble cold,
      OptionalInt ladders,
      Finish finish) {
    this.rungs = rungs;
    this.hot = hot;
    this.cold = cold;
    this.ladders = ladders;
    this.finish = finish;
  }

  /** Rungs that follow from the form, clusters where it has two pairs a variable, and a descent. */
  public static Tempering standard() {
    return STANDARD;
  }

  /**
   * This method with a ladder of so many temperatures.
   *
   * @throws IllegalArgumentException if it is not 1 or more
   */
  public Tempering rungs(int number) {
    if (number < 1) {
      throw new IllegalArgumentException(
          "the number of rungs is " + number + ", it must be 1 or more");
    }
    return new Tempering(OptionalInt.of(number), hot, cold, ladders, finish);
  }

  /**
   * This method with the given temperature of the hottest rung, in units of energy.
   *
   * @throws IllegalArgumentException if it is not a finite number above zero
   */
  public Tempering hot(double temperature) {
    double checked = Check.temperature("the hot temperature", temperature);
    return new Tempering(rungs, OptionalDouble.of(checked), cold, ladders, finish);
  }

  /**
   * This method with the given temperature of the coldest rung, in units of energy.
   *
   * @throws IllegalArgumentException if it is not a finite number above zero
   */
  public Tempering cold(double temperature) {
    double checked = Check.temperature("the cold temperature", temperature);
    return new Tempering(rungs, hot, OptionalDouble.of(checked), ladders, finish);
  }

  /** This method with two ladders a draw, and clusters traded between them, on any form. */
  public Tempering clusters() {
    return new Tempering(rungs, hot, cold, OptionalInt.of(2), finish);
  }

  /** This method with one ladder a draw, on any form. */
  public Tempering withoutClusters() {
    return new Tempering(rungs, hot, cold, OptionalInt.of(1), finish);
  }

  /** This method with the given end of each draw. */
  public Tempering finish(Finish newFinish) {
    return new Tempering(rungs, hot, cold, ladders, newFinish);
  }

  @Override
  public Draws sample(Qubo form, Run run) {
    Vigil vigil = run.begin(form);
    run.requireFit(form.size());
    Pace setUp = Pace.of(vigil);
    Optional<Adjacency> built = setUp.look() ? Optional.empty() : Adjacency.of(form, setUp);
    if (built.isEmpty()) {
      return DrawLoop.unbegun(form, run, vigil);
    }
    Adjacency rows = built.get();
    LadderPlan plan = plan(rows, run, setUp);
    if (setUp.look()) {
      return DrawLoop.unbegun(form, run, vigil);
    }
    SweepOrder order = SweepOrder.of(rows, setUp);
    Supplier<Drawer> drawers = () -> new Temperer(form, order, run, plan, Pace.of(vigil));
    return DrawLoop.run(form, run, vigil, 1, drawers);
  }

  private LadderPlan plan(Adjacency rows, Run run, Pace setUp) {
    double[] inverse = ladder(rows, run, setUp);
    boolean sparse = rows.pairs() <= CLUSTERED_DEGREE / 2 * rows.size();
    int number = ladders.orElse(sparse ? 2 : 1);
    Sweeps sweeps = Sweeps.ofLadders(rows, run.effort(), number * inverse.length);
    return new LadderPlan(inverse, number, sweeps, finish);
  }

  /** Inverse temperatures, the coldest first; their logarithms are evenly spaced. */
  private double[] ladder(Adjacency rows, Run run, Pace setUp) {
    Temperatures own = Temperatures.of(rows, run.structure(), setUp);
    double top = hot.orElse(Math.max(HOT_SHARE * own.hot(), cold.orElse(own.cold())));
    double bottom = cold.orElse(Math.min(own.cold(), top));
    double[] inverse = new double[rungs.orElse(suited(rows.size()))];
    for (int rung = 0; rung < inverse.length; rung++) {
      double share = inverse.length == 1 ? 0 : rung / (inverse.length - 1.0);
      inverse[rung] = 1 / Path.GEOMETRIC.temperature(bottom, top, share);
    }
    return inverse;
  }

  /** Energies of neighbours overlap if the number of rungs grows with the root of the size. */
  private static int suited(int size) {
    int byRoot = 4 + (int) Math.sqrt(size) / 2;
    int fitting = Math.max(1, MOST_VARIABLES / Math.max(1, size));
    return Math.min(fitting, Math.max(LEAST_RUNGS, Math.min(MOST_RUNGS, byRoot)));
  }

  @Override
  public String toString() {
    return "Tempering(rungs "
        + (rungs.isPresent() ? rungs.getAsInt() : "from the form")
        + ", hot "
        + Check.text(hot)
        + ", cold "
        + Check.text(cold)
        + (ladders.isEmpty() ? ", " : ladders.getAsInt() > 1 ? ", clusters, " : ", no clusters, ")
        + finish
        + ")";
  }
}
