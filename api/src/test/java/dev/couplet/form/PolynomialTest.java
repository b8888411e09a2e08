package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

class PolynomialTest {
  @Test
  void aMillionTermsAreKept() {
    Polynomial.Builder builder = Polynomial.builder(1_000_003);
    for (int t = 0; t < 1_000_000; t++) {
      builder.add(t + 1, t, t + 1, t + 2 + t % 2);
    }
    Polynomial polynomial = builder.build();
    assertEquals(1_000_000, polynomial.terms());
    assertEquals(3, polynomial.degree());
    double all = 1_000_000.0 * 1_000_001 / 2;
    assertEquals(all, polynomial.value(State.zeros(1_000_003).flipped()));
  }

  @Test
  void badTermsAreRefusedByName() {
    Polynomial.Builder builder = Polynomial.builder(3);
    assertEquals("variable 3 is not one of the 3 from 0 to 2", refusal(() -> builder.add(1, 0, 3)));
    assertEquals(
        "the coefficient of the product of [0, 2] is NaN, it must be a finite number",
        refusal(() -> builder.add(Double.NaN, 0, 2)));
    assertEquals("size is -1, it must be 0 or more", refusal(() -> Polynomial.builder(-1)));
    assertEquals(
        "the sum of the coefficients of [0, 1] is Infinity, it must be a finite number",
        refusal(Polynomial.builder(2).add(1e308, 0, 1).add(1e308, 1, 0)::build));
    assertEquals(
        "cannot add a polynomial in 3 variables to one in 2 variables",
        refusal(() -> Polynomial.builder(2).add(builder.build(), 1)));
    Polynomial cubic = builder.add(4, 2, 0, 1).build();
    assertEquals(
        "the product of [0, 1, 2] has 3 variables, a Qubo holds products of at most 2; reduce the"
            + " degree first",
        refusal(cubic::toQubo));
    assertEquals(
        "cannot combine polynomials in 3 and 2 variables",
        refusal(() -> cubic.times(Polynomial.builder(2).build())));
    assertEquals(
        "the state has 2 variables, the form has 3", refusal(() -> cubic.value(State.zeros(2))));
    assertEquals("variable 3 is not one of the 3 from 0 to 2", refusal(() -> cubic.coefficient(3)));
    assertEquals(
        "cannot bring a polynomial in 3 variables to 2, which is fewer",
        refusal(() -> cubic.inVariables(2)));
  }

  private static String refusal(Executable call) {
    return assertThrows(IllegalArgumentException.class, call).getMessage();
  }

  @Test
  void theEmptyPolynomialIsZero() {
    Polynomial none = Polynomial.builder(0).build();
    assertEquals(0, none.terms());
    assertEquals(0, none.degree());
    assertEquals(0, none.constant());
    assertEquals(0, none.value(State.zeros(0)));
    assertEquals(none, Polynomial.builder(0).add(-0.0).add(1).add(-1).build());
    assertEquals("Polynomial(0 variables, 0 terms, degree 0)", none.toString());
  }

  @Test
  void nobodyReachesTheInside() {
    int[] variables = {1, 0};
    Polynomial polynomial = Polynomial.builder(2).add(3, variables).build();
    assertArrayEquals(new int[] {1, 0}, variables);
    variables[0] = 0;
    polynomial.forEachTerm((coefficient, product) -> product[0] = 1);
    assertEquals(3, polynomial.coefficient(0, 1));
  }

  @Test
  void aRefusedTermLeavesTheBuilderAsItWas() {
    Polynomial.Builder builder = Polynomial.builder(3).add(2, 0, 1);
    assertThrows(IllegalArgumentException.class, () -> builder.add(1, 2, 3));
    Polynomial polynomial = builder.add(5).build();
    assertEquals(Polynomial.builder(3).add(5).add(2, 0, 1).build(), polynomial);
  }
}
