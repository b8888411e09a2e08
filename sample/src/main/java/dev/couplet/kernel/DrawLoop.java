package dev.couplet.kernel;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.util.List;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.atomic.AtomicLong;
import java.util.function.Supplier;

/**
 * Runs the draws of a sampler, in batches, on the threads of the run.
 *
 * <p>Batches are given out in order of their numbers and the first always begins, so that there is
 * something to return. A draw that reaches the target cuts off all later ones; earlier ones are
 * finished, so that the draws returned do not depend on the threads; but if the number of draws is
 * open, the first that reaches the target ends the run at once. A draw that stop or deadline cut
 * short is returned only if it is lower than all that were finished.
 *
 * <p>Each state is valued once, when its draw ends, so that little is left to do once time is up.
 */
public final class DrawLoop {
  private final Qubo form;
  private final Effort effort;
  private final Watch watch;
  private final Vigil vigil;
  private final int batch;
  private final long limit;
  private final Kept kept;
  private final AtomicLong next = new AtomicLong();
  private final AtomicInteger cut = new AtomicInteger(Integer.MAX_VALUE);

  private DrawLoop(Qubo form, Run run, Vigil vigil, int batch) {
    this.form = form;
    this.effort = run.effort();
    this.watch = run.watch();
    this.vigil = vigil;
    this.batch = batch;
    boolean open = effort.draws().isEmpty();
    this.limit = open && form.size() == 0 ? 1 : effort.draws().orElse(Integer.MAX_VALUE);
    this.kept = open ? Kept.within(form.size()) : Kept.all();
  }

  /**
   * The draws of a run.
   *
   * @param vigil the watch over the run, begun by the caller
   * @param batch how many draws a drawer is given at once
   * @param drawers makes one drawer for each thread, on that thread
   */
  public static Draws run(
      Qubo form, Run run, Vigil vigil, int batch, Supplier<? extends Drawer> drawers) {
    DrawLoop loop = new DrawLoop(form, run, vigil, batch);
    long batches = (loop.limit + batch - 1) / batch;
    int threads = (int) Math.min(run.effort().threads(), batches);
    Threads.run(threads, () -> loop.work(drawers.get()), () -> vigil.end(End.STOPPED));
    return loop.draws();
  }

  /** The result of a run that is over before it began: where its first draw would have begun. */
  public static Draws unbegun(Qubo form, Run run, Vigil vigil) {
    long seed = run.effort().seed();
    State first = begin(form.size(), run, 0, Streams.of(seed, 0));
    return Draws.of(List.of(Draw.of(form, first)), vigil.reason(), seed);
  }

  /** Where draw {@code number} begins: at its start, or else at random. */
  public static State begin(int size, Run run, int number, SplittableRandom random) {
    List<State> starts = run.starts();
    return starts.isEmpty() ? LocalFields.random(size, random) : starts.get(number % starts.size());
  }

  private void work(Drawer drawer) {
    while (true) {
      long first = next.getAndAdd(batch);
      boolean begins = first == 0 || !vigil.over();
      if (first >= limit || first > cut.get() || !begins) {
        return;
      }
      int number = (int) first;
      Pace pace = new Pace(() -> over(number));
      List<State> states = drawer.draw(number, (int) Math.min(batch, limit - first), pace);
      for (int k = 0; k < states.size(); k++) {
        take(number + k, states.get(k), pace.ended());
      }
      report();
    }
  }

  private boolean over(int number) {
    report();
    return number > cut.get() || vigil.over();
  }

  private void take(int number, State state, boolean ended) {
    Draw draw = Draw.of(form, state);
    boolean reached = effort.target().isPresent() && draw.energy() <= effort.target().getAsDouble();
    if (ended && !reached) {
      kept.cutShort(number, draw);
      return;
    }
    kept.finished(number, draw);
    if (reached) {
      cut.accumulateAndGet(number, Math::min);
      if (effort.draws().isEmpty()) {
        vigil.end(End.TARGET);
      }
    }
  }

  private void report() {
    if (!watch.listening()) {
      return;
    }
    double best = kept.best();
    vigil.report(
        share(),
        best == Double.POSITIVE_INFINITY ? OptionalDouble.empty() : OptionalDouble.of(best),
        OptionalDouble.empty());
  }

  private OptionalDouble share() {
    double share = effort.draws().isPresent() ? kept.total() / (double) limit : 0;
    if (effort.limit().isPresent()) {
      double allowed = Math.max(1, effort.limit().get().toMillis());
      share = Math.max(share, Math.min(1, vigil.elapsed().toMillis() / allowed));
    }
    return effort.draws().isPresent() || effort.limit().isPresent()
        ? OptionalDouble.of(share)
        : OptionalDouble.empty();
  }

  private Draws draws() {
    int last = cut.get();
    End end = vigil.reason();
    if (last != Integer.MAX_VALUE) {
      end = End.TARGET;
    } else if (kept.total() == limit) {
      end = End.DONE;
    }
    return Draws.of(kept.upTo(last), end, effort.seed());
  }
}
