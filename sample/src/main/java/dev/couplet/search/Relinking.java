package dev.couplet.search;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Qubo;
import dev.couplet.kernel.DrawLoop;
import dev.couplet.kernel.Pace;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Vigil;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.Supplier;

/**
 * Tabu search with path relinking: each draw keeps a set of elite states and goes on searching
 * between two of them, from the lowest state on a path from one to the other.
 *
 * <p>A sweep of the effort is one iteration: it looks at every variable and flips one. A draw that
 * is given a number of sweeps uses them all and begins with new elites whenever the old ones are
 * exhausted; else it ends with its first elites. It returns the best state it has seen. On large
 * dense forms this is the method of choice; give it time rather than draws.
 *
 * <p>Cost: an iteration O(n), in vector registers; O(n^2) for each path. Memory, and the treatment
 * of coefficients that are not integers, as of {@link Tabu}. Immutable and thread-safe.
 *
 * <p>Source: Wang, Lu, Glover and Hao, "Path relinking for unconstrained binary quadratic
 * programming" (2012).
 */
@CheckReturnValue
public final class Relinking implements Sampler {
  private static final Relinking STANDARD = new Relinking(10, OptionalInt.empty());

  private final int elites;
  private final OptionalInt patience;

  private Relinking(int elites, OptionalInt patience) {
    this.elites = elites;
    this.patience = patience;
  }

  /** Ten elites, and a patience that follows from the number of variables. */
  public static Relinking standard() {
    return STANDARD;
  }

  /**
   * This method with another number of elite states.
   *
   * @throws IllegalArgumentException if it is below 2
   */
  public Relinking elites(int number) {
    if (number < 2) {
      throw new IllegalArgumentException(
          "the number of elites is " + number + ", a path needs 2 or more");
    }
    return new Relinking(number, patience);
  }

  /**
   * This method with another number of iterations without improvement after which a tabu search
   * ends.
   *
   * @throws IllegalArgumentException if it is below 1
   */
  public Relinking patience(int iterations) {
    return new Relinking(elites, OptionalInt.of(Check.positive("the patience", iterations)));
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
    int idle = patience.orElse((int) Math.min(1 << 30, Math.max(1000, 4L * form.size())));
    return DrawLoop.run(form, run, vigil, 1, () -> new Relinker(each.get(), run, elites, idle));
  }

  @Override
  public String toString() {
    return "Relinking("
        + elites
        + " elites, patience "
        + (patience.isPresent() ? patience.getAsInt() : "from the form")
        + ")";
  }
}
