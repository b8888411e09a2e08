package dev.couplet.bond;

import dev.couplet.form.State;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Structure;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.Progress;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.OptionalDouble;
import java.util.SplittableRandom;

/**
 * A run cut into runs of a fixed number of draws, to be made one after the other. Seeds, starts and
 * time go on where the batch before ended; a listener hears of the run as a whole.
 */
final class Batches {
  /** Draws in a batch: a word of them, which methods may make side by side. */
  static final int SIZE = 64;

  private static final Duration SHORTEST = Duration.ofNanos(1);

  private final Run run;
  private final List<State> starts;
  private final Vigil vigil;
  private final SplittableRandom seeds;
  private final long most;
  private long begun;

  Batches(Run run, List<State> starts) {
    this.run = run;
    this.starts = starts;
    this.vigil = run.begin();
    this.seeds = new SplittableRandom(run.effort().seed());
    this.most = run.effort().draws().orElse(Integer.MAX_VALUE);
  }

  boolean hasNext() {
    return begun < most;
  }

  /** The next batch; {@code lowest} is the lowest energy so far. */
  Run next(double lowest) {
    int size = (int) Math.min(SIZE, most - begun);
    Run next =
        new Run(effort(size), watch(begun, size, lowest), startsFrom(begun), Structure.none());
    begun += size;
    return next;
  }

  private Effort effort(int size) {
    Effort effort = run.effort();
    Effort batch = Effort.draws(size).threads(effort.threads()).seed(seeds.nextLong());
    Effort paced = effort.sweeps().isPresent() ? batch.sweeps(effort.sweeps().getAsInt()) : batch;
    return effort
        .limit()
        .map(limit -> limit.minus(vigil.elapsed()))
        .map(left -> paced.limit(left.compareTo(SHORTEST) < 0 ? SHORTEST : left))
        .orElse(paced);
  }

  private List<State> startsFrom(long draw) {
    List<State> turned = new ArrayList<>(starts);
    if (!starts.isEmpty()) {
      Collections.rotate(turned, -(int) (draw % starts.size()));
    }
    return turned;
  }

  /** Energies on the host are not those of the form, so the listener hears what was read back. */
  private Watch watch(long before, int size, double lowest) {
    Watch own = Watch.stop(run.watch().stopSignal()).clock(run.watch().clock());
    OptionalDouble best =
        lowest == Double.POSITIVE_INFINITY ? OptionalDouble.empty() : OptionalDouble.of(lowest);
    return run.watch().listening()
        ? own.progress(
            heard -> vigil.report(share(before, size, heard), best, OptionalDouble.empty()))
        : own;
  }

  private OptionalDouble share(long before, int size, Progress heard) {
    boolean known = heard.share().isPresent() && run.effort().draws().isPresent();
    return known
        ? OptionalDouble.of((before + size * heard.share().getAsDouble()) / most)
        : OptionalDouble.empty();
  }
}
