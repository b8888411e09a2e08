package dev.couplet.sampling;

/**
 * A way to ask a run to stop from another thread, or before it starts.
 *
 * <p>Sticky: once stopped, it stays so, and every run that watches it ends. Thread-safe.
 */
public final class StopSignal {
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
