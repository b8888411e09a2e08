package dev.couplet.examples.rounds;

import static dev.couplet.model.Expr.sum;

import dev.couplet.lower.Lowering;
import dev.couplet.lower.Weights;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import dev.couplet.model.Order;
import dev.couplet.model.Plan;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Watch;
import dev.couplet.solve.Answer;
import dev.couplet.solve.Solver;

/**
 * In what order a van visits its villages: from the library to the first of them, from each to the
 * next, and from the last back to the library, so that the way is short.
 */
final class VisitOrder {
  private final Model model;
  private final Order<Village> order;
  private final Round round;

  private VisitOrder(Round round, Library library) {
    this.round = round;
    this.model = Model.named("round of " + round.van());
    this.order = model.order("visits", round.villages());
    Expr out = sum(round.villages(), v -> order.first(v).times(library.distanceTo(v)));
    Expr back = sum(round.villages(), v -> order.last(v).times(library.distanceTo(v)));
    model.minimize("way", sum(out, order.stepCost(Village::distanceTo), back));
  }

  /**
   * An answer and the round as it says.
   *
   * @param round the villages in the order of the visits
   * @param answer its value is the way in metres
   */
  record Ordered(Round round, Answer answer) {}

  /** Orders a round of one village or more; the way is no longer than as it is given. */
  static Ordered of(Round round, Library library, Effort effort, Watch watch) {
    return new VisitOrder(round, library).ordered(effort, watch);
  }

  private Ordered ordered(Effort effort, Watch watch) {
    Plan given = model.plan().set(order, round.villages()).evaluate();
    Lowering lowering = Lowering.standard().with(Weights.incumbentBound(given));
    Answer answer = Solver.standard().with(lowering).from(given).solve(model, effort, watch);
    return new Ordered(new Round(round.van(), answer.plan().value(order)), answer);
  }
}
