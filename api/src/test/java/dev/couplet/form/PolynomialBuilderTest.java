package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;

class PolynomialBuilderTest {
  @Test
  void growsWithTheNumberOfTerms() {
    int size = 200;
    Polynomial.Builder builder = Polynomial.builder(size);
    for (int i = 0; i < size; i++) {
      builder.add(i + 1, i);
      assertEquals(i + 1, builder.build().terms());
    }
    double sum = builder.build().value(State.zeros(size).flipped());
    assertEquals(size * (size + 1) / 2.0, sum);
  }

  @Test
  void aRefusedTermLeavesNoTrace() {
    Polynomial.Builder builder = Polynomial.builder(2).add(3, 0);
    assertThrows(IllegalArgumentException.class, () -> builder.add(1, 0, 5));
    Polynomial polynomial = builder.add(4, 1).build();
    assertEquals(Polynomial.builder(2).add(3, 0).add(4, 1).build(), polynomial);
  }
}
