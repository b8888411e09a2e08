package dev.couplet.anneal;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.kernel.Forms;
import dev.couplet.kernel.SamplerContract;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import java.util.List;
import org.junit.jupiter.api.Test;

class TemperingTest extends SamplerContract {
  private static final int DRAWS = 12_000;

  @Override
  protected Sampler sampler() {
    return Tempering.standard();
  }

  private static Tempering between(double cold, double hot) {
    return Tempering.standard().cold(cold).hot(hot).rungs(4).finish(Finish.NONE);
  }

  /** A ring of six spins with an odd number of antiferromagnetic pairs, fields and two chords. */
  private static Qubo frustratedRing() {
    Ising.Builder ring = Ising.builder(6).addLinear(0, 0.3).addLinear(3, -0.2);
    for (int i = 0; i < 6; i++) {
      ring.addPair(i, (i + 1) % 6, i == 2 ? 1 : -1);
    }
    return ring.addPair(0, 3, 0.7).addPair(1, 4, -0.4).build().toQubo();
  }

  /**
   * The coldest rung holds a sample at its temperature, whatever the others do. Chi-square over 64
   * states, 63 degrees of freedom: mean 63, standard deviation 11.2; above 120 with probability
   * 2e-5. Draws at a temperature a fifth higher have more than 160.
   */
  @Test
  void theColdestRungFollowsTheBoltzmannDistribution() {
    Qubo form = frustratedRing();
    Effort effort = Effort.draws(DRAWS).sweeps(40).seed(4);
    for (Tempering method :
        new Tempering[] {between(2, 6).withoutClusters(), between(2, 6).clusters()}) {
      assertTrue(ChiSquare.of(form, 2, method.sample(form, effort)) < 120, method.toString());
      Draws hotter = method.cold(2.4).sample(form, effort);
      assertTrue(ChiSquare.of(form, 2, hotter) > 160, method.toString());
    }
  }

  /**
   * What the exchanges are for: two deep valleys of six spins each, and draws too cold to climb
   * from one to the other. All begin in one valley; with exchanges half of them, with the standard
   * deviation 1.6 %, end in the other, without hardly any.
   */
  @Test
  void exchangesLeadFromOneValleyToAnother() {
    Ising.Builder ferromagnet = Ising.builder(6);
    for (int i = 0; i < 6; i++) {
      for (int j = i + 1; j < 6; j++) {
        ferromagnet.addPair(i, j, -1);
      }
    }
    Qubo form = ferromagnet.build().toQubo();
    Run fromZeros = Run.of(Effort.draws(1000).sweeps(200)).starts(List.of(State.zeros(6)));
    Draws together = between(0.5, 10).rungs(6).sample(form, fromZeros);
    Draws alone = between(0.5, 0.5).rungs(1).sample(form, fromZeros);
    assertEquals(500, ones(together), 80);
    assertTrue(ones(alone) < 20);
  }

  private static int ones(Draws draws) {
    return draws.rows().stream()
        .filter(draw -> draw.state().ones() > 3)
        .mapToInt(Draw::multiplicity)
        .sum();
  }

  /** Written down once, to notice if a platform or a change gives other draws. */
  @Test
  void goldenDraws() {
    Qubo form = Forms.integers(60, 0.5, 99, 1);
    Tempering method = Tempering.standard().finish(Finish.NONE).withoutClusters();
    assertEquals(
        "111111001111111111110111111101110010001000001110101101110100",
        method.sample(form, Effort.draws(1).sweeps(3)).best().state().toString());
    assertEquals(
        "111111001111111111110111111101110010001000001110101101110101",
        method.clusters().sample(form, Effort.draws(1).sweeps(3)).best().state().toString());
  }

  @Test
  void everyDrawEndsInALocalMinimum() {
    Qubo whole = Forms.integers(60, 0.2, 30, 2);
    for (Draw draw : Tempering.standard().sample(whole, Effort.draws(8).sweeps(3))) {
      assertTrue(Forms.localMinimum(whole, draw.state(), 0));
    }
    Qubo real = Forms.reals(60, 0.2, 2);
    for (Draw draw : Tempering.standard().clusters().sample(real, Effort.draws(8).sweeps(3))) {
      assertTrue(Forms.localMinimum(real, draw.state(), 1e-12));
    }
  }

  /** A draw that has reached the target makes no further sweeps: this one would take for ever. */
  @Test
  void aDrawEndsAtTheTarget() {
    Qubo form = Forms.spinGlass(4, 1);
    double best = Tempering.standard().sample(form, Effort.draws(4).sweeps(200)).best().energy();
    Effort endless = Effort.draws(1).sweeps(Integer.MAX_VALUE).target(best);
    for (Finish finish : Finish.values()) {
      assertEquals(best, Tempering.standard().finish(finish).sample(form, endless).best().energy());
    }
  }

  @Test
  void clustersAreTheStandardOnSparseFormsAlone() {
    Effort effort = Effort.draws(3).sweeps(5);
    Tempering method = Tempering.standard().finish(Finish.NONE);
    Qubo square = Forms.ferromagnet(6);
    assertEquals(method.clusters().sample(square, effort), method.sample(square, effort));
    Qubo cubic = Forms.spinGlass(4, 1);
    assertEquals(method.withoutClusters().sample(cubic, effort), method.sample(cubic, effort));
    assertNotEquals(method.clusters().sample(cubic, effort), method.sample(cubic, effort));
  }

  @Test
  void badSettingsAreRefused() {
    assertThrows(IllegalArgumentException.class, () -> Tempering.standard().rungs(0));
    assertThrows(IllegalArgumentException.class, () -> Tempering.standard().hot(0));
    assertThrows(IllegalArgumentException.class, () -> Tempering.standard().cold(Double.NaN));
  }

  @Test
  void settingsAreTold() {
    assertEquals(
        "Tempering(rungs from the form, hot from the form, cold from the form, DESCENT)",
        Tempering.standard().toString());
    assertEquals(
        "Tempering(rungs 4, hot 6.0, cold 2.0, clusters, NONE)",
        between(2, 6).clusters().toString());
    assertEquals(
        "Tempering(rungs 4, hot 6.0, cold 2.0, no clusters, NONE)",
        between(2, 6).withoutClusters().toString());
  }
}
