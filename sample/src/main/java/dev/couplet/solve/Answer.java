package dev.couplet.solve;

import dev.couplet.exact.plans.Conflict;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement.Sense;
import dev.couplet.sampling.End;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * What a solver returns: the best plan it found, how good it is, and how good any plan can be.
 *
 * <p>Value and bound are in the model's own sense and units: no feasible plan is worth less than
 * the bound if the model minimises, or more if it maximises. Whether the plan is feasible ({@code
 * plan().feasible()}), why the run ended and what is proved are separate facts. Immutable.
 */
public final class Answer {
  private final Plan plan;
  private final double bound;
  private final Proof proof;
  private final End end;
  private final Optional<Conflict> conflict;
  private final List<Stage> stages;

  Answer(
      Plan plan,
      double bound,
      Proof proof,
      End end,
      Optional<Conflict> conflict,
      List<Stage> stages) {
    this.plan = plan;
    this.bound = bound;
    this.proof = proof;
    this.end = end;
    this.conflict = conflict;
    this.stages = List.copyOf(stages);
  }

  /** The best plan found: feasible if any was, else the one that comes first among the others. */
  public Plan plan() {
    return plan;
  }

  /** What the plan is worth; says nothing if the plan is infeasible. */
  public double value() {
    return plan.value();
  }

  /**
   * A proved bound on the value of every feasible plan; infinite, on the side where it says
   * nothing, if none was found. If it is proved that there is no feasible plan, infinite on the
   * other side.
   */
  public double bound() {
    return bound;
  }

  /** How far the plan can be from optimal: 0 or more; infinite if the plan is infeasible. */
  public double gap() {
    if (!plan.feasible()) {
      return Double.POSITIVE_INFINITY;
    }
    boolean minimises = plan.statement().sense() == Sense.MINIMIZE;
    return Math.max(0, minimises ? value() - bound : bound - value());
  }

  /** What is proved. */
  public Proof proof() {
    return proof;
  }

  /** Why the run ended. */
  public End end() {
    return end;
  }

  /**
   * Required rules that cannot hold together, as few as could be found with the effort; nothing
   * unless it is proved that no plan keeps all rules, and not always then.
   */
  public Optional<Conflict> conflict() {
    return conflict;
  }

  /** What each stage did, in order. */
  public List<Stage> stages() {
    return stages;
  }

  @Override
  public String toString() {
    return String.format(
        Locale.ROOT,
        "Answer(%s, value %.12g, bound %.12g, gap %.12g, proof %s, end %s)",
        plan.feasible() ? "feasible" : "infeasible",
        value(),
        bound,
        gap(),
        proof,
        end);
  }
}
