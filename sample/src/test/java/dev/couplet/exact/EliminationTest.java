package dev.couplet.exact;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.time.Duration;
import java.util.List;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;

class EliminationTest {
  private static final Run RUN = Run.of(Effort.draws(1));
  private static final Elimination ELIMINATION = Elimination.standard();

  /** Common practice: the frustrated triangle has minimum -1 and six ground states. */
  @Test
  void frustratedTriangle() {
    Ground ground = ELIMINATION.ground(TestForms.frustratedTriangle(), RUN).orElseThrow();
    assertEquals(-1, ground.energy());
    assertEquals(6, ground.states());
  }

  /** The odd antiferromagnetic ring of n spins: one pair is alike, 2 n ground states. */
  @Test
  void longOddRing() {
    int n = 20_001;
    Ising.Builder ring = Ising.builder(n);
    for (int i = 0; i < n; i++) {
      ring.addPair(i, (i + 1) % n, 1);
    }
    Ground ground = ELIMINATION.ground(ring.build().toQubo(), RUN).orElseThrow();
    assertEquals(2 - n, ground.energy());
    assertEquals(2 * n, ground.states());
  }

  /**
   * The fully frustrated square lattice (Villain 1977) on a 2 x m strip: every plaquette has one
   * pair unsatisfied at least, and rungs alone can serve two each. Against enumeration.
   */
  @Test
  void ladders() {
    int m = 8;
    Ising.Builder ladder = Ising.builder(2 * m);
    for (int i = 0; i < m; i++) {
      ladder.addPair(2 * i, 2 * i + 1, i % 2 == 0 ? -1 : 1);
      if (i > 0) {
        ladder.addPair(2 * i - 2, 2 * i, -1).addPair(2 * i - 1, 2 * i + 1, -1);
      }
    }
    Qubo form = ladder.build().toQubo();
    Levels levels = Enumeration.standard().levels(form, 1);
    Ground ground = ELIMINATION.ground(form, RUN).orElseThrow();
    assertEquals(levels.minimum(), ground.energy());
    assertEquals(levels.minima(), ground.states());
  }

  @Test
  void noBitsAndNoPairs() {
    Ground none = ELIMINATION.ground(Qubo.builder(0).addConstant(3).build(), RUN).orElseThrow();
    assertEquals(new Ground(3, 1, State.zeros(0)), none);
    Ground free = ELIMINATION.ground(Qubo.builder(70).build(), RUN).orElseThrow();
    assertEquals(0x1p70, free.states());
  }

  @Test
  void refusesWhatItCannotDo() {
    Qubo dense = TestForms.random(Regime.DENSE, 60, 1);
    String told =
        assertThrows(IllegalArgumentException.class, () -> ELIMINATION.sample(dense, RUN))
            .getMessage();
    assertTrue(told.contains("60") && told.contains("width"), told);
    assertTrue(ELIMINATION.steps(dense).isEmpty());
    assertThrows(IllegalArgumentException.class, () -> ELIMINATION.width(31));
    assertThrows(IllegalArgumentException.class, () -> ELIMINATION.conditioned(-1));
    Qubo real = TestForms.random(Regime.REAL, 5, 1);
    assertThrows(IllegalArgumentException.class, () -> ELIMINATION.ground(real, RUN));
  }

  @Test
  void stepsGrowWithTheWidth() {
    Qubo chain = Qubo.builder(3).addPair(0, 1, 1).addPair(1, 2, 1).build();
    // Two tables of 2 entries and one of 1; the last two take in one each.
    assertEquals(2 + 2 * 2 + 2 * 1, ELIMINATION.steps(chain).orElseThrow());
    assertTrue(ELIMINATION.steps(TestForms.random(Regime.DENSE, 12, 1)).orElseThrow() > 1 << 11);
  }

  @Test
  void endsEarlyWithWhatItHas() {
    StopSignal signal = StopSignal.create();
    signal.stop();
    Qubo form = TestForms.random(Regime.DENSE, 12, 3);
    State start = State.parse("101010101010");
    Run stopped = RUN.watch(Watch.stop(signal)).starts(List.of(start));
    Draws draws = ELIMINATION.sample(form, stopped);
    assertEquals(End.STOPPED, draws.end());
    assertEquals(start, draws.best().state());
    assertTrue(draws.bound().isEmpty());
    assertTrue(ELIMINATION.ground(form, stopped).isEmpty());

    AtomicLong looks = new AtomicLong();
    Watch watch = Watch.none().clock(() -> looks.getAndIncrement() * 1_000_000);
    Run run = Run.of(Effort.within(Duration.ofMillis(200))).watch(watch);
    Draws some = ELIMINATION.width(6).sample(form, run);
    assertEquals(End.DEADLINE, some.end());
    assertFalse(some.proved());
    assertTrue(looks.get() < 210);
  }

  @Test
  void aTargetIsReported() {
    Qubo form = TestForms.random(Regime.DENSE, 12, 3);
    double minimum = TestForms.minimum(form);
    assertEquals(End.TARGET, ELIMINATION.sample(form, Effort.draws(1).target(minimum)).end());
    Draws missed = ELIMINATION.sample(form, Effort.draws(1).target(minimum - 1));
    assertEquals(End.DONE, missed.end());
    assertTrue(missed.proved());
  }
}
