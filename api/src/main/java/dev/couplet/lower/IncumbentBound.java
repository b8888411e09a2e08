package dev.couplet.lower;

import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.model.Unmet;

/**
 * The incumbent bound. Let L be the lowest value of the objective over all bit patterns and V that
 * of a feasible plan which is known. A pattern that breaks a rule is worth at least L + weight; the
 * best plan at most V. So weight &gt; V - L suffices, whatever the other rules weigh.
 */
final class IncumbentBound implements Weights {
  private final Plan incumbent;

  IncumbentBound(Plan incumbent) {
    this.incumbent = incumbent;
    requireFeasible(incumbent, incumbent.statement());
  }

  private static void requireFeasible(Plan plan, Statement statement) {
    if (!plan.feasible()) {
      Unmet first = plan.unmet().stream().filter(Unmet::required).findFirst().orElseThrow();
      throw new IllegalArgumentException(
          "the known plan is not feasible in "
              + statement
              + ": "
              + first
              + "; the bound needs one that keeps every required rule");
    }
  }

  @Override
  public Chosen choose(Facts facts) {
    Statement statement = facts.statement();
    Plan plan = incumbent;
    if (statement != plan.statement()) {
      if (!statement.sameModel(plan.statement())
          || statement.literals() != plan.literals().size()) {
        throw new IllegalArgumentException(
            "the known plan is of "
                + plan.statement()
                + ", not of "
                + statement
                + "; evaluate it on the model as it is lowered");
      }
      plan = statement.plan(plan.literals());
      requireFeasible(plan, statement);
    }
    double known = statement.sense().sign() * plan.value() + 0.0;
    double lowest = facts.objective().lowest();
    double width = Math.max(0, known - lowest);
    double weight = RangeBound.above(width, facts);
    String reason =
        "above "
            + Weights.shown(width)
            + ", all that can be won over a known plan: "
            + Weights.shown(lowest)
            + " at the least, "
            + Weights.shown(known)
            + " as it is";
    return new Chosen(weight, reason);
  }
}
