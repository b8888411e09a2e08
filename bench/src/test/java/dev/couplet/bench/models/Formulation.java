package dev.couplet.bench.models;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.Enumeration;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowering;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import java.util.function.IntToDoubleFunction;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/** What the checks of published formulations share: lower, enumerate, compare. */
final class Formulation {
  private Formulation() {}

  /** The best plan of the lowered form, all of whose states are looked at. */
  static Plan assertOptimum(double optimum, int bits, Statement statement) {
    Lowered lowered = Lowering.standard().lower(statement);
    assertEquals(bits, lowered.qubo().size(), "bits of " + statement.name());
    Draws draws = Enumeration.standard().sample(lowered.qubo(), Effort.draws(1));
    Plan best = lowered.plan(draws.best().state());
    assertTrue(best.feasible(), best.toString());
    assertEquals(optimum, best.value(), statement.name());
    assertEquals(optimum, lowered.valueOf(draws.best().energy()), statement.name());
    return best;
  }

  /** Every state breaks a rule, and the lowest energy says so. */
  static void assertInfeasible(int bits, Statement statement) {
    Lowered lowered = Lowering.standard().lower(statement);
    assertEquals(bits, lowered.qubo().size(), "bits of " + statement.name());
    Draws draws = Enumeration.standard().sample(lowered.qubo(), Effort.draws(1));
    assertFalse(lowered.plan(draws.best().state()).feasible(), statement.name());
    assertTrue(draws.best().energy() > 0, statement.name());
  }

  /** The lowest of a function over all subsets of n things, given as bits; infinity is no value. */
  static double least(int n, IntToDoubleFunction cost) {
    return IntStream.range(0, 1 << n).mapToDouble(cost).min().orElseThrow();
  }

  /** Whether a thing is in a subset. */
  static boolean in(int subset, int thing) {
    return (subset >> thing & 1) == 1;
  }

  /** All words of a length over 0 .. letters - 1. */
  static Stream<int[]> words(int length, int letters) {
    int count = IntStream.range(0, length).reduce(1, (product, k) -> product * letters);
    return IntStream.range(0, count)
        .mapToObj(
            code -> {
              int[] word = new int[length];
              int rest = code;
              for (int k = 0; k < length; k++) {
                word[k] = rest % letters;
                rest /= letters;
              }
              return word;
            });
  }

  /** All orders of 0 .. n - 1. */
  static Stream<int[]> orders(int n) {
    return words(n, n).filter(word -> IntStream.of(word).distinct().count() == n);
  }

  /** The bits of a whole number from 0 to a highest. */
  static int digits(int highest) {
    return highest == 0 ? 0 : 32 - Integer.numberOfLeadingZeros(highest);
  }

  /** The bits that "at least one of so many" takes, as a product of what does not hold. */
  static int productBits(int literals) {
    return literals < 3 ? 0 : digits(literals - 1) - 1;
  }
}
