package dev.couplet.exact;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Vigil;
import java.util.List;
import java.util.OptionalDouble;
import java.util.SplittableRandom;

/**
 * Finds and proves the minimum of a form by branch and bound (Land and Doig 1960), depth first: at
 * every node the form is reduced and split into parts, small and thin parts are solved outright,
 * and bounds, the roof dual or for dense parts the semidefinite one, leave out what cannot be
 * better than the best state known. A short tabu search from the run's starts and from random
 * states gives the first such state.
 *
 * <p>As a sampler it returns the best state found and a bound on all energies; they meet when the
 * run was not cut short, up to rounding if the form's energies are rounded. The number of draws and
 * of sweeps do not matter; with a target it ends when a state that reaches it is known. More than
 * one thread helps small dense forms only, and does not change the result.
 *
 * <p>Time grows exponentially with the number of bits, the slower the sparser the form. Immutable
 * and thread-safe.
 */
public final class BranchAndBound implements Sampler {
  private final long nodes;

  private BranchAndBound(long nodes) {
    this.nodes = nodes;
  }

  /** As many nodes as it takes. */
  public static BranchAndBound standard() {
    return new BranchAndBound(Long.MAX_VALUE);
  }

  /**
   * This method with at most so many nodes.
   *
   * @throws IllegalArgumentException if it is not 1 or more
   */
  public BranchAndBound nodes(long most) {
    if (most < 1) {
      throw new IllegalArgumentException(
          "the number of nodes is " + most + ", it must be 1 or more");
    }
    return new BranchAndBound(most);
  }

  @Override
  public Draws sample(Qubo form, Run run) {
    run.requireFit(form.size());
    Vigil vigil = run.begin(form);
    SplittableRandom random = new SplittableRandom(run.effort().seed());
    Draw best = WarmStart.of(form, run.starts(), random, vigil);
    double energy = best.energy();
    double target = run.effort().target().orElse(Double.NEGATIVE_INFINITY);
    double bound = Double.NEGATIVE_INFINITY;
    if (energy > target && !vigil.over()) {
      vigil.report(OptionalDouble.empty(), OptionalDouble.of(energy), OptionalDouble.empty());
      Branching branching = new Branching(nodes, run.effort().threads(), vigil);
      Outcome outcome = branching.solve(form, energy, Double.NEGATIVE_INFINITY);
      best = outcome.state().map(state -> Draw.of(form, state)).orElse(best);
      energy = Math.min(energy, outcome.energy());
      bound = Math.min(energy, outcome.bound());
      vigil.report(OptionalDouble.of(1), OptionalDouble.of(energy), OptionalDouble.of(bound));
    }
    if (energy <= target) {
      vigil.end(End.TARGET);
    }
    Draws draws = Draws.of(List.of(best), vigil.reason(), run.effort().seed());
    return bound == Double.NEGATIVE_INFINITY ? draws : draws.bound(bound);
  }

  @Override
  public String toString() {
    return nodes == Long.MAX_VALUE ? "BranchAndBound()" : "BranchAndBound(" + nodes + " nodes)";
  }
}
