package dev.couplet.solve;

import dev.couplet.form.Qubo;
import dev.couplet.lower.Lowering;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Watch;
import java.util.Optional;

/**
 * The one-call way in: a model goes in, a plan with a bound on how far from optimal it can be comes
 * out.
 *
 * <p>Models with few plans are solved by looking at all of them, and the answer is proved. On
 * others that are not too large a branch and bound over the decisions is tried. Where it proves
 * nothing within its share of the effort, the model is lowered, bounded, and drawn from, and the
 * search goes on from the best plan with the time that is left. With the standard lowering,
 * required rules weigh little at first; where the lowest draw breaks one, its weight is raised and
 * drawn again, up to what is proved to suffice; that is told among the stages. A lowering of the
 * caller's own is used as it is. The plan is no proof of anything unless {@link Answer#proof} says
 * so. A target of the effort is a value in the model's own sense. Every plan returned was checked
 * against the model itself. Draws from a form with approximate penalties are bounded by nothing
 * that the form says, and go on past a target.
 *
 * <p>Also a {@link Sampler} of forms, with a bound in its draws; there a target is an energy.
 * Immutable and thread-safe.
 */
public final class Solver implements Sampler {
  private static final Solver STANDARD = new Solver(Lowering.standard(), Optional.empty());

  private final Lowering lowering;
  private final Optional<Plan> start;

  private Solver(Lowering lowering, Optional<Plan> start) {
    this.lowering = lowering;
    this.start = start;
  }

  /** The defaults: the standard lowering, no plan to start from. */
  public static Solver standard() {
    return STANDARD;
  }

  /** This solver with other settings for lowering models. */
  public Solver with(Lowering newLowering) {
    return new Solver(newLowering, start);
  }

  /** This solver, starting from a plan of the model; its answer is never worse than that plan. */
  public Solver from(Plan plan) {
    return new Solver(lowering, Optional.of(plan));
  }

  /** Solves a model as it stands now, unwatched. */
  public Answer solve(Model model, Effort effort) {
    return solve(model.snapshot(), effort, Watch.none());
  }

  /** Solves a model as it stands now. */
  public Answer solve(Model model, Effort effort, Watch watch) {
    return solve(model.snapshot(), effort, watch);
  }

  /**
   * Solves a statement.
   *
   * @throws IllegalArgumentException if the plan to start from is of another model, or the
   *     statement cannot be lowered
   */
  public Answer solve(Statement statement, Effort effort, Watch watch) {
    Optional<Plan> checked = start.map(plan -> onStatement(plan, statement));
    return new ModelSolver(statement, lowering, checked, effort, watch).answer();
  }

  private static Plan onStatement(Plan plan, Statement statement) {
    boolean fits =
        plan.statement().sameModel(statement) && plan.literals().size() == statement.literals();
    if (!fits) {
      throw new IllegalArgumentException(
          "the plan to start from is of "
              + plan.statement()
              + ", not of "
              + statement
              + "; evaluate it on the model that is solved");
    }
    return statement.plan(plan.literals());
  }

  @Override
  public Draws sample(Qubo form, Run run) {
    return FormSolver.sample(form, run);
  }

  @Override
  public String toString() {
    return "Solver(" + (start.isPresent() ? "from a plan" : "from nothing") + ")";
  }
}
