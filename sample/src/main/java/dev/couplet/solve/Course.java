package dev.couplet.solve;

import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;

/** One run of a solver under way: its effort, its watch, and the stages it has gone through. */
final class Course {
  private static final Duration LEAST = Duration.ofNanos(1);

  private final Effort effort;
  private final Watch watch;
  private final Vigil vigil;
  private final List<Stage> stages = new ArrayList<>();
  private Duration stageBegan = Duration.ZERO;

  Course(Effort effort, Watch watch) {
    this.effort = effort;
    this.watch = watch;
    this.vigil = Vigil.begin(effort, watch);
  }

  Effort effort() {
    return effort;
  }

  Watch watch() {
    return watch;
  }

  Vigil vigil() {
    return vigil;
  }

  /** The effort that is left: what is counted in full, and the time that has not passed. */
  Effort left() {
    return effort.limit().map(this::timeLeft).map(effort::limit).orElse(effort);
  }

  /** As {@link #left()}, with so many hundredths of the time. */
  Effort left(int share) {
    Effort left = left();
    return left.limit().map(time -> left.limit(part(time, share))).orElse(left);
  }

  private static Duration part(Duration time, int share) {
    Duration part = time.multipliedBy(share).dividedBy(100);
    return part.compareTo(LEAST) < 0 ? LEAST : part;
  }

  private Duration timeLeft(Duration limit) {
    Duration left = limit.minus(vigil.elapsed());
    return left.compareTo(LEAST) < 0 ? LEAST : left;
  }

  /** The watch of the run without its listener, for stages whose numbers would mislead it. */
  Watch quietly() {
    return Watch.stop(watch.stopSignal()).clock(watch.clock());
  }

  void finished(String stage, String outcome) {
    Duration now = vigil.elapsed();
    stages.add(new Stage(stage, outcome, now.minus(stageBegan)));
    stageBegan = now;
  }

  List<Stage> stages() {
    return stages;
  }
}
