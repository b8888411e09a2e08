package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;

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
  void aRefusedTermLeavesTheBuilderAsItWas() {
    Polynomial.Builder builder = Polynomial.builder(3).add(2, 0, 1);
    assertThrows(IllegalArgumentException.class, () -> builder.add(1, 2, 3));
    Polynomial polynomial = builder.add(5).build();
    assertEquals(Polynomial.builder(3).add(5).add(2, 0, 1).build(), polynomial);
  }
}
