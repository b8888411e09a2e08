package dev.couplet.exact.plans;

import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Vigil;
import java.util.Optional;
import java.util.OptionalDouble;

/** The best plan known so far, and what it costs in fine units. */
final class Best {
  /** Above the costs of all plans, whatever they are. */
  private static final long UNLIMITED = 1L << 50;

  private final Statement statement;
  private final Network network;
  private final ProofLog log;
  private final OptionalDouble target;
  private final Vigil vigil;
  private Optional<Plan> plan = Optional.empty();
  private long cost;

  /**
   * Nothing known yet.
   *
   * @param target the value, in the model's own sense, with which a run may end
   * @param vigil the watch over the run
   */
  Best(Statement statement, Network network, ProofLog log, OptionalDouble target, Vigil vigil) {
    this.statement = statement;
    this.log = log;
    this.network = network;
    this.target = target;
    this.vigil = vigil;
    this.cost = Long.MAX_VALUE;
  }

  Optional<Plan> plan() {
    return plan;
  }

  OptionalDouble value() {
    return plan.map(known -> OptionalDouble.of(known.value())).orElse(OptionalDouble.empty());
  }

  /** A bound in fine units as one in the model's own sense and units. */
  double inOwnSense(long bound) {
    return statement.sense().sign() * network.value(bound) + 0.0;
  }

  /** What the best plan costs; more than any bound if there is none. */
  long cost() {
    return cost;
  }

  /** Plans that cost more are of no interest. */
  long limit() {
    if (plan.isEmpty() && log.on()) {
      return UNLIMITED;
    }
    return plan.isEmpty() ? network.ceiling : cost - Math.max(1, network.grain);
  }

  /** Takes a plan to begin with, if it is feasible. */
  void start(Plan given) {
    if (given.feasible()) {
      Partial partial = new Partial(network);
      Propagation propagation = new Propagation(network, ProofLog.NONE, vigil);
      if (!propagation.begin(partial)) {
        return;
      }
      for (int value : network.variables.taken(given.literals())) {
        boolean open = partial.settled[network.variables.variableOf(value)] < 0;
        if (open && (!partial.left[value] || !propagation.take(partial, value))) {
          return;
        }
      }
      if (partial.open == 0 && new Rests(network, propagation).run(partial)) {
        take(given, partial.bound());
      }
    }
  }

  /** Takes what a walk has come to, every variable settled. */
  void found(Partial partial) {
    if (plan.isPresent() && partial.bound() >= cost) {
      return;
    }
    take(statement.plan(network.variables.literals(partial.settled)), partial.bound());
  }

  private void take(Plan better, long itsCost) {
    log.plan(better.literals());
    plan = Optional.of(better);
    cost = itsCost;
    int sign = statement.sense().sign();
    if (target.isPresent() && sign * better.value() <= sign * target.getAsDouble()) {
      vigil.end(End.TARGET);
    }
  }
}
