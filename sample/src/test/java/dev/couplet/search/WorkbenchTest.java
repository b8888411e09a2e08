package dev.couplet.search;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.kernel.Forms;
import dev.couplet.kernel.LocalFields;
import dev.couplet.kernel.Pace;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class WorkbenchTest {
  private static Workbench bench(Qubo form) {
    return Workbench.of(form, Run.of(Effort.draws(1)), Pace.free()).orElseThrow().get();
  }

  private static Pace ended() {
    Pace pace = new Pace(() -> true);
    assertTrue(pace.look());
    return pace;
  }

  @Test
  void aStateOfASmallFormIsPolishedAlsoWhenTimeIsUp() {
    SplittableRandom random = new SplittableRandom(1);
    for (Qubo form : new Qubo[] {Forms.integers(60, 1, 9, 1), Forms.reals(60, 0.1, 1)}) {
      State state = LocalFields.random(60, random);
      State polished = bench(form).polished(state, random, ended());
      assertTrue(form.value(polished) < form.value(state));
      assertTrue(Forms.localMinimum(form, polished, 1e-12));
    }
  }

  @Test
  void aStateOfALargeFormIsGivenBackWhenTimeIsUp() {
    SplittableRandom random = new SplittableRandom(1);
    State state = LocalFields.random(1 << 16, random);
    assertSame(state, bench(Forms.ring(1 << 16)).polished(state, random, ended()));
  }

  /** Wherever the pace ends a descent, what comes back is no higher than what went in. */
  @Test
  void aDescentThatIsCutShortGivesHowFarItCame() {
    Qubo form = Forms.ring(1 << 16);
    SplittableRandom random = new SplittableRandom(1);
    State state = LocalFields.random(1 << 16, random);
    Workbench bench = bench(form);
    double last = form.value(state);
    for (int end = 1; end <= 12; end++) {
      int[] looks = {0};
      int stop = end;
      Pace pace = new Pace(() -> ++looks[0] >= stop);
      State reached = bench.descend(state, random, pace);
      assertTrue(form.value(reached) <= form.value(state));
      last = Math.min(last, form.value(reached));
    }
    assertTrue(last < form.value(state));
    State lowest = bench.descend(state, random, Pace.free());
    assertEquals(bench.moves().state(), lowest);
    assertTrue(form.value(lowest) <= last);
  }
}
