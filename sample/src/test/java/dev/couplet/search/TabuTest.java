package dev.couplet.search;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.kernel.Forms;
import dev.couplet.kernel.SamplerContract;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Sampler;
import org.junit.jupiter.api.Test;

class TabuTest extends SamplerContract {
  @Override
  protected Sampler sampler() {
    return Tabu.standard();
  }

  /** Written down once, to notice if a platform or a change gives other draws. */
  @Test
  void goldenDraw() {
    Qubo dense = Forms.integers(60, 1, 99, 1);
    assertEquals(
        "100100111000011111111101011111111000111111100110111000100111",
        Tabu.standard().sample(dense, Effort.draws(1).sweeps(30)).best().state().toString());
    Qubo sparse = Forms.reals(60, 0.05, 1);
    assertEquals(
        "001010111100111101000001010100100111010111111110110110111001",
        Tabu.standard().sample(sparse, Effort.draws(1).sweeps(30)).best().state().toString());
  }

  @Test
  void everyDrawIsALocalMinimumOfTheForm() {
    for (double density : new double[] {0.05, 0.9}) {
      Qubo whole = Forms.integers(80, density, 30, 2);
      for (Draw draw : Tabu.standard().sample(whole, Effort.draws(10).sweeps(7))) {
        assertTrue(Forms.localMinimum(whole, draw.state(), 0));
      }
      Qubo real = Forms.reals(80, density, 2);
      for (Draw draw : Tabu.standard().sample(real, Effort.draws(10).sweeps(7))) {
        assertTrue(Forms.localMinimum(real, draw.state(), 1e-12));
      }
    }
  }

  @Test
  void aPatienceBelowOneIsRefused() {
    assertThrows(IllegalArgumentException.class, () -> Tabu.standard().patience(0));
  }
}
