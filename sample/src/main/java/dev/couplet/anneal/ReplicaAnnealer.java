package dev.couplet.anneal;

import dev.couplet.form.State;
import dev.couplet.kernel.DrawLoop;
import dev.couplet.kernel.Drawer;
import dev.couplet.kernel.Pace;
import dev.couplet.kernel.ReplicaRows;
import dev.couplet.kernel.ReplicaSweeps;
import dev.couplet.kernel.Streams;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.List;

/** Anneals 64 draws at a time; belongs to one thread. */
final class ReplicaAnnealer implements Drawer {
  /** Draws made at once. */
  static final int BATCH = 64;

  /** Streams of whole batches are counted from here on, apart from those of single draws. */
  private static final long BATCHES = 1L << 32;

  private final ReplicaRows rows;
  private final Run run;
  private final Schedule schedule;
  private final Finish finish;

  ReplicaAnnealer(ReplicaRows rows, Run run, Schedule schedule, Finish finish) {
    this.rows = rows;
    this.run = run;
    this.schedule = schedule;
    this.finish = finish;
  }

  /** How many states can be valued between two looks at the clock; one at least. */
  private static int soon(ReplicaRows rows) {
    return (int) Math.max(1, Vigil.STEPS / (rows.size() + rows.pairs() + 1));
  }

  @Override
  public List<State> draw(int first, int count, Pace pace) {
    long seed = run.effort().seed();
    List<State> begin = new ArrayList<>(count);
    for (int k = first; k < first + count; k++) {
      begin.add(DrawLoop.begin(rows.size(), run, k, Streams.of(seed, k)));
    }
    if (pace.look()) {
      return begin;
    }
    ReplicaSweeps sweeps =
        new ReplicaSweeps(rows, begin, Streams.of(seed, BATCHES + first / BATCH));
    int number = schedule.sweeps(first);
    for (int t = 0; t < number; t++) {
      if (!sweeps.sweep(schedule.inverseTemperature(t, number), pace)) {
        break;
      }
    }
    if (finish == Finish.DESCENT) {
      sweeps.descend(pace.ended() ? Pace.closing() : pace);
    }
    return sweeps.states(pace.ended() ? Math.min(count, soon(rows)) : count);
  }
}
