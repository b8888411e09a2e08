package dev.couplet.anneal;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.kernel.Forms;
import dev.couplet.kernel.SamplerContract;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.time.Duration;
import java.util.List;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;

class AnnealingTest extends SamplerContract {
  @Override
  protected Sampler sampler() {
    return Annealing.standard();
  }

  /** Written down once, to notice if a platform or a change gives other draws. */
  @Test
  void goldenDraws() {
    Qubo form = Forms.integers(60, 0.5, 99, 1);
    Draws draws = Annealing.standard().finish(Finish.NONE).sample(form, Effort.draws(3).sweeps(3));
    assertEquals(
        "111111111111111111110111111001110010001000101011001101111100",
        draws.rows().get(0).state().toString());
    assertEquals(
        "110111001111111111110111111101110010001000001110101101110100",
        draws.rows().get(1).state().toString());
    assertEquals(
        "111110101111110110110011011100111011001000101011101101111001",
        draws.rows().get(2).state().toString());
    Draws reals = Annealing.standard().sample(Forms.reals(60, 0.3, 1), Effort.draws(1).sweeps(5));
    assertEquals(
        "101111110110101001111110111111001000110101101101001000101011",
        reals.best().state().toString());
  }

  @Test
  void everyDrawEndsInALocalMinimum() {
    Qubo form = Forms.integers(40, 0.3, 9, 1);
    for (Draw draw :
        Annealing.standard().hot(50).cold(20).sample(form, Effort.draws(30).sweeps(3))) {
      assertTrue(Forms.localMinimum(form, draw.state(), 0));
    }
  }

  @Test
  void withoutADescentASampleStaysAsHotAsItsLastSweep() {
    Qubo form = Forms.integers(40, 0.3, 9, 1);
    Annealing hot = Annealing.standard().hot(50).cold(20).finish(Finish.NONE);
    Draws draws = hot.sample(form, Effort.draws(30).sweeps(3));
    assertTrue(draws.rows().stream().anyMatch(d -> !Forms.localMinimum(form, d.state(), 0)));
  }

  @Test
  void drawsBeginFromTheStartsInTurn() {
    Qubo form = Qubo.builder(8).build();
    State ones = State.parse("11111111");
    State alternating = State.parse("10101010");
    Run run = Run.of(Effort.draws(5).sweeps(2)).starts(List.of(ones, alternating));
    // On a form without coefficients every attempt is accepted: two sweeps lead back to the start.
    Draws draws = Annealing.standard().sample(form, run);
    assertEquals(List.of(new Draw(ones, 0, 3), new Draw(alternating, 0, 2)), draws.rows());
  }

  /**
   * The clock moves one millisecond a look, and the run makes 216 * 100,000 attempts: at most 2^20
   * steps apart, it must look at least 20 times.
   */
  @Test
  void theWatchIsAskedOftenEnough() {
    Qubo form = Forms.spinGlass(6, 2);
    AtomicLong clock = new AtomicLong();
    Watch ticking = Watch.none().clock(() -> clock.addAndGet(1_000_000));
    Effort effort = Effort.draws(1).sweeps(100_000).limit(Duration.ofHours(1));
    Draws draws = Annealing.standard().sample(form, Run.of(effort).watch(ticking));
    assertEquals(End.DONE, draws.end());
    assertTrue(clock.get() / 1_000_000 >= 216L * 100_000 / Vigil.STEPS);
  }

  @Test
  void aStopDuringADrawEndsIt() {
    Qubo form = Forms.spinGlass(6, 2);
    StopSignal stop = StopSignal.create();
    AtomicLong looks = new AtomicLong();
    Watch watch =
        Watch.stop(stop)
            .clock(
                () -> {
                  if (looks.incrementAndGet() == 10) {
                    stop.stop();
                  }
                  return 0;
                });
    Effort effort = Effort.draws(4).sweeps(Integer.MAX_VALUE).limit(Duration.ofHours(1)).threads(2);
    Draws draws = Annealing.standard().sample(form, Run.of(effort).watch(watch));
    assertEquals(End.STOPPED, draws.end());
    assertEquals(1, draws.total());
    assertTrue(Forms.localMinimum(form, draws.best().state(), 0));
  }

  @Test
  void progressIsTold() {
    Qubo form = Forms.spinGlass(4, 2);
    AtomicLong clock = new AtomicLong();
    double[] last = {0, Double.POSITIVE_INFINITY};
    int[] told = {0};
    Watch watch =
        Watch.none()
            .clock(() -> clock.addAndGet(20_000_000))
            .progress(
                progress -> {
                  told[0]++;
                  assertTrue(progress.share().getAsDouble() >= last[0]);
                  last[0] = progress.share().getAsDouble();
                  progress.best().ifPresent(best -> last[1] = best);
                });
    Draws draws =
        Annealing.standard().sample(form, Run.of(Effort.draws(31).sweeps(20)).watch(watch));
    assertTrue(told[0] > 5);
    assertTrue(last[0] > 0.5 && last[0] <= 1);
    assertTrue(last[1] >= draws.best().energy() && last[1] < 0);
  }

  @Test
  void settingsAreChecked() {
    for (double bad : new double[] {0, -1, Double.NaN, Double.POSITIVE_INFINITY}) {
      assertThrows(IllegalArgumentException.class, () -> Annealing.standard().hot(bad));
      assertThrows(IllegalArgumentException.class, () -> Annealing.standard().cold(bad));
      assertThrows(IllegalArgumentException.class, () -> Cooling.through(1, bad));
    }
    assertThrows(IllegalArgumentException.class, Cooling::through);
  }

  @Test
  void pathsMeetBothEndsAndFallBetween() {
    for (Cooling cooling :
        List.of(Cooling.geometric(), Cooling.linear(), Cooling.inverseLinear())) {
      assertEquals(8, cooling.temperature(8, 2, 0), 1e-12);
      assertEquals(2, cooling.temperature(8, 2, 1), 1e-12);
    }
    assertEquals(4, Cooling.geometric().temperature(8, 2, 0.5), 1e-12);
    assertEquals(5, Cooling.linear().temperature(8, 2, 0.5), 1e-12);
    assertEquals(3.2, Cooling.inverseLinear().temperature(8, 2, 0.5), 1e-12);
    assertEquals(1, Cooling.geometric().temperature(1e300, 1e-300, 0.5), 1e-9);
    Cooling warming = Cooling.through(1, 3, 2);
    assertEquals(1, warming.temperature(9, 9, 0));
    assertEquals(2, warming.temperature(9, 9, 0.25));
    assertEquals(2.5, warming.temperature(9, 9, 0.75));
    assertEquals(2, warming.temperature(9, 9, 1));
  }

  @Test
  void aTimedRunOfATinyFormKeepsABoundedNumberOfDraws() {
    Qubo form = Forms.integers(3, 1, 4, 1);
    AtomicLong clock = new AtomicLong();
    Watch ticking = Watch.none().clock(clock::incrementAndGet);
    Effort effort = Effort.within(Duration.ofNanos(30_000)).sweeps(1);
    Draws draws = Annealing.standard().sample(form, Run.of(effort).watch(ticking));
    assertEquals(End.DEADLINE, draws.end());
    assertTrue(draws.total() <= 1 << 10, "draws: " + draws.total());
    assertEquals(Forms.minimum(form), draws.best().energy());
  }
}
