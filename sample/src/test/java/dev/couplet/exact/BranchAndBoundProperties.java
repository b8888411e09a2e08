package dev.couplet.exact;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class BranchAndBoundProperties {
  private static final BranchAndBound SEARCH = BranchAndBound.standard();
  private static final Effort EFFORT = Effort.draws(1);

  @Property(tries = 200)
  void agreesWithTheSlowTwin(
      @ForAll Regime regime, @ForAll @IntRange(min = 0, max = 12) int size, @ForAll long seed) {
    Qubo form = TestForms.random(regime, size, seed);
    check(form, TestForms.minimum(form));
  }

  /** Sizes at which it branches: more bits than are enumerated, too many pairs to be eliminated. */
  @Property(tries = 12)
  void branchesToTheMinimum(
      @ForAll Regime regime, @ForAll @IntRange(min = 21, max = 22) int size, @ForAll long seed) {
    Qubo form = spread(regime, size, seed);
    check(form, Enumeration.standard().levels(form, 1).minimum());
  }

  /** Two forms without a common bit: parts are solved by themselves. */
  private static Qubo spread(Regime regime, int size, long seed) {
    Qubo dense = TestForms.random(regime, size, seed);
    Qubo.Builder both = Qubo.builder(size + 3).allowRounding().addConstant(dense.constant());
    for (int i = 0; i < size; i++) {
      both.addLinear(i, dense.linear(i));
    }
    dense.forEachPair(both::addPair);
    Qubo triangle = TestForms.frustratedTriangle();
    both.addConstant(triangle.constant());
    for (int i = 0; i < 3; i++) {
      both.addLinear(size + i, triangle.linear(i));
    }
    triangle.forEachPair((i, j, value) -> both.addPair(size + i, size + j, value));
    return both.build();
  }

  private static void check(Qubo form, double minimum) {
    Draws draws = SEARCH.sample(form, EFFORT);
    double bound = draws.bound().orElseThrow();
    if (form.exact()) {
      assertEquals(minimum, draws.best().energy());
      assertTrue(draws.proved());
    } else {
      double slack = 1e-12 * form.magnitude();
      assertTrue(bound <= minimum, () -> bound + " above " + minimum);
      assertEquals(minimum, bound, slack);
      assertEquals(minimum, draws.best().energy(), slack);
    }
  }

  /** Against the other exact method, on graphs too large for enumeration. */
  @Property(tries = 6)
  void agreesWithElimination(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int side = 9;
    Ising.Builder torus = Ising.builder(side * side);
    for (int i = 0; i < side * side; i++) {
      int right = i - i % side + (i + 1) % side;
      torus.addPair(i, right, random.nextInt(-50, 51));
      torus.addPair(i, (i + side) % (side * side), random.nextInt(-50, 51));
      torus.addLinear(i, random.nextInt(-5, 6));
    }
    Qubo form = torus.build().toQubo();
    double minimum = Elimination.standard().sample(form, EFFORT).best().energy();
    Draws draws = SEARCH.sample(form, EFFORT);
    assertEquals(minimum, draws.best().energy());
    assertTrue(draws.proved());
  }

  /** However early the search is cut short, its bound is true. */
  @Property(tries = 40)
  void aSearchCutShortStillBounds(
      @ForAll Regime regime, @ForAll @IntRange(min = 1, max = 30) int nodes, @ForAll long seed) {
    Qubo form = spread(regime, 21, seed);
    Draws draws = SEARCH.nodes(nodes).sample(form, EFFORT);
    double minimum = Enumeration.standard().levels(form, 1).minimum();
    assertTrue(draws.bound().orElseThrow() <= minimum);
    assertTrue(draws.best().energy() >= minimum);
  }
}
