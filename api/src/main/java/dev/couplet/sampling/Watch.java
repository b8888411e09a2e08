package dev.couplet.sampling;

import java.time.Duration;
import java.util.OptionalDouble;
import java.util.function.Consumer;
import java.util.function.LongSupplier;

/**
 * How a run is watched: what may stop it, who hears of its progress, and by which clock it goes.
 *
 * <p>A listener is called from the threads of the run, one call at a time; an exception it throws
 * ends the run and reaches the caller. Immutable; the parts must be thread-safe.
 */
public final class Watch {
  /**
   * A way to ask a run to stop from another thread, or before it starts.
   *
   * <p>Sticky: once stopped, it stays so, and every run that watches it ends. Thread-safe.
   */
  public static final class StopSignal {
    private volatile boolean stopped;

    private StopSignal() {}

    /** A new signal, not yet given. */
    public static StopSignal create() {
      return new StopSignal();
    }

    /** Asks every run that watches this signal to stop. */
    public void stop() {
      stopped = true;
    }

    /** Whether a stop was asked for. */
    public boolean stopped() {
      return stopped;
    }

    @Override
    public String toString() {
      return stopped ? "StopSignal(stopped)" : "StopSignal(running)";
    }
  }

  /**
   * How far a run has come.
   *
   * @param elapsed the time since its start, on the run's clock
   * @param share the share of the work done, 0 to 1; empty if the method cannot tell
   * @param best the lowest energy (or best value) so far; empty if there is none yet
   * @param bound a proved bound on the energy (or value); empty if there is none yet
   */
  public record Progress(
      Duration elapsed, OptionalDouble share, OptionalDouble best, OptionalDouble bound) {}

  private static final Watch NONE =
      new Watch(StopSignal.create(), p -> {}, false, System::nanoTime);

  private final StopSignal stop;
  private final Consumer<Progress> listener;
  private final boolean listening;
  private final LongSupplier clock;

  private Watch(
      StopSignal stop, Consumer<Progress> listener, boolean listening, LongSupplier clock) {
    this.stop = stop;
    this.listener = listener;
    this.listening = listening;
    this.clock = clock;
  }

  /** Nothing stops the run but its effort and an interrupt; nobody listens. */
  public static Watch none() {
    return NONE;
  }

  /** A watch that ends the run when the signal is given. */
  public static Watch stop(StopSignal signal) {
    return new Watch(signal, NONE.listener, false, NONE.clock);
  }

  /** This watch with a listener to the run's progress. */
  public Watch progress(Consumer<Progress> newListener) {
    return new Watch(stop, newListener, true, clock);
  }

  /** This watch with another clock in nanoseconds, for tests of deadlines that do not sleep. */
  public Watch clock(LongSupplier nanoseconds) {
    return new Watch(stop, listener, listening, nanoseconds);
  }

  /** The signal that ends the run. */
  public StopSignal stopSignal() {
    return stop;
  }

  /** Who hears of the run's progress. */
  public Consumer<Progress> listener() {
    return listener;
  }

  /** Whether a listener was set, so that a run need not prepare what nobody hears. */
  public boolean listening() {
    return listening;
  }

  /** The clock of the run, in nanoseconds from an arbitrary origin. */
  public LongSupplier clock() {
    return clock;
  }
}
