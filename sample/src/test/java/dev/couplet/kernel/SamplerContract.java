package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.time.Duration;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;

/** What every sampler that repeats draws promises; a subclass names the sampler. */
public abstract class SamplerContract {
  /** The sampler under test. */
  protected abstract Sampler sampler();

  /** A small effort that is enough for the sampler on forms of ten variables. */
  protected Effort effort() {
    return Effort.draws(20).sweeps(50);
  }

  /** A number of draws, below that of the effort, of which the method makes the same. */
  protected int fewer() {
    return 1;
  }

  private static void assertValid(Qubo form, Draws draws) {
    assertTrue(draws.total() >= 1);
    int total = 0;
    for (Draw draw : draws) {
      assertEquals(form.size(), draw.state().size());
      assertEquals(form.value(draw.state()), draw.energy());
      total += draw.multiplicity();
    }
    assertEquals(draws.total(), total);
  }

  @Test
  void findsTheMinimumOfSmallForms() {
    for (int seed = 0; seed < 20; seed++) {
      Qubo form = Forms.integers(10, seed % 5 / 4.0, 9, seed);
      Draws draws = sampler().sample(form, effort().seed(seed));
      assertValid(form, draws);
      assertEquals(Forms.minimum(form), draws.best().energy());
      assertEquals(End.DONE, draws.end());
      assertEquals(effort().draws().getAsInt(), draws.total());
    }
  }

  @Test
  void theSameSeedGivesTheSameDrawsOnAnyNumberOfThreads() {
    Qubo form = Forms.integers(60, 0.2, 9, 3);
    Draws one = sampler().sample(form, effort().seed(11));
    for (int threads : new int[] {2, 3, 32}) {
      assertEquals(one, sampler().sample(form, effort().seed(11).threads(threads)));
    }
    assertEquals(11, one.seed());
  }

  @Test
  void fewerDrawsAreTheFirstOfMore() {
    Qubo form = Forms.integers(60, 0.2, 9, 3);
    Effort less = Effort.draws(fewer()).sweeps(effort().sweeps().orElse(1));
    Draws more = sampler().sample(form, effort());
    for (Draw draw : sampler().sample(form, less)) {
      assertTrue(
          more.rows().stream()
              .anyMatch(
                  row ->
                      row.state().equals(draw.state())
                          && row.multiplicity() >= draw.multiplicity()));
    }
  }

  @Test
  void aTargetEndsTheRunAtTheLowestDrawOnAnyNumberOfThreads() {
    Qubo form = Forms.spinGlass(4, 1);
    double best = sampler().sample(form, effort()).best().energy();
    Effort towards = effort().target(best);
    Draws one = sampler().sample(form, towards);
    assertEquals(End.TARGET, one.end());
    assertEquals(best, one.best().energy());
    for (int threads : new int[] {2, 5}) {
      assertEquals(one, sampler().sample(form, towards.threads(threads)));
    }
  }

  @Test
  void aTargetThatAnyStateMeetsTakesOneDraw() {
    Qubo form = Forms.integers(30, 0.3, 9, 5);
    Draws draws = sampler().sample(form, effort().target(form.magnitude()).threads(3));
    assertEquals(1, draws.total());
    assertEquals(End.TARGET, draws.end());
  }

  @Test
  void aStopBeforeTheStartGivesTheStart() {
    Qubo form = Forms.integers(30, 0.3, 9, 5);
    StopSignal stop = StopSignal.create();
    stop.stop();
    State start = LocalFields.random(30, Streams.of(8, 8));
    Run run = Run.of(effort().threads(3)).watch(Watch.stop(stop));
    Draws fromStart = sampler().sample(form, run.starts(List.of(start)));
    assertEquals(End.STOPPED, fromStart.end());
    assertEquals(1, fromStart.total());
    assertEquals(start, fromStart.best().state());
    assertValid(form, sampler().sample(form, run));
  }

  @Test
  void anInterruptCountsAsAStopAndStaysSet() {
    Qubo form = Forms.integers(30, 0.3, 9, 5);
    Thread.currentThread().interrupt();
    Draws draws = sampler().sample(form, effort().threads(2));
    assertTrue(Thread.interrupted());
    assertEquals(End.STOPPED, draws.end());
    assertValid(form, draws);
  }

  @Test
  void theDeadlineIsReadFromTheClockOfTheRun() {
    Qubo form = Forms.spinGlass(6, 2);
    AtomicLong clock = new AtomicLong();
    Watch ticking = Watch.none().clock(() -> clock.addAndGet(1_000_000));
    Effort effort = Effort.within(Duration.ofMillis(200));
    Draws draws = sampler().sample(form, Run.of(effort).watch(ticking));
    assertEquals(End.DEADLINE, draws.end());
    assertValid(form, draws);
    // Once the 200th look has found the time up, nobody needs to look again but to take its leave.
    assertTrue(clock.get() <= 220_000_000, "looks: " + clock.get() / 1_000_000);
  }

  /**
   * A form that takes many looks to set up: wherever the deadline comes, the run looks no more once
   * it knows, and returns something valid.
   */
  @Test
  void theDeadlineMayComeAtAnyLookAlsoWhileSettingUp() {
    Qubo form = Forms.ring(1 << 17);
    Set<State> begun = new HashSet<>();
    for (int look = 1; look <= 100; look += 1 + look / 4) {
      AtomicLong clock = new AtomicLong(-1);
      Watch ticking = Watch.none().clock(() -> clock.incrementAndGet() * 1_000_000_000);
      Run run = Run.of(Effort.within(Duration.ofSeconds(look))).watch(ticking);
      Draws draws = sampler().sample(form, run);
      assertEquals(End.DEADLINE, draws.end());
      assertValid(form, draws);
      // It began at 0, and one more look is allowed to a draw that takes its leave.
      assertTrue(clock.get() <= look + 1, "looks: " + clock.get() + " of " + look);
      begun.add(draws.best().state());
    }
    assertTrue(begun.size() > 1, "no run came beyond its beginning");
  }

  @Test
  void twoThreadsEndAtTheDeadlineToo() {
    Qubo form = Forms.spinGlass(6, 2);
    AtomicLong clock = new AtomicLong();
    Watch ticking = Watch.none().clock(() -> clock.addAndGet(1_000_000));
    Effort effort = Effort.within(Duration.ofMillis(100)).threads(2);
    Draws draws = sampler().sample(form, Run.of(effort).watch(ticking));
    assertEquals(End.DEADLINE, draws.end());
    assertValid(form, draws);
  }

  @Test
  void whatAListenerThrowsReachesTheCaller() {
    Qubo form = Forms.spinGlass(4, 2);
    IllegalStateException thrown = new IllegalStateException("enough");
    Watch throwing =
        Watch.none()
            .progress(
                progress -> {
                  throw thrown;
                });
    for (int threads : new int[] {1, 4}) {
      Run run = Run.of(effort().threads(threads)).watch(throwing);
      assertSame(
          thrown, assertThrows(IllegalStateException.class, () -> sampler().sample(form, run)));
    }
  }

  @Test
  void noThreadOutlivesTheRun() {
    Qubo form = Forms.spinGlass(4, 2);
    assertEquals(effort().draws().getAsInt(), sampler().sample(form, effort().threads(4)).total());
    assertTrue(
        Thread.getAllStackTraces().keySet().stream()
            .noneMatch(thread -> thread.getName().startsWith("couplet-")));
  }

  @Test
  void degenerateForms() {
    Qubo none = Qubo.builder(0).addConstant(3).build();
    assertEquals(3, sampler().sample(none, effort()).best().energy());
    assertEquals(3, sampler().sample(none, Effort.within(Duration.ofSeconds(60))).best().energy());
    Qubo one = Qubo.builder(1).addLinear(0, -2).build();
    Draws single = sampler().sample(one, effort());
    assertEquals(-2, single.best().energy());
    assertEquals(effort().draws().getAsInt(), single.best().multiplicity());
    Qubo zero = Qubo.builder(5).build();
    assertEquals(0, sampler().sample(zero, effort()).best().energy());
    assertEquals(effort().draws().getAsInt(), sampler().sample(zero, effort()).total());
    Qubo apart = Qubo.builder(70).addLinear(3, 1).addLinear(69, -1).addPair(10, 20, -4).build();
    assertEquals(-5, sampler().sample(apart, effort()).best().energy());
  }

  @Test
  void coefficientsOfAnyMagnitude() {
    for (double unit : new double[] {1e-300, 1e-12, 1e12, 1e300}) {
      Qubo small = Forms.integers(10, 0.5, 9, 4);
      Qubo form = small.times(unit);
      double minimum = Forms.minimum(form);
      double slack = form.exact() ? 0 : Math.abs(minimum) * 1e-12;
      assertEquals(minimum, sampler().sample(form, effort()).best().energy(), slack);
    }
    Qubo.Builder mixed = Qubo.builder(40).allowRounding();
    for (int i = 0; i < 40; i++) {
      mixed.addLinear(i, (i % 2 == 0 ? -1 : 1) * StrictMath.pow(10, 15.0 * (i - 20)));
    }
    State best = sampler().sample(mixed.build(), effort()).best().state();
    for (int i = 0; i < 40; i++) {
      assertEquals(i % 2 == 0, best.get(i), "variable " + i);
    }
  }

  @Test
  void aStartOfAnotherSizeIsRefused() {
    Run run = Run.of(effort()).starts(List.of(State.zeros(4)));
    assertThrows(
        IllegalArgumentException.class, () -> sampler().sample(Forms.integers(5, 1, 3, 1), run));
  }
}
