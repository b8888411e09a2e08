package dev.couplet.bound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.Published;
import dev.couplet.exact.TestForms;
import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.time.Duration;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;

class SemidefiniteBoundTest {
  private static final SemidefiniteBound BOUND = SemidefiniteBound.standard();

  /**
   * The ring of five spins that want to differ: the relaxation turns neighbours by 144 degrees, 5
   * cos(144) = -4.045 (Goemans and Williamson 1995, section 5, in terms of the cut). A weak field
   * on a sixth spin makes the grid of energies fine.
   */
  @Test
  void ringOfFive() {
    double grain = 0x1p-20;
    Ising.Builder ring = Ising.builder(6).addLinear(5, grain);
    for (int i = 0; i < 5; i++) {
      ring.addPair(i, (i + 1) % 5, 1);
    }
    Qubo form = ring.build().toQubo();
    double relaxed = 5 * Math.cos(Math.toRadians(144)) - grain;
    double bound = BOUND.rounds(1).below(form);
    assertTrue(bound <= relaxed + 4 * grain);
    assertEquals(relaxed, bound, 1e-4);
    // With triangles it is exact here: the cut polytope of five points (Barahona 1983).
    assertEquals(-3 - grain, BOUND.rounds(600).below(form), 0.05);
  }

  /** Of n spins that all want to differ the vectors add up to zero: -n / 2, tight for even n. */
  @Test
  void completeAntiferromagnet() {
    int n = 30;
    Ising.Builder complete = Ising.builder(n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        complete.addPair(i, j, 1);
      }
    }
    assertEquals(-n / 2.0, BOUND.rounds(1).below(complete.build().toQubo()));
  }

  /**
   * Dense forms, where the roof dual says little: within 4 % of the minimum, the roof dual 20 %
   * off.
   */
  @Test
  void denseForms() {
    for (int seed = 0; seed < 4; seed++) {
      Qubo form = TestForms.random(Regime.DENSE, 18, seed);
      double minimum = TestForms.minimum(form);
      double bound = BOUND.below(form);
      assertTrue(bound <= minimum && bound >= 1.04 * minimum, bound + " for " + minimum);
      double roof = RoofDual.standard().below(form);
      assertTrue(roof < 1.2 * minimum, roof + " for " + minimum);
    }
  }

  /** Billionnet and Elloumi 2007, 100 bits, all pairs: maximum cut 19412, here within 3 %. */
  @Test
  void publishedDenseForm() {
    Ising graph = Published.graph("be/be100.1.mc.gz");
    double minimum = Published.weight(graph) - 2 * 19412.0;
    double bound = BOUND.rounds(150).below(graph.toQubo());
    assertTrue(bound <= minimum);
    assertTrue(bound >= minimum - 0.03 * Math.abs(minimum), () -> bound + " for " + minimum);
  }

  @Test
  void noBits() {
    assertEquals(2.5, BOUND.below(Qubo.builder(0).addConstant(2.5).build()));
    assertEquals(0, BOUND.below(Qubo.builder(3).build()));
  }

  @Test
  void stoppedBeforeTheStartItSaysNothing() {
    StopSignal signal = StopSignal.create();
    signal.stop();
    Run run = Run.of(Effort.draws(1)).watch(Watch.stop(signal));
    assertEquals(Double.NEGATIVE_INFINITY, BOUND.below(TestForms.random(Regime.DENSE, 10, 3), run));
  }

  /** The clock moves 1 ms a look: rounds, triangles and certificates all end soon after. */
  @Test
  void aDeadlineEndsTheRun() {
    Qubo form = TestForms.random(Regime.DENSE, 60, 3);
    double minimumAtMost = form.value(State.zeros(60));
    for (int millis = 1; millis < 4000; millis += 371) {
      AtomicLong looks = new AtomicLong();
      Watch watch = Watch.none().clock(() -> looks.getAndIncrement() * 1_000_000);
      Run run = Run.of(Effort.within(Duration.ofMillis(millis)));
      double bound = BOUND.below(form, run.watch(watch));
      assertTrue(bound <= minimumAtMost);
      assertTrue(looks.get() <= millis + 2, looks + " looks for " + millis);
    }
  }

  @Test
  void refusesWhatItCannotDo() {
    assertThrows(IllegalArgumentException.class, () -> BOUND.rounds(0));
    assertThrows(IllegalArgumentException.class, () -> BOUND.below(Qubo.builder(1401).build()));
  }
}
