package dev.couplet.anneal;

import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.kernel.Forms;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;

/** How far draws are from the Boltzmann distribution of a small form, all of whose states count. */
final class ChiSquare {
  private ChiSquare() {}

  static double of(Qubo form, double temperature, Draws draws) {
    int states = 1 << form.size();
    double[] weight = new double[states];
    double sum = 0;
    for (int bits = 0; bits < states; bits++) {
      weight[bits] = StrictMath.exp(-form.value(Forms.state(form.size(), bits)) / temperature);
      sum += weight[bits];
    }
    int[] count = new int[states];
    for (Draw draw : draws) {
      count[(int) draw.state().toWords()[0]] = draw.multiplicity();
    }
    double chiSquare = 0;
    for (int bits = 0; bits < states; bits++) {
      double expected = draws.total() * weight[bits] / sum;
      assertTrue(expected > 4, "too few expected for a chi-square: " + expected);
      chiSquare += (count[bits] - expected) * (count[bits] - expected) / expected;
    }
    return chiSquare;
  }
}
