package dev.couplet.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.model.Statement.Range;
import java.util.List;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

/** Ranges against the values of all plans. */
class RangesProperties {
  private static final int LITERALS = 6;

  private static Polynomial random(SplittableRandom random) {
    Polynomial.Builder terms = Polynomial.builder(LITERALS);
    for (int t = random.nextInt(8); t > 0; t--) {
      double value = random.nextInt(3) == 0 ? random.nextDouble(-1, 1) : random.nextInt(-9, 10);
      int[] product = random.ints(random.nextInt(4), 0, LITERALS).toArray();
      terms.add(value, product);
    }
    return terms.build();
  }

  /** The way for bits alone and the way for all decisions are one. */
  @Property
  void bothWaysAgreeOnBits(@ForAll long seed) {
    Polynomial terms = random(new SplittableRandom(seed));
    Bit bit = Model.named("m").bit("b");
    assertEquals(Ranges.of(terms, literal -> false, literal -> bit), Ranges.ofFree(terms));
  }

  /** Three bits and a choice of three, or six bits. */
  @Property
  void everyPlanLiesWithin(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Model model = Model.named("m");
    boolean choice = random.nextBoolean();
    for (int b = 0; b < (choice ? 3 : LITERALS); b++) {
      Bit unused = model.bit("b" + b);
    }
    if (choice) {
      Choice<Integer> unused = model.choice("c", List.of(1, 2, 3));
    }
    Polynomial terms = random(random);
    Range range = model.snapshot().range(terms);
    for (long pattern = 0; pattern < 1 << LITERALS; pattern++) {
      if (!choice || Long.bitCount(pattern >>> 3) == 1) {
        double value = terms.value(State.ofWords(LITERALS, pattern));
        assertTrue(range.lowest() <= value && value <= range.highest(), range + " " + value);
      }
    }
  }
}
