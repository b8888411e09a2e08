package dev.couplet.exact;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Qubo;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class EliminationProperties {
  private static final Run RUN = Run.of(Effort.draws(1));

  @Property(tries = 1500)
  void agreesWithTheSlowTwin(
      @ForAll Regime regime,
      @ForAll @IntRange(min = 0, max = 13) int size,
      @ForAll @IntRange(min = 0, max = 13) int width,
      @ForAll long seed) {
    Qubo form = TestForms.random(regime, size, seed);
    Elimination elimination = Elimination.standard().width(width);
    double minimum = TestForms.minimum(form);
    Draws draws = elimination.sample(form, RUN);
    double bound = draws.bound().orElseThrow();
    if (form.exact()) {
      assertEquals(minimum, draws.best().energy());
      assertTrue(draws.proved());
      Ground ground = elimination.ground(form, RUN).orElseThrow();
      assertEquals(minimum, ground.energy());
      assertEquals(minimum, form.value(ground.state()));
      assertEquals(Enumeration.standard().levels(form, 1).minima(), ground.states());
    } else {
      assertTrue(bound <= minimum);
      assertEquals(minimum, bound, 1e-13 * form.magnitude());
      assertEquals(minimum, draws.best().energy(), 1e-13 * form.magnitude());
    }
  }

  /** Tables of more than one block, shared out between threads. */
  @Property(tries = 10)
  void wideTablesAgreeWithEnumeration(@ForAll long seed) {
    Qubo form = TestForms.random(Regime.TIED, 19, seed);
    Effort effort = Effort.draws(1);
    Draws draws = Elimination.standard().sample(form, effort);
    assertEquals(Enumeration.standard().levels(form, 1).minimum(), draws.best().energy());
    assertEquals(draws, Elimination.standard().sample(form, effort.threads(2)));
  }
}
