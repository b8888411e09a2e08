package dev.couplet.exact;

import dev.couplet.kernel.Threads;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Vigil;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.IntConsumer;

/** Shares numbered parts of a run out between threads that begin and end with it. */
final class Crew {
  private Crew() {}

  /**
   * Does every part once, in ascending order of their begin, on at most so many threads, the
   * caller's among them. What a part throws ends the run and is thrown here.
   */
  static void run(int threads, int parts, IntConsumer work, Vigil vigil) {
    AtomicInteger next = new AtomicInteger();
    Runnable loop =
        () -> {
          for (int p = next.getAndIncrement(); p < parts; p = next.getAndIncrement()) {
            work.accept(p);
          }
        };
    Runnable end =
        () -> {
          next.set(parts);
          vigil.end(End.STOPPED);
        };
    Threads.run(Math.min(threads, parts), loop, end);
  }
}
