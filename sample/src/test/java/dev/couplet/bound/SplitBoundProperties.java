package dev.couplet.bound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.TestForms;
import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Qubo;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import java.util.SplittableRandom;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class SplitBoundProperties {
  private static final SplitBound BOUND = SplitBound.standard();

  @Property(tries = 3000)
  void neverAboveTheMinimum(
      @ForAll Regime regime,
      @ForAll @IntRange(min = 0, max = 9) int size,
      @ForAll @IntRange(min = 0, max = 9) int rounds,
      @ForAll long seed) {
    Qubo form = TestForms.random(regime, size, seed);
    double minimum = TestForms.minimum(form);
    double few = BOUND.rounds(rounds).below(form);
    double more = BOUND.rounds(rounds + 1).below(form);
    assertTrue(few <= more, () -> few + " above " + more);
    assertTrue(more <= minimum, () -> more + " above " + minimum);
  }

  /**
   * On a form without cycles the linear relaxation is tight (from memory; Wainwright et al. 2005).
   */
  @Property(tries = 500)
  void tightOnRandomTrees(@ForAll @IntRange(min = 0, max = 12) int size, @ForAll long seed) {
    tightWithoutCycles(size, seed);
  }

  /** A tree on which the bound stands still for a round before it rises to the minimum. */
  @Example
  void tightAfterARoundWithoutGain() {
    tightWithoutCycles(5, 3041711984275448930L);
  }

  private static void tightWithoutCycles(int size, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Qubo.Builder tree = Qubo.builder(size);
    for (int i = 0; i < size; i++) {
      tree.addLinear(i, random.nextInt(-20, 21));
      if (i > 0) {
        tree.addPair(i, random.nextInt(i), random.nextInt(-20, 21));
      }
    }
    Qubo form = tree.build();
    assertEquals(TestForms.minimum(form), BOUND.rounds(1000).below(form));
    assertEquals(TestForms.minimum(form), BOUND.below(form, Run.of(Effort.draws(1).sweeps(1000))));
  }
}
