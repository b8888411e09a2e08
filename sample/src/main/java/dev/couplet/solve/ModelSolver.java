package dev.couplet.solve;

import dev.couplet.exact.PlanEnumeration.Found;
import dev.couplet.exact.plans.Conflict;
import dev.couplet.exact.plans.PlanSearch;
import dev.couplet.form.State;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowering;
import dev.couplet.model.Decision;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Watch;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One run on a model, stage by stage: few plans are looked at one by one; else a search is tried
 * first, and where it proves nothing, draws and a second search share what is left.
 */
final class ModelSolver {
  private static final int FIRST_SHARE = 30;
  private static final int DRAWS_SHARE = 50;
  private static final int ALL = 100;
  private static final int LIGHT_ROUNDS = 5;

  private final Statement statement;
  private final Lowering lowering;
  private final Course course;
  private final int sign;
  private Optional<Plan> best;

  /** No feasible plan costs less, in the sense that everything is minimised. */
  private double lowest = Double.NEGATIVE_INFINITY;

  ModelSolver(
      Statement statement, Lowering lowering, Optional<Plan> start, Effort effort, Watch watch) {
    this.statement = statement;
    this.lowering = lowering;
    this.best = start;
    this.course = new Course(effort, watch);
    this.sign = statement.sense().sign();
  }

  Answer answer() {
    if (PlanStage.fits(statement, course)) {
      return byEveryPlan();
    }
    boolean searchable = PlanSearch.standard().fits(statement);
    if (searchable && searched(FIRST_SHARE)) {
      return proved(End.DONE);
    }
    End end = ended();
    if (end == End.DONE) {
      end = drawn(searchable);
    }
    if (end == End.DEADLINE && searchable && !course.vigil().over()) {
      if (searched(ALL)) {
        return proved(End.DONE);
      }
      end = ended() == End.DONE ? End.DEADLINE : ended();
    }
    return answer(end);
  }

  private Answer byEveryPlan() {
    Found found = PlanStage.run(statement, course);
    found.best().ifPresent(this::keep);
    if (found.complete()) {
      lowest = found.best().map(plan -> sign * plan.value()).orElse(Double.POSITIVE_INFINITY);
      return proved(End.DONE);
    }
    lowest = BoundStage.byRange(statement);
    return answer(course.vigil().reason());
  }

  /** Searches with a share of the time left; true if that proves the answer. */
  private boolean searched(int share) {
    Optional<Plan> feasible = best.filter(Plan::feasible);
    PlanSearch.Found found = SearchStage.run(statement, feasible, share, course);
    found.best().ifPresent(this::keep);
    lowest = Math.max(lowest, sign * found.bound());
    return found.complete();
  }

  /** Why the run is over by now, as far as stop, deadline and target go. */
  private End ended() {
    OptionalDouble target = course.effort().target();
    boolean reached =
        target.isPresent()
            && best.filter(Plan::feasible).isPresent()
            && sign * best.get().value() <= sign * target.getAsDouble();
    if (reached) {
      return End.TARGET;
    }
    return course.vigil().over() ? course.vigil().reason() : End.DONE;
  }

  /**
   * Draws; with the standard weights first with lighter ones, which are raised as far as lowest
   * draws break rules.
   */
  private End drawn(boolean searchedAfter) {
    int share = searchedAfter ? DRAWS_SHARE : ALL;
    if (lowering != Lowering.standard()) {
      return drawn(lowering, share).end();
    }
    Escalation escalation = new Escalation(statement);
    while (true) {
      boolean last = escalation.exhausted();
      Lowering weighed = lowering.with(escalation.weights(best));
      Drawn drawn = drawn(weighed, last ? share : share / LIGHT_ROUNDS);
      List<String> raised = last ? List.of() : escalation.raise(drawn.lowest());
      if (raised.isEmpty()) {
        boolean more = !last && drawn.end() == End.DEADLINE && !course.vigil().over();
        return more ? drawn(weighed, share).end() : drawn.end();
      }
      course.finished("weights", inWords(raised));
      if (course.vigil().over()) {
        return ended();
      }
    }
  }

  private static String inWords(List<String> raised) {
    String more = raised.size() == 1 ? "" : " and of " + (raised.size() - 1) + " more";
    return "too light, raised: that of '" + raised.get(0) + "'" + more;
  }

  /**
   * What draws came to.
   *
   * @param lowest the plan that the lowest draw stands for, feasible or not
   * @param end why they ended
   */
  private record Drawn(Plan lowest, End end) {}

  private Drawn drawn(Lowering weighed, int share) {
    Lowered lowered = weighed.lower(statement);
    course.finished(
        "lowering", lowered.qubo().size() + " bits, " + lowered.qubo().pairs() + " pairs");
    boolean exact = lowered.approximate().isEmpty();
    double bound = exact ? BoundStage.run(lowered, course) : BoundStage.byRange(statement);
    lowest = Math.max(lowest, bound);
    List<State> starts = best.map(lowered::complete).map(List::of).orElse(List.of());
    OptionalDouble target =
        exact ? inEnergy(lowered, course.effort().target()) : OptionalDouble.empty();
    double stopAt = exact ? lowest : Double.NEGATIVE_INFINITY;
    Draws draws =
        DrawStage.run(lowered.qubo(), starts, lowered.structure(), stopAt, target, share, course);
    keep(lowered.read(draws).best());
    Plan first = lowered.plan(draws.best().state());
    End end = DrawStage.end(draws, target);
    boolean light = end == End.TARGET && !first.feasible();
    boolean reached = !exact && ended() == End.TARGET;
    return new Drawn(first, reached ? End.TARGET : light ? End.DONE : end);
  }

  private static OptionalDouble inEnergy(Lowered lowered, OptionalDouble value) {
    return value.isPresent()
        ? OptionalDouble.of(lowered.energyOf(value.getAsDouble()))
        : OptionalDouble.empty();
  }

  /** Keeps the better of a plan and the best known; among equals the one known. */
  private void keep(Plan plan) {
    best = Optional.of(best.filter(known -> known.compareTo(plan) <= 0).orElse(plan));
  }

  /** Every choice at its first option, every bit unset: something to return when all else fails. */
  private Plan firstPlan() {
    boolean[] values = new boolean[statement.literals()];
    for (Decision decision : statement.decisions()) {
      for (List<Integer> group : statement.exactlyOne(decision)) {
        values[group.get(0)] = true;
      }
    }
    return statement.plan(State.of(values));
  }

  /** The best plan is optimal; or, if none is feasible, none can be. */
  private Answer proved(End end) {
    Plan plan = best.orElseGet(this::firstPlan);
    OptionalDouble target = course.effort().target();
    if (!plan.feasible()) {
      double beyondAll = sign * Double.POSITIVE_INFINITY;
      Optional<Conflict> conflict = ConflictStage.run(statement, course);
      return new Answer(plan, beyondAll, Proof.INFEASIBLE, end, conflict, course.stages());
    }
    double bound = Math.min(lowest, sign * plan.value());
    End why = target.isPresent() && ended() == End.TARGET ? End.TARGET : end;
    return new Answer(
        plan, sign * bound + 0.0, Proof.OPTIMAL, why, Optional.empty(), course.stages());
  }

  private Answer answer(End end) {
    Plan plan = best.orElseGet(this::firstPlan);
    double cost = sign * plan.value();
    boolean optimal = plan.feasible() && cost <= lowest;
    double bound = plan.feasible() ? Math.min(lowest, cost) : lowest;
    Proof proof = optimal ? Proof.OPTIMAL : Proof.NONE;
    return new Answer(plan, sign * bound + 0.0, proof, end, Optional.empty(), course.stages());
  }
}
