package dev.couplet.solve;

import dev.couplet.exact.PlanEnumeration.Found;
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

/** One run on a model, stage by stage. */
final class ModelSolver {
  private final Statement statement;
  private final Lowering lowering;
  private final Optional<Plan> start;
  private final Course course;

  ModelSolver(
      Statement statement, Lowering lowering, Optional<Plan> start, Effort effort, Watch watch) {
    this.statement = statement;
    this.lowering = lowering;
    this.start = start;
    this.course = new Course(effort, watch);
  }

  Answer answer() {
    return PlanStage.fits(statement, course) ? byEveryPlan() : byDraws();
  }

  private Answer byEveryPlan() {
    Found found = PlanStage.run(statement, course);
    if (!found.complete()) {
      Plan best = better(found.best().orElseGet(this::firstPlan));
      return answer(best, BoundStage.byRange(statement), course.vigil().reason());
    }
    int sign = statement.sense().sign();
    if (found.best().isEmpty()) {
      double beyondAll = sign * Double.POSITIVE_INFINITY;
      Plan nearest = start.orElseGet(this::firstPlan);
      return new Answer(nearest, beyondAll, Proof.INFEASIBLE, End.DONE, course.stages());
    }
    Plan best = found.best().get();
    return new Answer(best, best.value(), Proof.OPTIMAL, End.DONE, course.stages());
  }

  private Answer byDraws() {
    Lowered lowered = lowering.lower(statement);
    course.finished(
        "lowering", lowered.qubo().size() + " bits, " + lowered.qubo().pairs() + " pairs");
    double bound = BoundStage.run(lowered, course);
    List<State> starts = start.map(lowered::complete).map(List::of).orElse(List.of());
    OptionalDouble target = inEnergy(lowered, course.effort().target());
    Draws draws = DrawStage.run(lowered.qubo(), starts, lowered.structure(), bound, target, course);
    return answer(better(lowered.read(draws).best()), bound, DrawStage.end(draws, target));
  }

  private static OptionalDouble inEnergy(Lowered lowered, OptionalDouble value) {
    return value.isPresent()
        ? OptionalDouble.of(lowered.energyOf(value.getAsDouble()))
        : OptionalDouble.empty();
  }

  /** The plan, or the one to start from if that is better. */
  private Plan better(Plan plan) {
    return start.filter(given -> given.compareTo(plan) < 0).orElse(plan);
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

  private Answer answer(Plan plan, double lowest, End end) {
    int sign = statement.sense().sign();
    double cost = sign * plan.value();
    boolean optimal = plan.feasible() && cost <= lowest;
    double bound = plan.feasible() ? Math.min(lowest, cost) : lowest;
    Proof proof = optimal ? Proof.OPTIMAL : Proof.NONE;
    return new Answer(plan, sign * bound, proof, end, course.stages());
  }
}
