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

class BranchAndBoundTest {
  private static final BranchAndBound SEARCH = BranchAndBound.standard();
  private static final Effort EFFORT = Effort.draws(1);

  /**
   * Beasley's binary quadratic programmes of 50 and 100 bits; optima as published (Beasley 1998; OR
   * Library).
   */
  @Test
  void publishedBinaryQuadraticProgrammes() {
    double[] of50 = {2098, 3702, 4626, 3544, 4012};
    double[] of100 = {7970, 11036, 12723, 10368, 9083};
    for (int k = 0; k < 5; k++) {
      proves(-of50[k], Published.binaryQuadratic("bqp50-" + (k + 1) + ".txt"));
      proves(-of100[k], Published.binaryQuadratic("bqp100-" + (k + 1) + ".txt.gz"));
    }
  }

  /** A torus of 10 x 10 Gaussian spins: maximum cut 6049461 (Liers 2004). */
  @Test
  void publishedTorus() {
    Ising torus = Published.graph("torus/t2g10_5555.txt");
    double minimum = Published.weight(torus) - 2 * 6049461.0;
    proves(minimum, torus.toQubo());
    Draws eliminated = Elimination.standard().sample(torus.toQubo(), EFFORT);
    assertEquals(minimum, eliminated.best().energy());
    assertTrue(eliminated.proved());
  }

  private static void proves(double minimum, Qubo form) {
    Draws draws = SEARCH.sample(form, EFFORT);
    assertEquals(minimum, draws.best().energy());
    assertTrue(draws.proved());
    assertEquals(End.DONE, draws.end());
  }

  /** Pairs of one sign between all of n spins that want to differ: n / 2 on either side. */
  @Test
  void completeAntiferromagnet() {
    int n = 26;
    Ising.Builder complete = Ising.builder(n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        complete.addPair(i, j, 1);
      }
    }
    // The square of the sum of all spins, n of its terms being squares, is at least 0.
    proves(-n / 2.0, complete.build().toQubo());
  }

  /** One bit more than is enumerated at once: the semidefinite bound does most of the work. */
  @Test
  void denseForm() {
    Qubo form = TestForms.random(Regime.DENSE, 31, 2);
    proves(Enumeration.standard().levels(form, 1).minimum(), form);
  }

  @Test
  void noBits() {
    Draws draws = SEARCH.sample(Qubo.builder(0).addConstant(-2).build(), EFFORT);
    assertEquals(-2, draws.best().energy());
    assertTrue(draws.proved());
  }

  @Test
  void threadsDoNotChangeTheResult() {
    Qubo form = TestForms.random(Regime.DENSE, 24, 11);
    assertEquals(SEARCH.sample(form, EFFORT), SEARCH.sample(form, EFFORT.threads(3)));
  }

  @Test
  void stoppedBeforeTheStartItReturnsTheStart() {
    StopSignal signal = StopSignal.create();
    signal.stop();
    Qubo form = TestForms.random(Regime.DENSE, 30, 3);
    State good = Enumeration.standard().levels(form, 1).lowest().get(0);
    Run run = Run.of(EFFORT).watch(Watch.stop(signal)).starts(List.of(good));
    Draws draws = SEARCH.sample(form, run);
    assertEquals(End.STOPPED, draws.end());
    assertEquals(good, draws.best().state());
    assertFalse(draws.proved());
  }

  /** The clock moves 1 ms a look: the run ends within a few looks of its deadline. */
  @Test
  void aDeadlineEndsTheRun() {
    AtomicLong looks = new AtomicLong();
    Watch watch = Watch.none().clock(() -> looks.getAndIncrement() * 1_000_000);
    Run run = Run.of(Effort.within(Duration.ofMillis(3000))).watch(watch);
    Draws draws = SEARCH.sample(TestForms.random(Regime.DENSE, 60, 1), run);
    assertEquals(End.DEADLINE, draws.end());
    assertFalse(draws.proved());
    assertTrue(draws.bound().orElseThrow() < draws.best().energy());
    assertTrue(looks.get() < 3010, () -> looks + " looks");
  }

  @Test
  void aTargetEndsTheRun() {
    Qubo form = TestForms.random(Regime.DENSE, 40, 1);
    Draws draws = SEARCH.sample(form, EFFORT.target(-1));
    assertEquals(End.TARGET, draws.end());
    assertTrue(draws.best().energy() <= -1);
  }

  @Test
  void refusesWhatItCannotDo() {
    assertThrows(IllegalArgumentException.class, () -> SEARCH.nodes(0));
    Run wrong = Run.of(EFFORT).starts(List.of(State.zeros(3)));
    assertThrows(
        IllegalArgumentException.class, () -> SEARCH.sample(Qubo.builder(2).build(), wrong));
  }
}
