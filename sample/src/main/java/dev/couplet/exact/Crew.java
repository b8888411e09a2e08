package dev.couplet.exact;

import dev.couplet.sampling.End;
import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.atomic.AtomicReference;
import java.util.function.IntConsumer;
import org.jspecify.annotations.Nullable;

/** Shares numbered parts of a run out between threads that begin and end with it. */
final class Crew {
  private final AtomicInteger next = new AtomicInteger();
  private final AtomicReference<@Nullable Throwable> failure = new AtomicReference<>();
  private final int parts;
  private final IntConsumer work;
  private final Vigil vigil;

  private Crew(int parts, IntConsumer work, Vigil vigil) {
    this.parts = parts;
    this.work = work;
    this.vigil = vigil;
  }

  /**
   * Does every part once, in ascending order of their begin, on at most so many threads, the
   * caller's among them. What a part throws ends the run and is thrown here.
   */
  static void run(int threads, int parts, IntConsumer work, Vigil vigil) {
    Crew crew = new Crew(parts, work, vigil);
    List<Thread> helpers = new ArrayList<>();
    for (int t = 1; t < Math.min(threads, parts); t++) {
      Thread helper = new Thread(crew::work, "couplet-exact-" + t);
      helper.setDaemon(true);
      helper.start();
      helpers.add(helper);
    }
    crew.work();
    helpers.forEach(Crew::join);
    crew.rethrow();
  }

  private void work() {
    try {
      for (int p = next.getAndIncrement(); p < parts; p = next.getAndIncrement()) {
        work.accept(p);
      }
    } catch (RuntimeException | Error thrown) {
      failure.compareAndSet(null, thrown);
      next.set(parts);
      vigil.end(End.STOPPED);
    }
  }

  /** Waits for the end of a helper, also while interrupted: the vigil has told it to end. */
  private static void join(Thread helper) {
    boolean interrupted = false;
    while (true) {
      try {
        helper.join();
        break;
      } catch (InterruptedException again) {
        interrupted = true;
      }
    }
    if (interrupted) {
      Thread.currentThread().interrupt();
    }
  }

  private void rethrow() {
    Throwable thrown = failure.get();
    if (thrown instanceof Error error) {
      throw error;
    }
    if (thrown instanceof RuntimeException exception) {
      throw exception;
    }
  }
}
