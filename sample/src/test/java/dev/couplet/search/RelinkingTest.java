package dev.couplet.search;

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
import dev.couplet.sampling.Sampler;
import java.time.Duration;
import org.junit.jupiter.api.Test;

class RelinkingTest extends SamplerContract {
  @Override
  protected Sampler sampler() {
    return Relinking.standard();
  }

  @Override
  protected Effort effort() {
    return Effort.draws(20).sweeps(300);
  }

  /** Written down once, to notice if a platform or a change gives other draws. */
  @Test
  void goldenDraw() {
    Qubo form = Forms.integers(120, 1, 99, 1);
    Relinking method = Relinking.standard().elites(3).patience(5);
    State best = method.sample(form, Effort.draws(1).sweeps(100)).best().state();
    assertEquals(State.ofWords(120, 0xb78ccaefc1bfa649L, 0x9b8973e337fdffL), best);
  }

  @Test
  void everyDrawIsALocalMinimumOfTheForm() {
    Qubo real = Forms.reals(80, 0.9, 2);
    Relinking method = Relinking.standard().elites(2).patience(1);
    for (Draw draw : method.sample(real, Effort.draws(10).sweeps(7))) {
      assertTrue(Forms.localMinimum(real, draw.state(), 1e-12));
    }
  }

  @Test
  void withoutSweepsADrawEndsWithItsElites() {
    Qubo form = Forms.integers(50, 1, 20, 6);
    Draws draws = Relinking.standard().sample(form, Effort.draws(2));
    assertEquals(End.DONE, draws.end());
    assertEquals(draws.best().multiplicity(), 2);
  }

  @Test
  void aTimedRunEndsAsSoonAsTheTargetIsMet() {
    Qubo form = Forms.integers(18, 1, 20, 6);
    double minimum = Forms.minimum(form);
    Effort effort = Effort.within(Duration.ofMinutes(10)).target(minimum).threads(2);
    Draws draws = Relinking.standard().sample(form, effort);
    assertEquals(End.TARGET, draws.end());
    assertEquals(minimum, draws.best().energy());
  }

  @Test
  void settingsAreChecked() {
    assertThrows(IllegalArgumentException.class, () -> Relinking.standard().patience(0));
    assertThrows(IllegalArgumentException.class, () -> Relinking.standard().elites(1));
  }
}
