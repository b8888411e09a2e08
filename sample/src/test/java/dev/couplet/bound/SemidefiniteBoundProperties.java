package dev.couplet.bound;

import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.TestForms;
import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Qubo;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class SemidefiniteBoundProperties {
  @Property(tries = 1500)
  void neverAboveTheMinimum(
      @ForAll Regime regime,
      @ForAll @IntRange(min = 0, max = 10) int size,
      @ForAll @IntRange(min = 1, max = 45) int rounds,
      @ForAll long seed) {
    Qubo form = TestForms.random(regime, size, seed);
    double bound = SemidefiniteBound.standard().rounds(rounds).below(form);
    double minimum = TestForms.minimum(form);
    assertTrue(bound <= minimum, () -> bound + " above " + minimum);
    double more = SemidefiniteBound.standard().rounds(rounds + 1).below(form);
    assertTrue(more <= minimum, () -> more + " above " + minimum);
    assertTrue(bound >= -5 * form.magnitude());
  }
}
