package dev.couplet.audit;

import java.util.concurrent.atomic.AtomicLong;
import java.util.function.LongSupplier;

/** A clock that moves on by a fixed step at every reading. Thread-safe. */
final class TestClock implements LongSupplier {
  private final long step;
  private final long eventAt;
  private final Runnable event;
  private final AtomicLong readings = new AtomicLong();

  private TestClock(long step, long eventAt, Runnable event) {
    this.step = step;
    this.eventAt = eventAt;
    this.event = event;
  }

  static TestClock stepping(long nanos) {
    return new TestClock(nanos, -1, () -> {});
  }

  /** A clock that does something at one of its readings, counted from 0. */
  static TestClock thatAt(long reading, Runnable event) {
    return new TestClock(1, reading, event);
  }

  @Override
  public long getAsLong() {
    long reading = readings.getAndIncrement();
    if (reading == eventAt) {
      event.run();
    }
    return reading * step;
  }
}
