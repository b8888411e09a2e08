package dev.couplet.anneal;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.kernel.Forms;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import org.junit.jupiter.api.Test;

/** At a fixed temperature, draws follow the Boltzmann distribution. */
class AnnealingDistributionTest {
  private static final int DRAWS = 20_000;

  private static Annealing at(double temperature) {
    return Annealing.standard().hot(temperature).cold(temperature).finish(Finish.NONE);
  }

  /**
   * Six spins on a ring with an odd number of antiferromagnetic pairs and two chords: every state
   * is frustrated. Chi-square over 64 states, 63 degrees of freedom: mean 63, standard deviation
   * 11.2; above 120 with probability 2e-5.
   */
  @Test
  void frustratedRing() {
    Ising.Builder ring = Ising.builder(6).addLinear(0, 0.3).addLinear(3, -0.2);
    for (int i = 0; i < 6; i++) {
      ring.addPair(i, (i + 1) % 6, i == 2 ? 1 : -1);
    }
    Qubo form = ring.addPair(0, 3, 0.7).addPair(1, 4, -0.4).build().toQubo();
    assertTrue(chiSquare(form, 2.0, 60) < 120);
  }

  /** As above, on a dense form with integer coefficients: draws are made 64 at once. */
  @Test
  void denseIntegers() {
    assertTrue(chiSquare(Forms.integers(6, 1, 5, 9), 6.0, 60) < 120);
  }

  /**
   * The check itself: draws of a slightly hotter run are told from those of the asked temperature.
   */
  @Test
  void aTemperatureOffByAFifthIsNoticed() {
    Qubo form = Forms.integers(6, 1, 5, 9);
    Draws hotter = at(7.2).sample(form, Effort.draws(DRAWS).sweeps(60));
    assertTrue(ChiSquare.of(form, 6.0, hotter) > 160);
  }

  private static double chiSquare(Qubo form, double temperature, int sweeps) {
    Draws draws = at(temperature).sample(form, Effort.draws(DRAWS).sweeps(sweeps).seed(4));
    return ChiSquare.of(form, temperature, draws);
  }

  /**
   * The 16 x 16 ferromagnet at its critical temperature has the energy -1.45306 a spin (Kaufman,
   * "Crystal statistics II", 1949, evaluated for this size). Its standard deviation is about 0.17 a
   * state; with 2,560 independent draws the mean has the error 0.0034, and 0.0136 is four of it:
   * false alarm 6e-5.
   */
  @Test
  void ferromagnetAtItsCriticalTemperature() {
    double critical = 2 / Math.log(1 + Math.sqrt(2));
    Annealing method =
        Annealing.standard()
            .hot(2 * critical)
            .cold(critical)
            .cooling(Cooling.through(2 * critical, critical, critical, critical, critical))
            .finish(Finish.NONE);
    Draws draws = method.sample(Forms.ferromagnet(16), Effort.draws(2560).sweeps(4000));
    double sum = 0;
    for (Draw draw : draws) {
      sum += draw.multiplicity() * draw.energy();
    }
    assertEquals(-1.45306, sum / draws.total() / 256, 0.0136);
  }
}
