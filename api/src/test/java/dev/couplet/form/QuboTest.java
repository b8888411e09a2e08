package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

class QuboTest {
  private static String refusal(Executable call) {
    return assertThrows(IllegalArgumentException.class, call).getMessage();
  }

  /** Glover, Kochenberger and Du 2019, section 2: one optimum, (1, 0, 0, 1) with -11. */
  @Test
  void aPublishedExampleHasItsPublishedOptimum() {
    double[][] matrix = {{-5, 2, 4, 0}, {2, -3, 1, 0}, {4, 1, -8, 5}, {0, 0, 5, -6}};
    Qubo.Builder builder = Qubo.builder(4);
    for (int i = 0; i < 4; i++) {
      builder.addLinear(i, matrix[i][i]);
      for (int j = 0; j < 4; j++) {
        if (i != j) {
          builder.addPair(i, j, matrix[i][j]);
        }
      }
    }
    Qubo form = builder.build();
    assertEquals(10, form.pair(2, 3));
    List<State> optima = new ArrayList<>();
    for (State state : Entries.states(4)) {
      assertTrue(form.value(state) >= -11);
      if (form.value(state) == -11) {
        optima.add(state);
      }
    }
    assertEquals(List.of(State.parse("1001")), optima);
  }

  /** Three spins that cannot all be opposed: minimum -1, six ground states (common practice). */
  @Test
  void theFrustratedTriangleHasSixGroundStates() {
    Ising form = Ising.builder(3).addPair(0, 1, 1).addPair(1, 2, 1).addPair(2, 0, 1).build();
    Qubo bits = form.toQubo();
    int ground = 0;
    for (State state : Entries.states(3)) {
      assertTrue(form.value(state) >= -1);
      assertEquals(form.value(state), bits.value(state));
      ground += form.value(state) == -1 ? 1 : 0;
    }
    assertEquals(6, ground);
  }

  /** The convention s = 1 - 2x: a one is a spin of -1, and a negative coupling aligns. */
  @Test
  void signsAreThoseOfTheConvention() {
    Ising form = Ising.builder(2).addConstant(10).addLinear(0, 3).addPair(0, 1, -1).build();
    assertEquals(10 + 3 - 1, form.value(State.parse("00")));
    assertEquals(10 - 3 + 1, form.value(State.parse("10")));
    assertEquals(10 + 3 + 1, form.value(State.parse("01")));
    assertEquals(10 - 3 - 1, form.value(State.parse("11")));
  }

  @Test
  void badCoefficientsAreRefusedByName() {
    Qubo.Builder form = Qubo.builder(3);
    String mend = ", it must be a finite number";
    assertAll(
        () -> assertEquals("size is -2, it must be 0 or more", refusal(() -> Qubo.builder(-2))),
        () ->
            assertEquals(
                "variable 3 is not one of the 3 from 0 to 2", refusal(() -> form.addLinear(3, 1))),
        () ->
            assertEquals(
                "variable -1 is not one of the 3 from 0 to 2",
                refusal(() -> form.addPair(0, -1, 1))),
        () ->
            assertEquals(
                "variable 0 is named, the form has none",
                refusal(() -> Qubo.builder(0).addLinear(0, 1))),
        () ->
            assertEquals(
                "pair (2, 2) names one variable twice; add it to the linear part",
                refusal(() -> form.addPair(2, 2, 1))),
        () ->
            assertEquals("the constant is NaN" + mend, refusal(() -> form.addConstant(Double.NaN))),
        () ->
            assertEquals(
                "the linear coefficient of variable 1 is Infinity" + mend,
                refusal(() -> form.addLinear(1, Double.POSITIVE_INFINITY))),
        () ->
            assertEquals(
                "the coefficient of pair (2, 0) is NaN" + mend,
                refusal(() -> form.addPair(2, 0, Double.NaN))));
    assertEquals(Qubo.builder(3).build(), form.build());
  }

  @Test
  void placesOutsideTheFormAreRefused() {
    Qubo form = Qubo.builder(2).addPair(0, 1, 1).build();
    assertThrows(IllegalArgumentException.class, () -> form.linear(2));
    assertThrows(IllegalArgumentException.class, () -> form.pair(0, 2));
    assertEquals(
        "pair (1, 1) names one variable twice; its coefficient is linear",
        refusal(() -> form.pair(1, 1)));
    assertEquals(
        "the state has 3 variables, the form has 2", refusal(() -> form.value(State.zeros(3))));
    assertEquals(
        "cannot add a form in 2 variables to one in 1; give the builder at least as many",
        refusal(() -> Qubo.builder(1).add(form, 1)));
    assertEquals(
        "the factor is NaN, it must be a finite number", refusal(() -> form.times(Double.NaN)));
  }

  @Test
  void sumsThatOverflowAreRefusedByName() {
    double huge = 1.7e308;
    String mend = " is Infinity, it must be a finite number";
    assertAll(
        () ->
            assertEquals(
                "the linear coefficient of variable 1" + mend,
                refusal(Qubo.builder(2).addLinear(1, huge).addLinear(1, huge)::build)),
        () ->
            assertEquals(
                "the coefficient of pair (0, 1)" + mend,
                refusal(Qubo.builder(2).addPair(0, 1, huge).addPair(1, 0, huge)::build)),
        () ->
            assertEquals(
                "the constant" + mend,
                refusal(Qubo.builder(2).addConstant(huge).addConstant(huge)::build)),
        () ->
            assertEquals(
                "the coefficient of pair (0, 1)" + mend,
                refusal(
                    () ->
                        Qubo.builder(2).allowRounding().addPair(0, 1, 1e300).build().times(1e10))));
    Qubo.Builder tooMuch = Qubo.builder(2).allowRounding().addLinear(0, huge).addLinear(1, -huge);
    assertEquals(
        "the magnitudes of the coefficients add up to more than a double holds; divide all"
            + " coefficients by a common factor",
        refusal(tooMuch::build));
  }

  @Test
  void integersAreTakenBelowTheLimitOfExactEnergies() {
    double limit = 0x1p51;
    Qubo below = Qubo.builder(2).addLinear(0, limit - 3).addPair(0, 1, 2).build();
    assertTrue(below.exact());
    assertEquals(limit - 1, below.magnitude());
    assertEquals(below, below.toIsing().toQubo());
    Qubo.Builder at = Qubo.builder(2).addLinear(0, limit - 2).addPair(0, 1, -2);
    assertEquals(
        "the integer coefficients add up to 2.251799813685248E15, energies are exact below 2^51;"
            + " divide the coefficients by a common factor, or call allowRounding()",
        refusal(at::build));
    assertEquals(limit, at.allowRounding().build().magnitude());
    Qubo real = Qubo.builder(1).addConstant(0.5).addLinear(0, limit).build();
    assertEquals(limit + 0.5, real.magnitude());
  }

  @Test
  void exactKnowsTheUnitOfTheCoefficients() {
    assertTrue(Qubo.builder(0).build().exact());
    assertTrue(Qubo.builder(1).addLinear(0, 0.1).build().exact());
    assertFalse(Qubo.builder(1).addLinear(0, 0.1).addConstant(1).build().exact());
    assertTrue(Qubo.builder(1).addLinear(0, 0.25).addConstant(0x1p50).build().exact());
    assertFalse(Qubo.builder(1).addLinear(0, 0.25).addConstant(0x1p51).build().exact());
    assertTrue(
        Qubo.builder(1).addLinear(0, Double.MIN_VALUE).addConstant(0x1p-1022).build().exact());
    assertFalse(Qubo.builder(1).addLinear(0, Double.MIN_VALUE).addConstant(1).build().exact());
  }

  @Test
  void zerosLeaveNoTrace() {
    Qubo plain = Qubo.builder(3).build();
    Qubo.Builder zeros = Qubo.builder(3).addConstant(-0.0).addLinear(1, -0.0).addPair(0, 1, -0.0);
    zeros.addPair(1, 2, 5).addPair(2, 1, -5).addLinear(2, 1).addLinear(2, -1);
    assertEquals(plain, zeros.build());
    assertEquals(plain.hashCode(), zeros.build().hashCode());
    assertEquals(0, zeros.build().pairs());
    assertEquals(plain, Qubo.builder(3).addLinear(0, 3).addPair(1, 2, 1).build().times(-0.0));
    assertEquals("Qubo(3 variables, 0 pairs, constant 0.0)", zeros.build().toString());
  }

  @Test
  void aProductThatVanishesLeavesItsPairOut() {
    Qubo form = Qubo.builder(3).addPair(0, 1, 1e-300).addPair(1, 2, 1).build();
    Qubo tiny = form.times(1e-100);
    assertEquals(1, tiny.pairs());
    assertEquals(0, tiny.pair(0, 1));
    assertEquals(1e-100, tiny.pair(1, 2));
    assertEquals(Qubo.builder(3).addPair(1, 2, 1e-100).build(), tiny);
  }

  @Test
  void pairsArePassedUntilAskedToStop() {
    Qubo.Builder star = Qubo.builder(200_000).addPair(0, 1, 1);
    for (int i = 2; i < 200_000; i++) {
      star.addPair(0, i, 1).addPair(i - 1, i, 2);
    }
    Qubo form = star.build();
    List<Double> all = new ArrayList<>();
    form.forEachPair((i, j, value) -> all.add(i + value / j));
    for (int stop : new int[] {1, 3, 100}) {
      List<Double> passed = new ArrayList<>();
      int[] asked = {0};
      int[] before = {0};
      boolean whole =
          form.forEachPairUntil(
              () -> {
                assertTrue(passed.size() - before[0] <= 1 << 16);
                before[0] = passed.size();
                return ++asked[0] == stop;
              },
              (i, j, value) -> passed.add(i + value / j));
      assertEquals(stop > asked[0], whole);
      assertEquals(all.subList(0, whole ? all.size() : before[0]), passed);
      assertTrue(asked[0] == stop || asked[0] >= all.size() >> 16);
    }
  }

  /** Zeros in every place, and a term of rounding: as by a plain walk over all pairs. */
  @Test
  void aValueAddsUpInTheOrderOfRows() {
    SplittableRandom random = new SplittableRandom(4);
    Qubo.Builder builder = Qubo.builder(130).addConstant(0.1);
    for (int i = 0; i < 130; i++) {
      builder.addLinear(i, random.nextDouble(-1, 1));
      builder.addPair(i, (i + 1 + random.nextInt(128)) % 130, random.nextDouble(-1, 1));
    }
    Qubo form = builder.build();
    for (int k = 0; k < 100; k++) {
      State state = State.ofWords(130, random.nextLong(), random.nextLong(), random.nextInt(4));
      double sum = form.constant();
      for (int i = 0; i < 130; i++) {
        if (state.get(i)) {
          sum += form.linear(i);
          for (int j = i + 1; j < 130; j++) {
            sum += state.get(j) ? form.pair(i, j) : 0;
          }
        }
      }
      assertEquals(sum, form.value(state));
    }
  }

  @Test
  void aBuilderGoesOnAfterBuilding() {
    Qubo.Builder builder = Qubo.builder(3).addPair(2, 1, 4).addPair(0, 1, 1);
    Qubo first = builder.build();
    Qubo second = builder.addPair(1, 2, -4).addPair(0, 2, 7).addLinear(0, 1).build();
    assertEquals(4, first.pair(1, 2));
    assertEquals(0, first.linear(0));
    assertEquals(Qubo.builder(3).addPair(0, 1, 1).addPair(0, 2, 7).addLinear(0, 1).build(), second);
  }

  @Test
  void formsThatDifferAreNotEqual() {
    Qubo form = Qubo.builder(3).addPair(0, 1, 1).build();
    assertNotEquals(form, Qubo.builder(4).addPair(0, 1, 1).build());
    assertNotEquals(form, Qubo.builder(3).addPair(0, 2, 1).build());
    assertNotEquals(form, Qubo.builder(3).addPair(1, 2, 1).build());
    assertNotEquals(form, Qubo.builder(3).addPair(0, 1, 2).build());
    assertNotEquals(form, Qubo.builder(3).addPair(0, 1, 1).addLinear(2, 1).build());
    assertNotEquals(form, Qubo.builder(3).addPair(0, 1, 1).addConstant(1).build());
    assertNotEquals((Object) form, Ising.builder(3).addPair(0, 1, 1).build());
  }
}
