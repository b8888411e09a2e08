package dev.couplet.search;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.kernel.DrawLoop;
import dev.couplet.kernel.Drawer;
import dev.couplet.kernel.Pace;
import dev.couplet.kernel.Streams;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Vigil;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.SplittableRandom;
import java.util.function.Supplier;

/**
 * One-flip tabu search: from a random state, flip by flip along the best gain, without flipping
 * back what was flipped lately, unless that leads below all that was seen.
 *
 * <p>A sweep of the effort is one iteration: it looks at every variable and flips one. A draw ends
 * when so many iterations in a row (the patience) have found nothing better, or after the sweeps of
 * the effort, if it names them; it returns the best state it has seen.
 *
 * <p>Cost: an iteration O(n), in vector registers; O(n^2) to begin a draw. Forms whose coefficients
 * are not integers are searched with coefficients rounded to about eight digits of the largest
 * local field, and the result is brought to a local minimum of the form itself. Memory: up to n^2 /
 * 2 words for dense forms, 28 bytes a pair for others. Immutable and thread-safe.
 *
 * <p>Source: Glover and Laguna, "Tabu search" (1997); tenures from Glover, Lü and Hao,
 * "Diversification-driven tabu search for unconstrained binary quadratic problems" (2010).
 */
@CheckReturnValue
public final class Tabu implements Sampler {
  private static final Tabu STANDARD = new Tabu(OptionalInt.empty());

  private final OptionalInt patience;

  private Tabu(OptionalInt patience) {
    this.patience = patience;
  }

  /** Patience that follows from the number of variables: 20 n, 10,000 at least. */
  public static Tabu standard() {
    return STANDARD;
  }

  /**
   * This method with another number of iterations without improvement after which a draw ends.
   *
   * @throws IllegalArgumentException if it is below 1
   */
  public Tabu patience(int iterations) {
    return new Tabu(OptionalInt.of(Check.positive("the patience", iterations)));
  }

  @Override
  public Draws sample(Qubo form, Run run) {
    Vigil vigil = run.begin(form);
    run.requireFit(form.size());
    Pace setUp = Pace.of(vigil);
    Optional<Supplier<Workbench>> benches =
        setUp.look() ? Optional.empty() : Workbench.of(form, run, setUp);
    if (benches.isEmpty()) {
      return DrawLoop.unbegun(form, run, vigil);
    }
    Supplier<Workbench> each = benches.get();
    return DrawLoop.run(form, run, vigil, 1, () -> drawer(each.get(), run));
  }

  private Drawer drawer(Workbench bench, Run run) {
    int size = bench.moves().size();
    long idle = patience.orElse((int) Math.min(Integer.MAX_VALUE, Math.max(10_000, 20L * size)));
    return (first, count, pace) -> {
      SplittableRandom random = Streams.of(run.effort().seed(), first);
      State begin = DrawLoop.begin(size, run, first, random);
      return List.of(pace.look() ? begin : search(bench, run, begin, idle, random, pace));
    };
  }

  private static State search(
      Workbench bench, Run run, State begin, long idle, SplittableRandom random, Pace pace) {
    bench.goal().begin();
    State reached = bench.descend(begin, random, pace);
    if (pace.ended()) {
      return reached;
    }
    Budget budget = Budget.of(run.effort());
    bench.walk().run(idle, budget, random, pace);
    State best = bench.walk().bestState();
    return bench.goal().met() ? best : bench.polished(best, random, pace);
  }

  @Override
  public String toString() {
    return "Tabu(patience " + (patience.isPresent() ? patience.getAsInt() : "from the form") + ")";
  }
}
