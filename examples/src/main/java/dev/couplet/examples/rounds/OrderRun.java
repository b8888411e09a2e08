package dev.couplet.examples.rounds;

import dev.couplet.model.Plan;
import dev.couplet.model.Unmet;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Watch;
import dev.couplet.solve.Proof;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The rounds in the order of the visits, in two ways: stage by stage, where the vans are chosen
 * first and each round is put in order afterwards; and jointly.
 *
 * @param library where the vans start and return
 * @param orders what the second stage came to, for each van that serves a village
 * @param staged the rounds stage by stage, for every van
 * @param wishes what the wishes cost that the first stage did not grant, in metres
 * @param joint the other way, unless there is too much for one model
 */
record OrderRun(
    Library library,
    List<VisitOrder.Ordered> orders,
    List<Round> staged,
    double wishes,
    Optional<JointRun> joint) {
  /** More villages in one round are not put in order: their form grows with the fourth power. */
  static final int MOST_VILLAGES = 40;

  OrderRun {
    orders = List.copyOf(orders);
    staged = List.copyOf(staged);
  }

  /** Whether a plan can be put in order: it keeps all rules, and no round is too large. */
  static boolean possible(RoundsModel rounds, Plan plan) {
    return plan.feasible()
        && rounds.rounds(plan).stream().allMatch(r -> r.villages().size() <= MOST_VILLAGES);
  }

  /**
   * Puts a plan in order, both ways.
   *
   * @param effort of whose time the second stage gets a quarter, and the joint model the rest: half
   *     for draws, a quarter for the solver
   */
  static OrderRun of(RoundsModel rounds, Plan plan, Effort effort, Watch watch) {
    RoundsData data = rounds.data();
    List<Round> given = rounds.rounds(plan);
    Effort share = share(effort, 4L * given.size());
    List<VisitOrder.Ordered> orders = new ArrayList<>();
    List<Round> staged = new ArrayList<>();
    for (Round round : given) {
      if (round.villages().isEmpty()) {
        staged.add(round);
      } else {
        orders.add(VisitOrder.of(round, data.library(), share, Watch.none()));
        staged.add(orders.get(orders.size() - 1).round());
      }
    }
    double wishes = plan.unmet().stream().mapToDouble(Unmet::cost).sum();
    Optional<JointRun> joint =
        JointModel.fits(data)
            ? Optional.of(JointRun.of(JointModel.of(data), staged, share(effort, 2), watch))
            : Optional.empty();
    return new OrderRun(data.library(), orders, staged, wishes, joint);
  }

  private static Effort share(Effort effort, long parts) {
    return effort.limit().map(limit -> effort.limit(limit.dividedBy(parts))).orElse(effort);
  }

  /** The better rounds: those of the joint model, where there is one. */
  List<Round> rounds() {
    return joint.map(JointRun::rounds).orElse(staged);
  }

  /** The ways of all vans, stage by stage. */
  long stagedWay() {
    return way(staged);
  }

  /** The ways of all vans in some rounds. */
  long way(List<Round> rounds) {
    return rounds.stream().mapToLong(round -> round.way(library)).sum();
  }

  /** What the rounds are worth, stage by stage: their ways, and the wishes that are not granted. */
  double stagedValue() {
    return stagedWay() + wishes;
  }

  /** No order of these villages by these vans is worth less. */
  double stagedBound() {
    return orders.stream().mapToDouble(ordered -> Math.max(0, ordered.answer().bound())).sum()
        + wishes;
  }

  /** Whether the order of every round is proved to be the best. */
  boolean stagedProved() {
    return orders.stream().allMatch(ordered -> ordered.answer().proof() == Proof.OPTIMAL);
  }
}
