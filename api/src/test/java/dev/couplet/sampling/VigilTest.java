package dev.couplet.sampling;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Watch.Progress;
import dev.couplet.sampling.Watch.StopSignal;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;

class VigilTest {
  private static final OptionalDouble NONE = OptionalDouble.empty();

  private final AtomicLong clock = new AtomicLong(1_000);
  private final StopSignal stop = StopSignal.create();

  private Vigil begin(Effort effort) {
    return Vigil.begin(effort, Watch.stop(stop).clock(clock::get));
  }

  @AfterEach
  void noInterruptIsLeft() {
    assertFalse(Thread.interrupted());
  }

  @Test
  void nothingEndsARunThatNobodyEnds() {
    Vigil vigil = begin(Effort.draws(1));
    clock.set(Long.MAX_VALUE);
    assertFalse(vigil.over());
    assertEquals(End.DONE, vigil.reason());
  }

  @Test
  void theDeadlineIsReachedWhenTheTimeIsUp() {
    Vigil vigil = begin(Effort.within(Duration.ofNanos(500)));
    clock.set(1_499);
    assertFalse(vigil.over());
    assertEquals(Duration.ofNanos(499), vigil.elapsed());
    clock.set(1_500);
    assertTrue(vigil.over());
    assertEquals(End.DEADLINE, vigil.reason());
  }

  /** By the figures of the class: 16 ns a variable and 2 ns a pair, of the limit an eighth. */
  @Test
  void onAFormTimeIsKeptForReturning() {
    Qubo form = Qubo.builder(10).addPair(0, 1, 1).addPair(2, 3, 1).build();
    Watch watch = Watch.none().clock(clock::get);
    Vigil vigil = Vigil.begin(Effort.within(Duration.ofNanos(10_000)), watch, form);
    clock.set(1_000 + 10_000 - 165);
    assertFalse(vigil.over());
    clock.addAndGet(1);
    assertTrue(vigil.over());
    assertEquals(End.DEADLINE, vigil.reason());
    clock.set(1_000);
    Vigil brief = Run.of(Effort.within(Duration.ofNanos(80))).watch(watch).begin(form);
    clock.set(1_069);
    assertFalse(brief.over());
    clock.set(1_070);
    assertTrue(brief.over());
    assertFalse(Vigil.begin(Effort.draws(1), watch, form).over());
  }

  @Test
  void whatCannotBeHadInTimeIsNotBegun() {
    Vigil vigil = begin(Effort.within(Duration.ofNanos(500)));
    clock.set(1_300);
    assertFalse(vigil.overBefore(199));
    assertFalse(vigil.over());
    assertTrue(vigil.overBefore(200));
    assertEquals(End.DEADLINE, vigil.reason());
    assertTrue(vigil.over());
    assertFalse(begin(Effort.draws(1)).overBefore(Long.MAX_VALUE));
  }

  @Test
  void theClockMayStartAnywhere() {
    clock.set(Long.MAX_VALUE - 10);
    Vigil vigil = begin(Effort.within(Duration.ofNanos(20)));
    clock.addAndGet(19);
    assertFalse(vigil.over());
    clock.addAndGet(1);
    assertTrue(vigil.over());
  }

  @Test
  void aLimitOfMillenniaIsNoLimit() {
    Vigil vigil = begin(Effort.within(Duration.ofDays(365_000_000)));
    clock.set(Long.MAX_VALUE);
    assertFalse(vigil.over());
  }

  @Test
  void theFirstReasonStands() {
    Vigil vigil = begin(Effort.within(Duration.ofNanos(1)));
    clock.addAndGet(5);
    assertTrue(vigil.over());
    stop.stop();
    assertTrue(vigil.over());
    vigil.end(End.TARGET);
    assertEquals(End.DEADLINE, vigil.reason());
    clock.set(0);
    assertTrue(vigil.over());
  }

  @Test
  void aMethodMayEndTheRunItself() {
    Vigil vigil = begin(Effort.draws(1));
    vigil.end(End.TARGET);
    stop.stop();
    assertTrue(vigil.over());
    assertEquals(End.TARGET, vigil.reason());
  }

  @Test
  void aStopGoesBeforeADeadline() {
    Vigil vigil = begin(Effort.within(Duration.ofNanos(1)));
    clock.addAndGet(5);
    stop.stop();
    assertTrue(vigil.over());
    assertEquals(End.STOPPED, vigil.reason());
  }

  @Test
  void aStopBeforeTheStartIsSeenAtTheFirstLook() {
    stop.stop();
    Vigil vigil = begin(Effort.draws(1));
    assertEquals(End.DONE, vigil.reason());
    assertTrue(vigil.over());
    assertEquals(End.STOPPED, vigil.reason());
  }

  @Test
  void anInterruptIsAStopAndStaysSet() {
    Vigil vigil = begin(Effort.draws(1));
    Thread.currentThread().interrupt();
    assertTrue(vigil.over());
    assertEquals(End.STOPPED, vigil.reason());
    assertTrue(Thread.interrupted());
    assertTrue(vigil.over());
  }

  @Test
  void workersSeeTheInterruptOfTheCallerAndNoOther() throws InterruptedException {
    Vigil vigil = begin(Effort.draws(1));
    List<Boolean> seen = new ArrayList<>();
    Thread worker =
        new Thread(
            () -> {
              Thread.currentThread().interrupt();
              seen.add(vigil.over());
            });
    worker.start();
    worker.join();
    Thread.currentThread().interrupt();
    Thread second = new Thread(() -> seen.add(vigil.over()));
    second.start();
    assertTrue(Thread.interrupted());
    second.join();
    // The second look may come after the flag was cleared above; what it saw then, it keeps.
    assertFalse(seen.get(0));
    assertEquals(seen.get(1), vigil.over());
  }

  @Test
  void theListenerHearsAtOnceAndThenEveryFiftyMilliseconds() {
    List<Progress> heard = new ArrayList<>();
    Vigil vigil = Vigil.begin(Effort.draws(1), Watch.none().progress(heard::add).clock(clock::get));
    long start = clock.get();
    for (long millis : new long[] {0, 1, 49, 50, 99, 100, 1000}) {
      clock.set(start + Duration.ofMillis(millis).toNanos());
      vigil.report(OptionalDouble.of(millis / 1000.0), OptionalDouble.of(-millis), NONE);
    }
    List<Duration> times = heard.stream().map(Progress::elapsed).toList();
    List<Duration> expected = new ArrayList<>();
    for (long millis : new long[] {0, 50, 100, 1000}) {
      expected.add(Duration.ofMillis(millis));
    }
    assertEquals(expected, times);
    assertEquals(
        new Progress(Duration.ofMillis(50), OptionalDouble.of(0.05), OptionalDouble.of(-50), NONE),
        heard.get(1));
  }

  @Test
  void withoutAListenerTheClockIsLeftAlone() {
    AtomicInteger readings = new AtomicInteger();
    Vigil vigil = Vigil.begin(Effort.draws(1), Watch.none().clock(readings::incrementAndGet));
    int before = readings.get();
    vigil.report(NONE, NONE, NONE);
    assertFalse(vigil.over());
    assertEquals(before, readings.get());
  }

  @Test
  void whatAListenerThrowsComesThrough() {
    IllegalStateException thrown = new IllegalStateException("enough");
    Watch watch =
        Watch.none()
            .progress(
                progress -> {
                  throw thrown;
                });
    Vigil vigil = Vigil.begin(Effort.draws(1), watch);
    assertSame(
        thrown, assertThrows(IllegalStateException.class, () -> vigil.report(NONE, NONE, NONE)));
  }

  @Test
  void aListenerIsCalledByOneThreadAtATime() throws InterruptedException {
    AtomicInteger inside = new AtomicInteger();
    AtomicInteger most = new AtomicInteger();
    AtomicLong steps = new AtomicLong();
    long step = Duration.ofMillis(60).toNanos();
    Watch watch =
        Watch.none()
            .clock(() -> steps.addAndGet(step))
            .progress(
                progress -> {
                  most.accumulateAndGet(inside.incrementAndGet(), Math::max);
                  inside.decrementAndGet();
                });
    Vigil vigil = Vigil.begin(Effort.draws(1), watch);
    CountDownLatch gate = new CountDownLatch(1);
    List<Thread> threads = new ArrayList<>();
    for (int t = 0; t < 4; t++) {
      Thread thread =
          new Thread(
              () -> {
                await(gate);
                for (int k = 0; k < 500; k++) {
                  vigil.report(NONE, NONE, NONE);
                }
              });
      threads.add(thread);
      thread.start();
    }
    gate.countDown();
    for (Thread thread : threads) {
      thread.join();
    }
    assertEquals(1, most.get());
  }

  private static void await(CountDownLatch gate) {
    try {
      gate.await();
    } catch (InterruptedException e) {
      throw new IllegalStateException(e);
    }
  }

  @Test
  void aRunBeginsItsOwnVigil() {
    Run run = Run.of(Effort.within(Duration.ofNanos(1))).watch(Watch.none().clock(clock::get));
    Vigil vigil = run.begin();
    clock.addAndGet(1);
    assertTrue(vigil.over());
  }
}
