package dev.couplet.audit;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import java.time.Duration;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Objects;
import java.util.Set;
import java.util.concurrent.Callable;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import java.util.function.Supplier;

/**
 * Calls a sampler, each time on a thread of its own in a group of its own, so that the audit
 * outlives a sampler that never returns, and knows the threads that the sampler made from those of
 * others: new threads join the group of the thread that makes them.
 */
final class Callers {
  private static final long GRACE_MILLIS = 2_000;

  private final Sampler sampler;
  private final Duration patience;
  private final ThreadGroup group = new ThreadGroup("sampler under audit");
  private final Set<Thread> known = new HashSet<>();

  Callers(Sampler sampler, Duration patience) {
    this.sampler = sampler;
    this.patience = patience;
  }

  /** The sampler did not come back; nothing more can be learnt from it. */
  static final class Lost extends RuntimeException {
    private static final long serialVersionUID = 1L;

    Lost(String message) {
      super(message);
    }
  }

  /** One call; the run is made on the thread that makes the call. */
  Outcome call(Qubo form, Supplier<Run> run) {
    return finish(begin(form, run));
  }

  /** Calls of one sampler on several threads at once. */
  List<Outcome> together(List<Qubo> forms, List<Run> runs) {
    CountDownLatch gate = new CountDownLatch(forms.size());
    List<FutureTask<Outcome>> calls = new ArrayList<>();
    for (int k = 0; k < forms.size(); k++) {
      Run run = runs.get(k);
      calls.add(begin(forms.get(k), () -> afterAll(gate, run)));
    }
    List<Outcome> outcomes = new ArrayList<>();
    for (FutureTask<Outcome> call : calls) {
      outcomes.add(finish(call));
    }
    return outcomes;
  }

  private static Run afterAll(CountDownLatch gate, Run run) {
    gate.countDown();
    while (gate.getCount() > 0) {
      Thread.onSpinWait();
    }
    return run;
  }

  private FutureTask<Outcome> begin(Qubo form, Supplier<Run> run) {
    Callable<Outcome> call = () -> attempt(form, run);
    FutureTask<Outcome> task = new FutureTask<>(call);
    Thread caller = new Thread(group, task, "caller of the sampler under audit");
    caller.setDaemon(true);
    known.add(caller);
    caller.start();
    return task;
  }

  private Outcome attempt(Qubo form, Supplier<Run> run) {
    try {
      Draws draws = sampler.sample(form, run.get());
      Objects.requireNonNull(draws, "the sampler returned null");
      return Outcome.returned(draws, Thread.interrupted());
    } catch (Throwable thrown) {
      return Outcome.threw(thrown, Thread.interrupted());
    }
  }

  private Outcome finish(FutureTask<Outcome> call) {
    try {
      return call.get(patience.toNanos(), TimeUnit.NANOSECONDS);
    } catch (TimeoutException tooLong) {
      group.interrupt();
      throw new Lost("a run did not return within " + patience + ", the audit ends here");
    } catch (InterruptedException interrupt) {
      Thread.currentThread().interrupt();
      throw new Lost("the audit was interrupted");
    } catch (ExecutionException impossible) {
      throw new IllegalStateException("the call of a sampler failed", impossible);
    }
  }

  /** The names of threads that calls so far left running, each named once. */
  List<String> threadsLeft() {
    List<String> left = new ArrayList<>();
    Thread[] threads = new Thread[group.activeCount() + 64];
    int count = group.enumerate(threads);
    for (int k = 0; k < count; k++) {
      if (known.add(threads[k]) && !ends(threads[k])) {
        left.add(threads[k].getName());
      }
    }
    return left;
  }

  /** A thread that was told to end may take a moment to do so. */
  private static boolean ends(Thread thread) {
    try {
      thread.join(GRACE_MILLIS);
    } catch (InterruptedException interrupt) {
      Thread.currentThread().interrupt();
    }
    return !thread.isAlive();
  }
}
