package dev.couplet.exact.plans;

import dev.couplet.model.Plan;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/**
 * Branch and bound on a model: finds a plan and proves that no other is better, or that none keeps
 * the rules, without looking at all of them.
 *
 * <p>Decisions are taken one by one, depth first. Rules remove values that no plan can keep; the
 * costs of the rest give a bound by soft arc consistency and Lagrangian multipliers (see the
 * package), and values beyond the best plan known are left out. A search for a first plan comes
 * before the multipliers.
 *
 * <p>Options that all choices, rules and objectives treat alike, such as equal vans, are tried once
 * for all until they are taken.
 *
 * <p>Costs are compared in exact whole numbers; decimals count as they are written. Only where an
 * objective has so many digits that it cannot be scaled, costs are rounded down in the 13th or so;
 * then a plan is optimal up to that, and the bound says by how much.
 *
 * <p>The result is a function of statement, start, target and number of nodes unless time or stop
 * end it; draws, seed and threads do not matter. Time grows exponentially with the number of
 * decisions at the worst; a node takes time and memory linear in the size of the statement, pairs
 * counted with all combinations of their values. Immutable and thread-safe.
 */
public final class PlanSearch {
  private static final long PROBE = 1000;
  private static final int FEW_ROUNDS = 3;
  private static final int ROUNDS = 100;

  private final long nodes;
  private final ProofLog log;

  private PlanSearch(long nodes, ProofLog log) {
    this.nodes = nodes;
    this.log = log;
  }

  /** As many nodes as it takes. */
  public static PlanSearch standard() {
    return new PlanSearch(Long.MAX_VALUE, ProofLog.NONE);
  }

  /**
   * This method with at most so many nodes.
   *
   * @throws IllegalArgumentException if it is not 1 or more
   */
  public PlanSearch nodes(long most) {
    if (most < 1) {
      throw new IllegalArgumentException(
          "the number of nodes is " + most + ", it must be 1 or more");
    }
    return new PlanSearch(most, log);
  }

  /**
   * This method, writing what it does in lines from which a proof can be checked without it: what
   * is taken, what rules exclude, plans, and the numbers that a bound follows from (see {@code
   * ProofLog} for each line). It works for statements of required rules over sums, with objectives
   * of degree 2 at most and costs that can be scaled exactly; it does not make use of options that
   * are alike, and takes more nodes. What the receiver throws comes through.
   */
  public PlanSearch proof(Consumer<String> lines) {
    return new PlanSearch(nodes, ProofLog.to(lines));
  }

  /**
   * What a search found.
   *
   * @param best the best feasible plan found
   * @param bound no feasible plan is worth less, or more where the model maximises; infinite where
   *     nothing is known, and on the other side if it is proved that there is none
   * @param complete whether it is proved that there is no better plan, or none at all
   * @param nodes how many values were taken
   * @param alike options that are treated alike, of which one was tried for all; a class a text
   * @param end why the search ended; done if it came to its end or to the last node it may take
   */
  public record Found(
      Optional<Plan> best,
      double bound,
      boolean complete,
      long nodes,
      List<String> alike,
      End end) {}

  /** Whether a statement is small enough for the memory that a search takes. */
  public boolean fits(Statement statement) {
    return NetworkSize.fits(statement);
  }

  /**
   * Searches, from a plan of the statement if there is one.
   *
   * @param effort its time and its target, a value in the model's own sense, end the search
   * @throws IllegalArgumentException if the statement is too large, see {@link #fits}, or a proof
   *     is to be written that it is not simple enough for
   */
  public Found search(Statement statement, Optional<Plan> start, Effort effort, Watch watch) {
    requireFit(statement);
    Vigil vigil = Vigil.begin(effort, watch);
    Network network = NetworkBuilder.of(statement, rule -> true);
    if (log.on()) {
      requireSimple(statement, network);
    }
    log.unit(network);
    Best best = new Best(statement, network, log, effort.target(), vigil);
    start.ifPresent(best::start);
    Interchange interchange =
        log.on()
            ? Interchange.none(network.variables)
            : Likeness.of(statement, rule -> true, network.variables);
    Branching branching = new Branching(network, interchange, best, log, vigil);
    long bound = bound(network, branching, best, vigil);
    best.plan().ifPresent(PlanSearch::requireFeasible);
    boolean complete = bound == best.cost();
    double inOwnSense = inOwnSense(statement, network, best, bound);
    long taken = branching.nodes();
    return new Found(best.plan(), inOwnSense, complete, taken, interchange.found(), vigil.reason());
  }

  private static void requireSimple(Statement statement, Network network) {
    boolean simple = statement.objective().degree() <= 2 && network.scale.exact();
    for (Rule rule : statement.rules()) {
      simple &= rule.required();
      simple &= rule.parts().stream().allMatch(part -> part.terms().degree() <= 1);
    }
    if (!simple) {
      throw new IllegalArgumentException(
          "a proof is written for required rules over sums and objectives of degree 2 at most, with"
              + " costs of few digits; "
              + statement
              + " has others");
    }
  }

  private static void requireFeasible(Plan plan) {
    if (!plan.feasible()) {
      throw new IllegalStateException("a search keeps rules that its plan does not: " + plan);
    }
  }

  /**
   * Looks for a small set of required rules that no plan can keep together.
   *
   * @param effort its time ends the search
   * @return the rules; nothing if it cannot be proved within nodes and time that there are such
   * @throws IllegalArgumentException if the statement is too large, see {@link #fits}
   */
  public Optional<Conflict> conflict(Statement statement, Effort effort, Watch watch) {
    requireFit(statement);
    return new ConflictFilter(statement, nodes, Vigil.begin(effort, watch)).run();
  }

  private void requireFit(Statement statement) {
    if (!fits(statement)) {
      throw new IllegalArgumentException(
          statement + " is too large for a search of its plans; ask fits first");
    }
  }

  private long bound(Network network, Branching branching, Best best, Vigil vigil) {
    Partial root = new Partial(network);
    if (vigil.over()) {
      return root.bound();
    }
    if (!branching.begin(root, FEW_ROUNDS)) {
      return best.cost();
    }
    long bound = branching.walk(root, Math.min(nodes, PROBE));
    if (bound == best.cost() || vigil.over() || branching.nodes() >= nodes) {
      return bound;
    }
    if (!branching.raise(root, ROUNDS) || !branching.multipliers().run(root, 2 * ROUNDS)) {
      return best.cost();
    }
    return Math.max(bound, branching.walk(root, nodes));
  }

  private static double inOwnSense(Statement statement, Network network, Best best, long bound) {
    boolean complete = bound == best.cost();
    if (!complete || (best.plan().isPresent() && !network.scale.exact())) {
      return best.inOwnSense(bound);
    }
    double none = statement.sense().sign() * Double.POSITIVE_INFINITY;
    return best.plan().map(Plan::value).orElse(none);
  }

  @Override
  public String toString() {
    return nodes == Long.MAX_VALUE ? "PlanSearch()" : "PlanSearch(" + nodes + " nodes)";
  }
}
