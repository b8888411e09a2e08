package dev.couplet.search;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.kernel.Forms;
import dev.couplet.kernel.SamplerContract;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import java.util.List;
import org.junit.jupiter.api.Test;

class GreedyDescentTest extends SamplerContract {
  @Override
  protected Sampler sampler() {
    return GreedyDescent.standard();
  }

  @Override
  protected Effort effort() {
    return Effort.draws(20);
  }

  @Test
  void aLocalMinimumStaysAsItIs() {
    Qubo form = Forms.integers(40, 0.5, 20, 3);
    for (Draw draw : GreedyDescent.standard().sample(form, Effort.draws(5))) {
      State minimum = draw.state();
      assertTrue(Forms.localMinimum(form, minimum, 0));
      Run again = Run.of(Effort.draws(1)).starts(List.of(minimum));
      assertEquals(minimum, GreedyDescent.standard().sample(form, again).best().state());
    }
  }
}
