package dev.couplet.exact.plans;

import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.util.Optional;

/**
 * Branch and bound on a model: finds a plan and proves that no other is better, or that none keeps
 * the rules, without looking at all of them.
 *
 * <p>Decisions are taken one by one, depth first. Rules remove values that no plan can keep; the
 * costs of the rest give a bound by soft arc consistency and Lagrangian multipliers (see the
 * package), and values beyond the best plan known are left out. A search for a first plan comes
 * before the multipliers.
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
  private static final int ROUNDS = 100;

  private final long nodes;

  private PlanSearch(long nodes) {
    this.nodes = nodes;
  }

  /** As many nodes as it takes. */
  public static PlanSearch standard() {
    return new PlanSearch(Long.MAX_VALUE);
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
    return new PlanSearch(most);
  }

  /**
   * What a search found.
   *
   * @param best the best feasible plan found
   * @param bound no feasible plan is worth less, or more where the model maximises; infinite where
   *     nothing is known, and on the other side if it is proved that there is none
   * @param complete whether it is proved that there is no better plan, or none at all
   * @param nodes how many values were taken
   * @param end why the search ended; done if it came to its end or to the last node it may take
   */
  public record Found(Optional<Plan> best, double bound, boolean complete, long nodes, End end) {}

  /** Whether a statement is small enough for the memory that a search takes. */
  public boolean fits(Statement statement) {
    return NetworkSize.fits(statement);
  }

  /**
   * Searches, from a plan of the statement if there is one.
   *
   * @param effort its time and its target, a value in the model's own sense, end the search
   * @throws IllegalArgumentException if the statement is too large, see {@link #fits}
   */
  public Found search(Statement statement, Optional<Plan> start, Effort effort, Watch watch) {
    if (!fits(statement)) {
      throw new IllegalArgumentException(
          statement + " is too large for a search of its plans; ask fits first");
    }
    Vigil vigil = Vigil.begin(effort, watch);
    Network network = NetworkBuilder.of(statement, rule -> true);
    Best best = new Best(statement, network, effort.target(), vigil);
    start.ifPresent(best::start);
    Branching branching = new Branching(network, best, vigil);
    long bound = bound(network, branching, best, vigil);
    return found(statement, network, best, bound, branching.nodes(), vigil.reason());
  }

  private long bound(Network network, Branching branching, Best best, Vigil vigil) {
    Partial root = new Partial(network);
    if (vigil.over()) {
      return root.bound();
    }
    if (!branching.begin(root, ROUNDS)) {
      return best.cost();
    }
    long bound = branching.walk(root, Math.min(nodes, PROBE));
    if (bound == best.cost() || vigil.over() || branching.nodes() >= nodes) {
      return bound;
    }
    if (!branching.multipliers().run(root, 2 * ROUNDS)) {
      return best.cost();
    }
    return Math.max(bound, branching.walk(root, nodes));
  }

  private static Found found(
      Statement statement, Network network, Best best, long bound, long nodes, End end) {
    boolean complete = bound == best.cost();
    double lowest = statement.sense().sign() * Double.POSITIVE_INFINITY;
    if (!complete || (best.plan().isPresent() && !network.scale.exact())) {
      lowest = best.inOwnSense(bound);
    } else if (best.plan().isPresent()) {
      lowest = best.plan().get().value();
    }
    return new Found(best.plan(), lowest, complete, nodes, end);
  }

  @Override
  public String toString() {
    return nodes == Long.MAX_VALUE ? "PlanSearch()" : "PlanSearch(" + nodes + " nodes)";
  }
}
