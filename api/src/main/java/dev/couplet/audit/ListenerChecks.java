package dev.couplet.audit;

import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.Progress;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.locks.LockSupport;
import java.util.function.Consumer;

/** A listener hears how far a run is, one call at a time; what it throws reaches the caller. */
final class ListenerChecks {
  private static final long STEP = Duration.ofMillis(60).toNanos();

  private ListenerChecks() {}

  static void examine(Trials trials) {
    Specimen specimen = trials.largest();
    for (int threads : new int[] {1, 3}) {
      Effort effort = Trials.SHORT.threads(threads);
      hears(trials, specimen, effort);
      throwsOut(trials, specimen, effort, new IllegalStateException("thrown by the listener"));
      throwsOut(trials, specimen, effort, new AssertionError("thrown by the listener"));
    }
  }

  private static Run run(Effort effort, Consumer<Progress> listener) {
    return Run.of(effort).watch(Watch.none().progress(listener).clock(TestClock.stepping(STEP)));
  }

  private static void hears(Trials trials, Specimen specimen, Effort effort) {
    Recorder recorder = new Recorder();
    trials
        .draws(specimen, Trials.SHORT)
        .ifPresent(
            alone ->
                SeedChecks.expectSame(
                    trials, "listener", "and a listener", specimen, alone, run(effort, recorder)));
    String where = specimen + " with " + effort + ": ";
    Notes notes = trials.notes();
    notes.expect(
        "listener",
        !recorder.heard.isEmpty(),
        () ->
            where
                + "the listener heard nothing; call report(...) of the vigil as the work goes on");
    notes.expect(
        "listener",
        recorder.overlaps.get() == 0,
        () -> where + "the listener was called on two threads at once");
    expectSane(notes, where, recorder.heard);
    if (effort.threads() == 1) {
      expectForward(notes, where, recorder.heard);
    }
  }

  private static void expectSane(Notes notes, String where, List<Progress> heard) {
    for (Progress progress : heard) {
      double share = progress.share().orElse(0);
      boolean numbers = !Double.isNaN(progress.best().orElse(0));
      notes.expect(
          "listener",
          share >= 0 && share <= 1 && numbers,
          () -> where + progress + " has a share outside 0..1 or a best that is no number");
    }
  }

  private static void expectForward(Notes notes, String where, List<Progress> heard) {
    for (int k = 1; k < heard.size(); k++) {
      Progress before = heard.get(k - 1);
      Progress after = heard.get(k);
      boolean forward =
          after.share().orElse(1) >= before.share().orElse(0)
              && after.best().orElse(Double.NEGATIVE_INFINITY)
                  <= before.best().orElse(Double.POSITIVE_INFINITY)
              && after.elapsed().compareTo(before.elapsed()) >= 0;
      notes.expect(
          "listener", forward, () -> where + "progress goes back: " + after + " after " + before);
    }
  }

  private static void throwsOut(Trials trials, Specimen specimen, Effort effort, Throwable thrown) {
    Consumer<Progress> listener = progress -> raise(thrown);
    Outcome outcome = trials.call(specimen, () -> run(effort, listener));
    trials
        .notes()
        .expect(
            "listener throws",
            outcome.thrown().filter(caught -> caught == thrown).isPresent(),
            () ->
                specimen
                    + " with "
                    + effort
                    + ": the listener threw "
                    + thrown
                    + ", and the caller has to get the same object; it "
                    + outcome);
  }

  private static void raise(Throwable thrown) {
    if (thrown instanceof Error error) {
      throw error;
    }
    throw (RuntimeException) thrown;
  }

  /** Keeps what it hears, and counts calls that overlap. */
  private static final class Recorder implements Consumer<Progress> {
    private static final long OVERLAP_NANOS = 20_000;

    final List<Progress> heard = new ArrayList<>();
    final AtomicInteger overlaps = new AtomicInteger();
    private final AtomicBoolean busy = new AtomicBoolean();

    @Override
    public void accept(Progress progress) {
      if (busy.getAndSet(true)) {
        overlaps.incrementAndGet();
      }
      LockSupport.parkNanos(OVERLAP_NANOS);
      synchronized (heard) {
        heard.add(progress);
      }
      busy.set(false);
    }
  }
}
