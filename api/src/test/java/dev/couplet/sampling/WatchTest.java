package dev.couplet.sampling;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.sampling.Watch.Progress;
import dev.couplet.sampling.Watch.StopSignal;
import java.util.function.Consumer;
import java.util.function.LongSupplier;
import org.junit.jupiter.api.Test;

class WatchTest {
  @Test
  void nobodyListensUnlessAsked() {
    assertFalse(Watch.none().listening());
    assertFalse(Watch.none().stopSignal().stopped());
    assertFalse(Watch.stop(StopSignal.create()).listening());
  }

  @Test
  void partsAreKeptWhateverTheirOrder() {
    StopSignal stop = StopSignal.create();
    Consumer<Progress> listener = progress -> {};
    LongSupplier clock = () -> 7;
    for (Watch watch :
        new Watch[] {
          Watch.stop(stop).progress(listener).clock(clock),
          Watch.stop(stop).clock(clock).progress(listener)
        }) {
      assertSame(stop, watch.stopSignal());
      assertSame(listener, watch.listener());
      assertSame(clock, watch.clock());
      assertTrue(watch.listening());
    }
  }

  @Test
  void theOrdinaryClockGoesForward() {
    LongSupplier clock = Watch.none().clock();
    long first = clock.getAsLong();
    long second = clock.getAsLong();
    assertTrue(second - first >= 0);
  }

  @Test
  void aStopIsForGood() {
    StopSignal stop = StopSignal.create();
    assertEquals("StopSignal(running)", stop.toString());
    stop.stop();
    stop.stop();
    assertTrue(stop.stopped());
    assertEquals("StopSignal(stopped)", stop.toString());
    assertFalse(Watch.none().stopSignal().stopped());
  }
}
