package dev.couplet.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

/** Walks of flips against values worked out from nothing at every pattern. */
class LandscapeProperties {
  private static double lowest(Polynomial form, int decisionBits, long pattern) {
    double lowest = Double.POSITIVE_INFINITY;
    for (long others = 0; others < 1L << (form.size() - decisionBits); others++) {
      State state = State.ofWords(form.size(), pattern | others << decisionBits);
      lowest = Math.min(lowest, form.value(state));
    }
    return lowest;
  }

  @Property(tries = 200)
  void everyPatternHasItsLowestValueOverTheOtherBits(
      @ForAll long seed,
      @ForAll @IntRange(min = 1, max = 8) int decisionBits,
      @ForAll @IntRange(min = 0, max = 6) int others) {
    SplittableRandom random = new SplittableRandom(seed);
    int size = decisionBits + others;
    Polynomial.Builder builder = Polynomial.builder(size);
    int terms = random.nextInt(4 * size);
    int reach = random.nextBoolean() ? size : Math.max(1, size / 2);
    for (int t = 0; t < terms; t++) {
      int first = size - 1 - random.nextInt(reach);
      builder.add(random.nextInt(-9, 10), first, random.nextInt(size));
    }
    Polynomial form = builder.add(random.nextInt(-9, 10)).build();
    Landscape landscape = Landscape.of(form, decisionBits);
    GroupedLandscape grouped = new GroupedLandscape(form, decisionBits);
    Set<Long> seen = new HashSet<>();
    new Walk(decisionBits, landscape::effort)
        .over(
            List.of(landscape, grouped),
            pattern -> {
              assertTrue(seen.add(pattern), "twice: " + pattern);
              double lowest = lowest(form, decisionBits, pattern);
              assertEquals(lowest, landscape.value());
              assertEquals(lowest, grouped.value());
            });
    assertEquals(1 << decisionBits, seen.size());
  }

  @Property(tries = 200)
  void aPolynomialKeepsUpWithFlips(@ForAll long seed, @ForAll @IntRange(max = 9) int size) {
    SplittableRandom random = new SplittableRandom(seed);
    Polynomial.Builder builder = Polynomial.builder(size);
    for (int t = 0; t < 3 * size; t++) {
      builder.add(random.nextInt(-9, 10), random.ints(random.nextInt(5), 0, size).toArray());
    }
    Polynomial polynomial = builder.build();
    Running running = new Running(polynomial);
    List<Double> values = new ArrayList<>();
    new Walk(size, running::termsOf)
        .over(
            List.of(running),
            pattern -> {
              long[] words = size == 0 ? new long[0] : new long[] {pattern};
              assertEquals(polynomial.value(State.ofWords(size, words)), running.value());
              values.add(running.value());
            });
    assertEquals(1 << size, values.size());
  }
}
