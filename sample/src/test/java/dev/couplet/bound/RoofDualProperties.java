package dev.couplet.bound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.Enumeration;
import dev.couplet.exact.TestForms;
import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import java.util.List;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class RoofDualProperties {
  private static final RoofDual ROOF = RoofDual.standard();
  private static final Run RUN = Run.of(Effort.draws(1));

  @Property(tries = 3000)
  void neverAboveTheMinimumAndNeverBelowASplit(
      @ForAll Regime regime, @ForAll @IntRange(min = 0, max = 9) int size, @ForAll long seed) {
    Qubo form = TestForms.random(regime, size, seed);
    double roof = ROOF.below(form);
    double minimum = TestForms.minimum(form);
    assertTrue(roof <= minimum, () -> roof + " above " + minimum);
    double split = SplitBound.standard().rounds(200).below(form);
    double slack = form.exact() ? 0 : 1e-13 * form.magnitude();
    assertTrue(roof >= split - slack, () -> roof + " below " + split);
  }

  /**
   * The roof dual is the optimum of the linear relaxation, whose corners have values 0, 1/2 and 1
   * (Hammer, Hansen and Simeone 1984): the minimum over {0, 1/2, 1}^n of the form with each product
   * replaced by its envelope, max(0, x + y - 1) for a positive and min(x, y) for a negative
   * coefficient.
   */
  @Property(tries = 400)
  void equalsTheLinearRelaxation(@ForAll @IntRange(min = 0, max = 7) int size, @ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Qubo.Builder builder = Qubo.builder(size + 1).addConstant(random.nextInt(-5, 6));
    // A bit of its own with a pair of coefficients 1/2 makes the grid of energies fine enough.
    builder.addLinear(size, 0.5);
    for (int i = 0; i < size; i++) {
      builder.addLinear(i, random.nextInt(-10, 11));
      for (int j = 0; j < i; j++) {
        if (random.nextInt(3) > 0) {
          builder.addPair(i, j, random.nextInt(-10, 11));
        }
      }
    }
    Qubo form = builder.build();
    assertEquals(relaxed(form), ROOF.below(form));
  }

  private static double relaxed(Qubo form) {
    int size = form.size();
    double lowest = Double.POSITIVE_INFINITY;
    double[] x = new double[size];
    for (int code = 0; code < Math.pow(3, size); code++) {
      int rest = code;
      double[] sum = {form.constant()};
      for (int i = 0; i < size; i++, rest /= 3) {
        x[i] = rest % 3 / 2.0;
        sum[0] += form.linear(i) * x[i];
      }
      form.forEachPair(
          (i, j, value) ->
              sum[0] += value * (value > 0 ? Math.max(0, x[i] + x[j] - 1) : Math.min(x[i], x[j])));
      lowest = Math.min(lowest, sum[0]);
    }
    return lowest;
  }

  /** Against all minima: strong values are those of every minimum, weak ones of one at least. */
  @Property(tries = 2000)
  void fixesBitsOfMinima(
      @ForAll Regime regime, @ForAll @IntRange(min = 0, max = 11) int size, @ForAll long seed) {
    Qubo form = TestForms.random(regime, size, seed);
    if (!form.exact()) {
      return;
    }
    Roof roof = ROOF.roof(form, RUN);
    List<State> minima = Enumeration.standard().levels(form, 1).lowest();
    boolean some = false;
    for (State minimum : minima) {
      assertTrue(agree(minimum, roof.values(), roof.strong()));
      some |= agree(minimum, roof.values(), roof.weak());
    }
    assertTrue(some);
    if (roof.weak().ones() == size) {
      assertEquals(form.value(roof.values()), roof.bound());
    }
  }

  private static boolean agree(State state, State values, State where) {
    for (int i = 0; i < state.size(); i++) {
      if (where.get(i) && state.get(i) != values.get(i)) {
        return false;
      }
    }
    return true;
  }

  /** Without positive pairs the roof dual is the minimum (Hammer 1965; Picard and Ratliff 1975). */
  @Property(tries = 500)
  void tightOnSubmodularForms(@ForAll @IntRange(min = 0, max = 11) int size, @ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Qubo.Builder builder = Qubo.builder(size);
    for (int i = 0; i < size; i++) {
      builder.addLinear(i, random.nextInt(-9, 30));
      for (int j = 0; j < i; j++) {
        builder.addPair(i, j, -random.nextInt(10));
      }
    }
    Qubo form = builder.build();
    Roof roof = ROOF.roof(form, RUN);
    assertEquals(TestForms.minimum(form), roof.bound());
    assertEquals(size, roof.weak().ones());
    assertEquals(roof.bound(), form.value(roof.values()));
  }
}
