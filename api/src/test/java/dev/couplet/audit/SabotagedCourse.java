package dev.couplet.audit;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Structure;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.Progress;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.locks.LockSupport;
import java.util.function.UnaryOperator;

/** Samplers that break what the contract says of the course of a run, each in one way. */
final class SabotagedCourse {
  private static final Sampler HONEST = new HonestSampler();

  private SabotagedCourse() {}

  private static Sampler deaf(UnaryOperator<Run> change) {
    return (form, run) -> HONEST.sample(form, change.apply(run));
  }

  static Sampler ignoresTheStopSignal() {
    return deaf(run -> run.effort(run.effort().threads(1)).watch(withoutStop(run.watch())));
  }

  private static Watch withoutStop(Watch watch) {
    return Watch.none().clock(watch.clock()).progress(watch.listener());
  }

  static Sampler ignoresTheClock() {
    return deaf(
        run -> run.watch(Watch.stop(run.watch().stopSignal()).progress(run.watch().listener())));
  }

  static Sampler losesTheInterrupt() {
    return (form, run) -> {
      Draws draws = HONEST.sample(form, run);
      return Thread.interrupted() ? draws : draws;
    };
  }

  static Sampler ignoresInterrupts() {
    return (form, run) -> {
      boolean interrupted = Thread.interrupted();
      Draws draws = HONEST.sample(form, run.effort(run.effort().threads(1)));
      if (interrupted) {
        Thread.currentThread().interrupt();
      }
      return draws;
    };
  }

  static Sampler throwsWhenInterrupted() {
    return (form, run) -> {
      Draws draws = HONEST.sample(form, run);
      if (Thread.currentThread().isInterrupted()) {
        throw new IllegalStateException("interrupted");
      }
      return draws;
    };
  }

  static Sampler hangs() {
    return (form, run) -> {
      while (!Thread.currentThread().isInterrupted()) {
        LockSupport.park();
      }
      return HONEST.sample(form, run);
    };
  }

  private static Sampler reporting(Reporter reporter) {
    return new HonestSampler() {
      @Override
      void report(Vigil vigil, OptionalDouble share) {
        reporter.report(vigil);
      }
    };
  }

  @FunctionalInterface
  private interface Reporter {
    void report(Vigil vigil);
  }

  private static void share(Vigil vigil, double share) {
    vigil.report(OptionalDouble.of(share), OptionalDouble.empty(), OptionalDouble.empty());
  }

  static Sampler neverReports() {
    return reporting(vigil -> {});
  }

  static Sampler reportsBackwards() {
    SplittableRandom random = new SplittableRandom(1);
    return reporting(vigil -> share(vigil, random.nextDouble()));
  }

  static Sampler reportsMoreThanAll() {
    return reporting(vigil -> share(vigil, 100));
  }

  static Sampler swallowsWhatListenersThrow() {
    return reporting(
        vigil -> {
          try {
            share(vigil, 0.5);
          } catch (RuntimeException | Error swallowed) {
            vigil.end(End.STOPPED);
          }
        });
  }

  static Sampler wrapsWhatListenersThrow() {
    return reporting(
        vigil -> {
          try {
            share(vigil, 0.5);
          } catch (RuntimeException | Error caught) {
            throw new IllegalStateException("the run failed", caught);
          }
        });
  }

  /** What a listener throws on a thread of the run ends that thread, and nobody hears of it. */
  static Sampler losesWhatListenersThrowOnItsThreads() {
    return reporting(
        vigil -> {
          Thread thread = new Thread(() -> share(vigil, 0.5));
          thread.setUncaughtExceptionHandler((t, e) -> {});
          thread.start();
          new HonestSampler().join(thread);
        });
  }

  static Sampler callsListenersFromTwoThreads() {
    return new HonestSampler() {
      @Override
      public Draws sample(Qubo form, Run run) {
        Progress progress =
            new Progress(
                Duration.ZERO,
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                OptionalDouble.empty());
        CountDownLatch together = new CountDownLatch(2);
        Thread thread = new Thread(() -> tell(run.watch(), progress, together));
        thread.setUncaughtExceptionHandler((t, e) -> {});
        thread.start();
        tell(run.watch(), progress, together);
        join(thread);
        return super.sample(form, run);
      }
    };
  }

  /** Many calls side by side, so that some overlap however the threads are scheduled. */
  private static void tell(Watch watch, Progress progress, CountDownLatch together) {
    together.countDown();
    while (together.getCount() > 0) {
      Thread.onSpinWait();
    }
    for (int call = 0; call < 200; call++) {
      watch.listener().accept(progress);
    }
  }

  static Sampler leavesAThread() {
    return (form, run) -> {
      Thread thread = new Thread(() -> LockSupport.parkNanos(Duration.ofSeconds(20).toNanos()));
      thread.setName("left behind");
      thread.setDaemon(true);
      thread.start();
      return HONEST.sample(form, run);
    };
  }

  static Sampler takesAnyStart() {
    return deaf(
        run -> {
          List<State> fitting = new ArrayList<>(run.starts());
          fitting.removeIf(start -> start.size() != run.starts().get(0).size());
          return run.starts(fitting.size() < run.starts().size() ? List.of() : run.starts());
        });
  }

  static Sampler checksTheFirstStartOnly() {
    return deaf(run -> run.starts().isEmpty() ? run : run.starts(run.starts().subList(0, 1)));
  }

  static Sampler takesAnyStructure() {
    return deaf(run -> run.structure(Structure.none()));
  }

  static Sampler ignoresStarts() {
    return (form, run) -> {
      run.requireFit(form.size());
      return HONEST.sample(form, run.starts(List.of()));
    };
  }

  static Sampler ignoresTheTarget() {
    return deaf(run -> run.effort(run.effort().withoutTarget()));
  }

  private static Sampler hitting(UnaryOperator<List<State>> choose) {
    return new HonestSampler() {
      @Override
      Draws result(Qubo form, Run run, List<State> states, Vigil vigil) {
        Draws honest = super.result(form, run, states, vigil);
        return honest.end() == End.TARGET
            ? Draws.of(form, choose.apply(states), End.TARGET, honest.seed())
            : honest;
      }
    };
  }

  static Sampler goesOnAfterTheTarget() {
    return hitting(
        states -> {
          List<State> more = new ArrayList<>(states);
          if (states.size() < 12) {
            more.add(states.get(states.size() - 1));
          }
          return more;
        });
  }

  static Sampler dropsDrawsBeforeTheTarget() {
    return hitting(states -> states.subList(states.size() - 1, states.size()));
  }

  static Sampler makesUpDrawsBeforeTheTarget() {
    return hitting(
        states -> {
          List<State> others = new ArrayList<>();
          states.forEach(state -> others.add(state.flipped()));
          others.set(others.size() - 1, states.get(states.size() - 1));
          return others;
        });
  }

  /** Every draw of the round counts, so that more threads find more. */
  static Sampler endsAtTheRoundOfTheTarget() {
    return new HonestSampler() {
      @Override
      List<State> round(Qubo form, Run run, Vigil vigil, int first, int width) {
        List<State> round = new ArrayList<>(super.round(form, run, vigil, first, width));
        round.sort(Comparator.comparingDouble(form::value));
        return round;
      }
    };
  }
}
