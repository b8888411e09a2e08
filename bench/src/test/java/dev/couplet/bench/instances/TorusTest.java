package dev.couplet.bench.instances;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Ising;
import java.util.Map;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class TorusTest {
  @Test
  void everySiteHasTwoNeighboursAnAxis() {
    Ising form = Torus.parse("torus:3x4x5").couple(Couplings.integers(1), 7);
    assertEquals(60, form.size());
    assertEquals(180, form.pairs());
    form.forEachPair((i, j, value) -> assertEquals(1, steps(i, j), i + " " + j));
  }

  /** The number of steps between two sites, from their coordinates; the last axis runs fastest. */
  private static int steps(int a, int b) {
    int[] sides = {5, 4, 3};
    int sum = 0;
    for (int side : sides) {
      int apart = Math.abs(a % side - b % side);
      sum += Math.min(apart, side - apart);
      a /= side;
      b /= side;
    }
    return sum;
  }

  @Test
  void textAndLatticeAgree() {
    assertEquals("torus:16x16x16", Torus.parse("torus:16x16x16").toString());
    assertEquals(4096, Torus.parse("torus:16x16x16").size());
  }

  /**
   * With 3 x 4096 couplings on 6 values each count is 2048, its standard deviation 41.3; five of
   * them are 207, passed by chance in fewer than 4 of a million counts, and the seed is fixed.
   */
  @Test
  void integerCouplingsAreUniformWithoutZero() {
    Ising form = Torus.parse("torus:16x16x16").couple(Couplings.parse("3"), 11);
    Map<Double, Integer> counts = new TreeMap<>();
    form.forEachPair((i, j, value) -> counts.merge(value, 1, Integer::sum));
    assertEquals("[-3.0, -2.0, -1.0, 1.0, 2.0, 3.0]", counts.keySet().toString());
    counts.forEach((value, count) -> assertTrue(Math.abs(count - 2048) < 207, counts.toString()));
  }

  /**
   * Of 12288 standard normal numbers: the mean has standard deviation 0.00902, the mean square
   * 0.01276, and 0.3173 of them lie beyond 1 with standard deviation 0.0042; five of each are
   * allowed.
   */
  @Test
  void normalCouplingsHaveTheirMoments() {
    Ising form = Torus.parse("torus:16x16x16").couple(Couplings.parse("gauss"), 12);
    double[] sums = new double[3];
    form.forEachPair(
        (i, j, value) -> {
          sums[0] += value / 12288;
          sums[1] += value * value / 12288;
          sums[2] += Math.abs(value) > 1 ? 1.0 / 12288 : 0;
        });
    assertEquals(12288, form.pairs());
    assertEquals(0, sums[0], 0.0452);
    assertEquals(1, sums[1], 0.0639);
    assertEquals(0.3173, sums[2], 0.021);
  }

  @Test
  void theSeedDecides() {
    Torus torus = Torus.parse("torus:4x4");
    Couplings couplings = Couplings.integers(5);
    assertEquals(torus.couple(couplings, 3), torus.couple(couplings, 3));
    assertTrue(!torus.couple(couplings, 3).equals(torus.couple(couplings, 4)));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "torus",
        "torus:",
        "torus:2x4",
        "torus:4x",
        "cube:4x4",
        "torus:4xa",
        "torus:9999x9999"
      })
  void otherLatticesAreRefused(String text) {
    assertThrows(IllegalArgumentException.class, () -> Torus.parse(text));
  }

  @ParameterizedTest
  @ValueSource(strings = {"0", "-1", "normal", "", "1000001"})
  void otherCouplingsAreRefused(String text) {
    assertThrows(IllegalArgumentException.class, () -> Couplings.parse(text));
  }
}
