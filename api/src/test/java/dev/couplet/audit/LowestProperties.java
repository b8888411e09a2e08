package dev.couplet.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

/** The ways to minimise auxiliary bits against plain enumeration, with whole numbers: exactly. */
class LowestProperties {
  private static double enumerated(double[] base, double[][] pair, double[] change) {
    double lowest = Double.POSITIVE_INFINITY;
    for (int pattern = 0; pattern < 1 << base.length; pattern++) {
      double sum = 0;
      for (int k = 0; k < base.length; k++) {
        for (int l = 0; l < k; l++) {
          sum += (pattern >> k & pattern >> l & 1) * pair[k][l];
        }
        sum += (pattern >> k & 1) * (base[k] + change[k]);
      }
      lowest = Math.min(lowest, sum);
    }
    return lowest;
  }

  private static double[] numbers(SplittableRandom random, int n, int most) {
    return random.ints(n, -most, most + 1).asDoubleStream().toArray();
  }

  @Property(tries = 300)
  void searchFindsTheLowest(@ForAll long seed, @ForAll @IntRange(min = 0, max = 10) int n) {
    SplittableRandom random = new SplittableRandom(seed);
    double[] base = numbers(random, n, 20);
    double[][] pair = new double[n][n];
    for (int k = 0; k < n; k++) {
      for (int l = 0; l < k; l++) {
        pair[k][l] = random.nextInt(3) == 0 ? 0 : random.nextInt(-9, 10);
        pair[l][k] = pair[k][l];
      }
    }
    Lowest search = new Lowest(base, pair);
    for (int again = 0; again < 3; again++) {
      double[] change = numbers(random, n, 20);
      assertEquals(enumerated(base, pair, change), search.of(change));
    }
  }

  @Property(tries = 300)
  void squaresAreAnsweredFromTheirHull(
      @ForAll long seed, @ForAll @IntRange(min = 3, max = 10) int n) {
    SplittableRandom random = new SplittableRandom(seed);
    double weight = random.nextInt(1, 5);
    double[] c = new double[n];
    for (int k = 0; k < n; k++) {
      c[k] = (random.nextBoolean() ? 1 : -1) * (k == 0 ? 1 : 1 << random.nextInt(6));
    }
    double[] base = numbers(random, n, 100);
    double[][] pair = new double[n][n];
    for (int k = 0; k < n; k++) {
      for (int l = 0; l < n; l++) {
        pair[k][l] = k == l ? 0 : 2 * weight * c[k] * c[l];
      }
    }
    Minimum search = new Lowest(base, pair);
    boolean[] searched = {false};
    Minimum square =
        LowestSquare.of(
            base,
            pair,
            change -> {
              searched[0] = true;
              return search.of(change);
            });
    assertTrue(square instanceof LowestSquare);
    for (int again = 0; again < 20; again++) {
      double slope = random.nextInt(-300, 300);
      double[] change = new double[n];
      for (int k = 0; k < n; k++) {
        change[k] = slope * c[k];
      }
      assertEquals(enumerated(base, pair, change), square.of(change));
    }
    assertTrue(!searched[0], "changes along the square need no search");
    double[] across = numbers(random, n, 50);
    assertEquals(enumerated(base, pair, across), square.of(across), "other changes do");
  }

  @Example
  void whatIsNoSquareIsSearched() {
    double[] base = new double[4];
    double[][] pair = {{0, 1, 2, 4}, {1, 0, 2, 4}, {2, 2, 0, 9}, {4, 4, 9, 0}};
    Minimum search = new Lowest(base, pair);
    assertSame(search, LowestSquare.of(base, pair, search));
    double[][] withGap = {{0, 1, 2, 0}, {1, 0, 2, 4}, {2, 2, 0, 9}, {0, 4, 9, 0}};
    Minimum otherSearch = new Lowest(base, withGap);
    assertSame(otherSearch, LowestSquare.of(base, withGap, otherSearch));
  }
}
