package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class BoltzmannTest {
  @Test
  void agreesWithTheLibrarysExponential() {
    assertEquals(1, Boltzmann.factor(0));
    for (double x = 0; x < Boltzmann.NEVER; x += 0.000_37) {
      double exact = StrictMath.exp(-x);
      assertEquals(exact, Boltzmann.factor(x), exact * 0x1p-39);
    }
  }

  @Test
  void isNegligibleWhereItIsNotAsked() {
    assertTrue(StrictMath.exp(-Boltzmann.NEVER) < 0x1p-64);
  }
}
