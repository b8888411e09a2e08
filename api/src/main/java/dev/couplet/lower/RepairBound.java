package dev.couplet.lower;

import dev.couplet.model.Choice;
import dev.couplet.model.Decision;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.util.HashMap;
import java.util.Map;

/**
 * The bound by repair: where from any pattern that breaks a rule (or code) some bit can be changed
 * so that the rule is broken by less and no other rule or code by more, a weight above the most
 * that such a change can cost is enough; it lowers the energy, since a penalty falls by at least 1
 * with each step. Other rules weigh by the range bound.
 *
 * <p>Then every pattern that is no feasible plan lies above the best one: if it breaks a rule that
 * weighs by the range bound, by that; else the repairs, one after the other, lead from it to a
 * feasible plan with lower energy each.
 *
 * <p>The condition, which {@link BitChanges} checks bit by bit:
 *
 * <ul>
 *   <li>every literal is a bit, and changing it costs a bounded amount in the objective and in
 *       preferred rules of at most two literals whose cost is not squared; literals of other
 *       preferred rules are left alone
 *   <li>a rule: it limits one linear sum of plain bits on one side, and every change of a bit that
 *       brings the sum towards the limit breaks no other rule further: that is, brings every sum
 *       with this bit that is limited towards its limit too
 *   <li>the code of a choice of one option: taking out any of its options breaks no rule further,
 *       and there is an option that can be put in without
 * </ul>
 */
final class RepairBound implements Weights {
  /** Less of the range bound would be lost in the rounding of energies that are not whole. */
  private static final double LEAST_SHARE = 0x1p-10;

  private final Weights otherwise = new RangeBound();

  /** What the repair of a rule or code costs at the most, by its name; none if there is none. */
  private final Map<String, Double> costs;

  private RepairBound(Map<String, Double> costs) {
    this.costs = costs;
  }

  /** Not yet prepared for a statement. */
  RepairBound() {
    this(Map.of());
  }

  @Override
  public Weights begin(Statement statement, boolean literalsAreBits) {
    Map<String, Double> found = new HashMap<>();
    if (literalsAreBits) {
      BitChanges changes = new BitChanges(statement);
      for (Rule rule : statement.rules()) {
        changes.repair(rule).ifPresent(cost -> found.put(rule.name(), cost));
      }
      for (Decision decision : statement.decisions()) {
        if (decision instanceof Choice) {
          changes.repair(decision).ifPresent(cost -> found.put(decision.code(), cost));
        }
      }
    }
    return new RepairBound(Map.copyOf(found));
  }

  @Override
  public Chosen choose(Facts facts) {
    Chosen byRange = otherwise.choose(facts);
    Double cost = costs.get(facts.rule());
    if (cost == null) {
      return new Chosen(byRange.value(), byRange.reason() + "; no repair by one bit is known");
    }
    double felt = facts.whole() ? cost : Math.max(cost, byRange.value() * LEAST_SHARE);
    double weight = RangeBound.above(felt, facts);
    String reason = "above " + Weights.shown(cost) + ", all that a repair by one bit can cost";
    return weight < byRange.value() ? new Chosen(weight, reason) : byRange;
  }
}
