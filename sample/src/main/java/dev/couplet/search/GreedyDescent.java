package dev.couplet.search;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.kernel.Adjacency;
import dev.couplet.kernel.Descent;
import dev.couplet.kernel.DrawLoop;
import dev.couplet.kernel.Drawer;
import dev.couplet.kernel.LocalFields;
import dev.couplet.kernel.Pace;
import dev.couplet.kernel.Streams;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Vigil;
import java.util.List;
import java.util.Optional;

/**
 * Goes down from random states, or from the starts of the run, by single flips that lower the
 * energy, to a local minimum: the plainest of methods, to compare others with, or to finish a state
 * that comes from elsewhere.
 *
 * <p>Variables are looked at in order, again and again, until no flip lowers the energy; the number
 * of sweeps of the effort is ignored. Cost: O(n) a pass and the degree of each variable that flips;
 * in practice a few passes. Memory: 24 bytes a pair, and 24 bytes a variable and thread. Immutable
 * and thread-safe.
 */
@CheckReturnValue
public final class GreedyDescent implements Sampler {
  private static final GreedyDescent STANDARD = new GreedyDescent();

  private GreedyDescent() {}

  /** The method; it has no settings. */
  public static GreedyDescent standard() {
    return STANDARD;
  }

  @Override
  public Draws sample(Qubo form, Run run) {
    Vigil vigil = run.begin(form);
    run.requireFit(form.size());
    Pace setUp = Pace.of(vigil);
    Optional<Adjacency> built = setUp.look() ? Optional.empty() : Adjacency.of(form, setUp);
    if (built.isEmpty()) {
      return DrawLoop.unbegun(form, run, vigil);
    }
    Adjacency rows = built.get();
    return DrawLoop.run(form, run, vigil, 1, () -> drawer(rows, run));
  }

  private static Drawer drawer(Adjacency rows, Run run) {
    LocalFields fields = new LocalFields(rows);
    Descent descent = new Descent(fields);
    long seed = run.effort().seed();
    return (first, count, pace) -> {
      State begin = DrawLoop.begin(rows.size(), run, first, Streams.of(seed, first));
      if (!pace.look() && fields.set(begin, pace)) {
        descent.run(pace);
        return List.of(fields.state());
      }
      return List.of(begin);
    };
  }

  @Override
  public String toString() {
    return "GreedyDescent()";
  }
}
