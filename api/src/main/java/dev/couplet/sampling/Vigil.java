package dev.couplet.sampling;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Watch.Progress;
import java.time.Duration;
import java.util.OptionalDouble;
import java.util.function.LongSupplier;
import org.jspecify.annotations.Nullable;

/**
 * The watch kept over one run: methods ask it, at most 2^20 elementary steps apart, whether to go
 * on.
 *
 * <p>It begins when it is made and answers for the deadline, the stop signal, and an interrupt of
 * the thread that made it (whose flag it leaves set). Once over, it stays over, with the first
 * reason. Thread-safe: all threads of a run share one.
 */
public final class Vigil {
  /** Work done between two looks must not exceed this many elementary steps. */
  public static final int STEPS = 1 << 20;

  private static final long REPORT_NANOS = 50_000_000;

  /** What it takes, at a guess, to finish and value a state: a variable, a pair. */
  private static final long NANOS_A_VARIABLE = 16;

  private static final long NANOS_A_PAIR = 2;

  /** The share of a time limit that is kept for that at most. */
  private static final int LARGEST_SHARE = 8;

  private static final long UNLIMITED = Long.MAX_VALUE;

  private final Watch watch;
  private final LongSupplier clock;
  private final long began;
  private final long limit;
  private final Thread caller;
  private final Object ending = new Object();
  private volatile @Nullable End end;
  private long reported;

  private Vigil(Effort effort, Watch watch, long kept) {
    this.watch = watch;
    this.clock = watch.clock();
    this.began = clock.getAsLong();
    this.limit = effort.limit().map(Vigil::nanos).map(all -> less(all, kept)).orElse(UNLIMITED);
    this.caller = Thread.currentThread();
    this.reported = -REPORT_NANOS;
  }

  /** Begins the watch over a run with this effort, made on the caller's own thread. */
  public static Vigil begin(Effort effort, Watch watch) {
    return new Vigil(effort, watch, 0);
  }

  /**
   * Begins the watch over a run on a form, made on the caller's own thread: of a time limit it
   * keeps what it takes to finish and value one state, an eighth at most, so that the run can
   * return by the end of it.
   */
  public static Vigil begin(Effort effort, Watch watch, Qubo form) {
    return new Vigil(
        effort, watch, NANOS_A_VARIABLE * form.size() + NANOS_A_PAIR * (long) form.pairs());
  }

  private static long less(long limit, long kept) {
    return limit == UNLIMITED ? limit : limit - Math.min(kept, limit / LARGEST_SHARE);
  }

  private static long nanos(Duration duration) {
    try {
      return duration.toNanos();
    } catch (ArithmeticException centuries) {
      return UNLIMITED;
    }
  }

  /** Whether the run has to end now; looks at signal, interrupt and clock. */
  public boolean over() {
    return overBefore(0);
  }

  /**
   * Whether the run has to end before an array of so many bytes could be had, at about a nanosecond
   * a byte; if so, it ends now.
   */
  public boolean overBefore(long bytes) {
    if (end != null) {
      return true;
    }
    if (watch.stopSignal().stopped() || caller.isInterrupted()) {
      end(End.STOPPED);
    } else if (limit != UNLIMITED && clock.getAsLong() - began >= limit - bytes) {
      end(End.DEADLINE);
    }
    return end != null;
  }

  /** Ends the run for a reason of the method's own; the first reason given stands. */
  public void end(End reason) {
    synchronized (ending) {
      end = end == null ? reason : end;
    }
  }

  /** Why the run ended; {@link End#DONE} while nothing has ended it. */
  public End reason() {
    End reason = end;
    return reason == null ? End.DONE : reason;
  }

  /** The time since the run began, on its clock. */
  public Duration elapsed() {
    return Duration.ofNanos(clock.getAsLong() - began);
  }

  /**
   * Tells the listener how far the run is, at most every 50 ms; what the listener throws comes
   * through.
   */
  public void report(OptionalDouble share, OptionalDouble best, OptionalDouble bound) {
    if (!watch.listening()) {
      return;
    }
    synchronized (this) {
      long now = clock.getAsLong() - began;
      if (now - reported >= REPORT_NANOS) {
        reported = now;
        watch.listener().accept(new Progress(Duration.ofNanos(now), share, best, bound));
      }
    }
  }
}
