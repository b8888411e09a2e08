package dev.couplet.exact;

import dev.couplet.model.Choice;
import dev.couplet.model.Decision;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Vigil;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Looks at every plan of a model: every combination of values of its decisions, far fewer than the
 * patterns of the bits that the model is lowered to.
 *
 * <p>The result needs no weights and no lowering: the best feasible plan is optimal, and if there
 * is none, no plan keeps all rules. Plans are walked so that one decision moves by one value a
 * step; objective and rules are updated by the terms that speak of it.
 *
 * <p>Time O(plans x terms that a literal occurs in). Immutable and thread-safe.
 */
public final class PlanEnumeration {
  private static final int LOOK_EVERY = 1 << 12;

  private PlanEnumeration() {}

  /** An enumeration; it has no settings. */
  public static PlanEnumeration standard() {
    return new PlanEnumeration();
  }

  /**
   * What an enumeration found.
   *
   * @param best the best feasible plan among those looked at; the first of the walk among equals
   * @param looked how many plans were looked at
   * @param complete whether these were all
   */
  public record Found(Optional<Plan> best, long looked, boolean complete) {}

  /** The number of plans of a statement; the largest long if it is larger than that. */
  public long plans(Statement statement) {
    long plans = 1;
    for (Decision decision : statement.decisions()) {
      long values = decision.values();
      if (plans > Long.MAX_VALUE / values) {
        return Long.MAX_VALUE;
      }
      plans *= values;
    }
    return plans;
  }

  /** Looks at all plans, or at as many as the vigil allows. */
  public Found search(Statement statement, Vigil vigil) {
    Walk walk = new Walk(statement);
    double plans = plans(statement);
    for (long looked = 0; ; ) {
      if (looked % LOOK_EVERY == 0 && vigil.over()) {
        return new Found(walk.best, looked, false);
      }
      walk.look();
      looked++;
      if (!walk.step()) {
        return new Found(walk.best, looked, true);
      }
      if (looked % LOOK_EVERY == 0) {
        OptionalDouble share = OptionalDouble.of(looked / plans);
        vigil.report(share, walk.bestValue(), OptionalDouble.empty());
      }
    }
  }

  /** A plan that moves by one decision at a time. */
  private static final class Walk {
    private final Statement statement;
    private final List<Decision> moving;
    private final MixedRadix digits;
    private final PlanScore score;
    private final int[] before;
    private Optional<Plan> best = Optional.empty();
    private double lowest = Double.POSITIVE_INFINITY;

    Walk(Statement statement) {
      this.statement = statement;
      this.moving = statement.decisions().stream().filter(d -> d.values() > 1).toList();
      this.digits = new MixedRadix(moving.stream().mapToInt(Decision::values).toArray());
      this.score = new PlanScore(statement);
      this.before = new int[moving.size()];
      for (Decision decision : statement.decisions()) {
        if (decision instanceof Choice) {
          score.turnOn(statement.firstLiteral(decision));
        }
      }
    }

    /** Keeps the plan the walk stands at if it is feasible and better than the best so far. */
    void look() {
      if (!score.feasible() || score.cost() >= lowest + score.error()) {
        return;
      }
      Plan plan = statement.plan(score.state());
      double cost = statement.sense().sign() * plan.value();
      if (plan.feasible() && cost < lowest) {
        best = Optional.of(plan);
        lowest = cost;
      }
    }

    /** Moves one decision by one value; false if every plan has been seen. */
    boolean step() {
      int moved = digits.step();
      if (moved < 0) {
        return false;
      }
      int to = digits.digit(moved);
      int first = statement.firstLiteral(moving.get(moved));
      if (moving.get(moved) instanceof Choice) {
        score.turnOff(first + before[moved]);
        score.turnOn(first + to);
      } else if (to == 1) {
        score.turnOn(first);
      } else {
        score.turnOff(first);
      }
      before[moved] = to;
      return true;
    }

    OptionalDouble bestValue() {
      return best.map(plan -> OptionalDouble.of(plan.value())).orElse(OptionalDouble.empty());
    }
  }
}
