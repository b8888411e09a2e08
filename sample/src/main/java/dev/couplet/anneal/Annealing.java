package dev.couplet.anneal;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Qubo;
import dev.couplet.kernel.Adjacency;
import dev.couplet.kernel.DrawLoop;
import dev.couplet.kernel.Drawer;
import dev.couplet.kernel.Pace;
import dev.couplet.kernel.ReplicaRows;
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
 * Simulated annealing: Metropolis sweeps at a falling temperature, then a descent to a local
 * minimum.
 *
 * <p>Each draw is independent of the others. If the effort leaves the number of sweeps open, a draw
 * of a counted effort makes 1,000 sweeps, fewer if the form is large; draws of a timed effort begin
 * short and become longer, so that easy forms are sampled often and hard ones thoroughly. Hot and
 * cold follow from the form's coefficients unless they are set.
 *
 * <p>Where the run knows exactly-one sets, each sweep also tries to move the 1 of every set to
 * another of its bits, in one step, without climbing over the penalty between them.
 *
 * <p>If the coefficients are small integers in units of their common divisor (pairs up to 15, a
 * variable with all its pairs up to 127) and there are 32 draws or more, or as many as time allows
 * in a form of at most 2^14 variables, 64 draws are made at once, with random numbers of their own:
 * each bit of a word belongs to one. Those are other draws than the same seed gives to a run of
 * fewer draws.
 *
 * <p>Cost: a sweep takes O(n + d) steps, d the degrees of the variables that flip: O(n + m) at
 * most; made 64 at once, a draw takes about a twentieth of that. Memory: 24 bytes a pair, as much
 * again on sparse forms, which are arranged for the sweeps, and 16 bytes a variable and thread.
 * Immutable and thread-safe.
 *
 * <p>Source: Kirkpatrick, Gelatt and Vecchi, "Optimization by simulated annealing" (1983).
 */
@CheckReturnValue
public final class Annealing implements Sampler {
  private static final int MANY = 32;

  /** In larger forms, time is better spent on one long draw than on 64 short ones. */
  private static final int MOST_BITS_OF_TIMED = 1 << 14;

  private static final Annealing STANDARD =
      new Annealing(
          Cooling.geometric(), OptionalDouble.empty(), OptionalDouble.empty(), Finish.DESCENT);

  private final Cooling cooling;
  private final OptionalDouble hot;
  private final OptionalDouble cold;
  private final Finish finish;

  private Annealing(Cooling cooling, OptionalDouble hot, OptionalDouble cold, Finish finish) {
    this.cooling = cooling;
    this.hot = hot;
    this.cold = cold;
    this.finish = finish;
  }

  /** Geometric cooling between temperatures that follow from the form, and a descent. */
  public static Annealing standard() {
    return STANDARD;
  }

  /** This method with another path of the temperature. */
  public Annealing cooling(Cooling newCooling) {
    return new Annealing(newCooling, hot, cold, finish);
  }

  /**
   * This method with the given temperature of the first sweep, in units of energy.
   *
   * @throws IllegalArgumentException if it is not a finite number above zero
   */
  public Annealing hot(double temperature) {
    double checked = Check.temperature("the hot temperature", temperature);
    return new Annealing(cooling, OptionalDouble.of(checked), cold, finish);
  }

  /**
   * This method with the given temperature of the last sweep, in units of energy.
   *
   * @throws IllegalArgumentException if it is not a finite number above zero
   */
  public Annealing cold(double temperature) {
    double checked = Check.temperature("the cold temperature", temperature);
    return new Annealing(cooling, hot, OptionalDouble.of(checked), finish);
  }

  /** This method with the given end of each draw. */
  public Annealing finish(Finish newFinish) {
    return new Annealing(cooling, hot, cold, newFinish);
  }

  @Override
  public Draws sample(Qubo form, Run run) {
    Vigil vigil = run.begin(form);
    run.requireFit(form.size());
    Pace setUp = Pace.of(vigil);
    Optional<Adjacency> rows = setUp.look() ? Optional.empty() : Adjacency.of(form, setUp);
    Optional<ReplicaRows> replicas =
        rows.filter(built -> many(built, run)).flatMap(built -> ReplicaRows.of(built, setUp));
    int batch = replicas.isPresent() ? ReplicaAnnealer.BATCH : 1;
    Optional<Schedule> schedule = rows.map(built -> schedule(built, run, batch, setUp));
    Optional<Supplier<Drawer>> drawers =
        replicas.isPresent()
            ? replicas.map(many -> () -> new ReplicaAnnealer(many, run, schedule.get(), finish))
            : rows.map(one -> single(one, run, schedule.get(), vigil));
    return drawers.isEmpty() || setUp.look()
        ? DrawLoop.unbegun(form, run, vigil)
        : DrawLoop.run(form, run, vigil, batch, drawers.get());
  }

  private Supplier<Drawer> single(Adjacency rows, Run run, Schedule schedule, Vigil vigil) {
    SweepOrder order = SweepOrder.of(rows, Pace.of(vigil));
    return () -> new Annealer(order, run, schedule, finish, Pace.of(vigil));
  }

  /** Whether 64 draws are to be made at once, all by single flips. */
  private static boolean many(Adjacency rows, Run run) {
    OptionalInt draws = run.effort().draws();
    boolean worthwhile =
        draws.isPresent() ? draws.getAsInt() >= MANY : rows.size() <= MOST_BITS_OF_TIMED;
    return worthwhile && run.structure().exactlyOne().isEmpty();
  }

  private Schedule schedule(Adjacency rows, Run run, int batch, Pace setUp) {
    Temperatures own = Temperatures.of(rows, run.structure(), setUp);
    double first = hot.orElse(Math.max(own.hot(), cold.orElse(0)));
    Temperatures ends = new Temperatures(first, cold.orElse(Math.min(own.cold(), first)));
    return new Schedule(cooling, ends, Sweeps.of(rows, run.effort(), batch));
  }

  @Override
  public String toString() {
    return "Annealing("
        + cooling
        + ", hot "
        + Check.text(hot)
        + ", cold "
        + Check.text(cold)
        + ", "
        + finish
        + ")";
  }
}
