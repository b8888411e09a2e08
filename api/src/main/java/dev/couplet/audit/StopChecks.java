package dev.couplet.audit;

import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.time.Duration;
import java.util.function.Supplier;

/** Stop signals, interrupts and deadlines end a run; what it has by then is valid. */
final class StopChecks {
  /** The looks at the clock after which a run in full swing is stopped. */
  private static final int LOOKS = 3;

  private static final Duration FAR = Duration.ofDays(365);

  private StopChecks() {}

  static void examine(Trials trials) {
    for (Specimen specimen : trials.specimens()) {
      before(trials, specimen);
    }
    for (int threads : new int[] {1, 3}) {
      midway(trials, threads);
      deadlines(trials, threads);
    }
  }

  private static void before(Trials trials, Specimen specimen) {
    StopSignal stop = StopSignal.create();
    stop.stop();
    for (int threads : new int[] {1, 3}) {
      Run run = Run.of(Trials.LONG.threads(threads));
      trials
          .draws(specimen, run.watch(Watch.stop(stop)))
          .ifPresent(draws -> expectEarlyEnd(trials, "stop", specimen, run.effort(), draws));
      interrupted(trials, specimen, run.effort(), () -> interruptSelf(run), false);
    }
  }

  private static Run interruptSelf(Run run) {
    Thread.currentThread().interrupt();
    return run;
  }

  private static void expectEarlyEnd(
      Trials trials, String check, Specimen specimen, Effort effort, Draws draws) {
    boolean honoured =
        draws.end() == End.STOPPED && draws.total() < effort.draws().orElse(Integer.MAX_VALUE);
    trials
        .notes()
        .expect(
            check,
            honoured,
            () ->
                specimen
                    + " with "
                    + effort
                    + ": the "
                    + check
                    + " came before the start, so the run ends STOPPED with what it has; got "
                    + draws);
  }

  /** Runs in full swing, stopped from outside at one of their looks at the clock. */
  private static void midway(Trials trials, int threads) {
    Specimen specimen = trials.largest();
    Effort effort = Trials.LONG.limit(FAR).threads(threads);
    StopSignal stop = StopSignal.create();
    Watch watch = Watch.stop(stop).clock(TestClock.thatAt(LOOKS, stop::stop));
    trials
        .draws(specimen, Run.of(effort).watch(watch))
        .ifPresent(draws -> expectEnd(trials, "stop", specimen, effort, draws, End.STOPPED));
    Supplier<Run> interrupting =
        () -> {
          Thread caller = Thread.currentThread();
          TestClock clock = TestClock.thatAt(LOOKS, caller::interrupt);
          return Run.of(effort).watch(Watch.none().clock(clock));
        };
    interrupted(trials, specimen, effort, interrupting, true);
  }

  private static void interrupted(
      Trials trials, Specimen specimen, Effort effort, Supplier<Run> run, boolean midway) {
    Outcome outcome = trials.call(specimen, run);
    Notes notes = trials.notes();
    notes.expect(
        "interrupt",
        outcome.draws().isPresent(),
        () -> specimen + " with " + effort + ": an interrupt counts as a stop, but it " + outcome);
    if (outcome.draws().isEmpty()) {
      return;
    }
    Draws draws = outcome.draws().orElseThrow();
    Results.examine(notes, specimen, effort, draws);
    if (midway) {
      expectEnd(trials, "interrupt", specimen, effort, draws, End.STOPPED);
    } else {
      expectEarlyEnd(trials, "interrupt", specimen, effort, draws);
    }
    notes.expect(
        "interrupt",
        outcome.interrupted() || (midway && Trials.doneByProof(specimen, draws)),
        () ->
            specimen
                + " with "
                + effort
                + ": the interrupt flag is lost; set it again wherever an InterruptedException is caught");
  }

  private static void deadlines(Trials trials, int threads) {
    Specimen specimen = trials.largest();
    Duration limit = Duration.ofMillis(1);
    Effort timed = Effort.within(limit).seed(3).threads(threads);
    Effort both = Trials.LONG.limit(limit).threads(threads);
    Effort later = Trials.LONG.limit(limit.multipliedBy(LOOKS)).threads(threads);
    for (Effort effort : new Effort[] {timed, both, later}) {
      Watch watch = Watch.none().clock(TestClock.stepping(limit.toNanos()));
      trials
          .draws(specimen, Run.of(effort).watch(watch))
          .ifPresent(draws -> expectEnd(trials, "deadline", specimen, effort, draws, End.DEADLINE));
    }
  }

  private static void expectEnd(
      Trials trials, String check, Specimen specimen, Effort effort, Draws draws, End end) {
    trials
        .notes()
        .expect(
            check,
            draws.end() == end || Trials.doneByProof(specimen, draws),
            () ->
                specimen
                    + " with "
                    + effort
                    + " has to end "
                    + end
                    + ", got "
                    + draws
                    + "; ask run.begin().over() at most 2^20 steps apart, and tell its reason()");
  }
}
