package dev.couplet.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.util.List;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

/** Forms with bits tied to products, tied too loosely and free, against plain enumeration. */
class ProductBitsProperties {
  private static double lowest(Polynomial form, int decisionBits, long pattern) {
    double lowest = Double.POSITIVE_INFINITY;
    for (long others = 0; others < 1L << (form.size() - decisionBits); others++) {
      State state = State.ofWords(form.size(), pattern | others << decisionBits);
      lowest = Math.min(lowest, form.value(state));
    }
    return lowest;
  }

  /** Adds terms w Q with few others, and M (xy - 2xw - 2yw + 3w) with M the sum less something. */
  private static void tie(
      Polynomial.Builder form, SplittableRandom random, int w, int x, int y, int less) {
    double sum = 0;
    for (int k = 0; k < 2; k++) {
      int other = random.nextInt(w);
      double value = random.nextInt(-9, 10);
      if (other != x && other != y) {
        form.add(value, other, w);
        sum += Math.abs(value);
      }
    }
    double m = Math.max(0, sum - less);
    form.add(m, x, y).add(-2 * m, x, w).add(-2 * m, y, w).add(3 * m, w);
  }

  @Property(tries = 300)
  void theLowestValuesStayWhatTheyAre(
      @ForAll long seed,
      @ForAll @IntRange(min = 2, max = 6) int decisionBits,
      @ForAll @IntRange(min = 1, max = 6) int others,
      @ForAll @IntRange(max = 8) int less) {
    SplittableRandom own = new SplittableRandom(seed);
    int size = decisionBits + others;
    Polynomial.Builder builder = Polynomial.builder(size);
    for (int t = 0; t < size; t++) {
      int most = own.nextInt(3) == 0 ? size : decisionBits;
      builder.add(own.nextInt(-9, 10), own.nextInt(most), own.nextInt(most));
    }
    for (int w = decisionBits; w < size; w++) {
      int x = own.nextInt(w);
      int y = (x + 1 + own.nextInt(w - 1)) % w;
      tie(builder, own, w, x, y, own.nextBoolean() ? 0 : less);
    }
    Polynomial form = builder.build();
    ProductBits products = ProductBits.of(form, decisionBits, 0);
    Landscape replaced = Landscape.of(products.replacedIn(form), decisionBits);
    new Walk(decisionBits, replaced::effort)
        .over(
            List.of(replaced),
            pattern -> assertEquals(lowest(form, decisionBits, pattern), replaced.value()));
  }

  /** Bits that build on each other go, the last first; too loose by 1 they stay. */
  @Property(tries = 100)
  void tiesOfEnoughWeightAreFound(@ForAll @IntRange(min = 1, max = 50) int magnitude) {
    assertEquals(2, chain(magnitude, magnitude).degree() - 2, "w2 z becomes x y u z");
    assertEquals(2, chain(magnitude, magnitude - 0.5).degree());
  }

  /** Carries {@code -a w2 z}, with w2 for w1 u and w1 for x y, tied by M. */
  private static Polynomial chain(double a, double m) {
    Polynomial.Builder form = Polynomial.builder(6).add(-a, 3, 5);
    form.add(m, 0, 1).add(-2 * m, 0, 4).add(-2 * m, 1, 4).add(3 * m, 4);
    form.add(m, 2, 4).add(-2 * m, 2, 5).add(-2 * m, 4, 5).add(3 * m, 5);
    Polynomial built = form.build();
    return ProductBits.of(built, 4, 0).replacedIn(built);
  }
}
