package dev.couplet.kernel;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.atomic.AtomicReference;
import org.jspecify.annotations.Nullable;

/** Runs one task on several threads that begin and end within the call. */
public final class Threads {
  private Threads() {}

  /**
   * Runs the task on {@code count} threads, the caller's own among them, and waits for all, also if
   * the caller is interrupted (its flag stays set).
   *
   * @param onFailure called as soon as one of them throws, to make the others end; the first
   *     exception then reaches the caller
   */
  public static void run(int count, Runnable task, Runnable onFailure) {
    AtomicReference<@Nullable Throwable> failure = new AtomicReference<>();
    Runnable guarded =
        () -> {
          try {
            task.run();
          } catch (Throwable thrown) {
            failure.compareAndSet(null, thrown);
            onFailure.run();
          }
        };
    List<Thread> others = new ArrayList<>();
    try {
      for (int t = 1; t < count; t++) {
        Thread thread = new Thread(guarded, "couplet-" + t);
        thread.setDaemon(true);
        thread.start();
        others.add(thread);
      }
    } catch (Throwable thrown) {
      failure.compareAndSet(null, thrown);
      onFailure.run();
    }
    guarded.run();
    for (Thread other : others) {
      await(other);
    }
    rethrow(failure.get());
  }

  private static void await(Thread thread) {
    boolean interrupted = false;
    while (true) {
      try {
        thread.join();
        break;
      } catch (InterruptedException again) {
        interrupted = true;
      }
    }
    if (interrupted) {
      Thread.currentThread().interrupt();
    }
  }

  private static void rethrow(@Nullable Throwable thrown) {
    if (thrown instanceof RuntimeException unchecked) {
      throw unchecked;
    }
    if (thrown instanceof Error error) {
      throw error;
    }
    if (thrown != null) {
      throw new IllegalStateException("a task threw a checked exception", thrown);
    }
  }
}
