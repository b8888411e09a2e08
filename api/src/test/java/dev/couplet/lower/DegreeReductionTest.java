package dev.couplet.lower;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class DegreeReductionTest {
  /**
   * Auxiliary bits: 1 for a negative product (Freedman and Drineas 2005), ceil(log2 d) - 1 for a
   * positive one (Boros, Crama and Rodriguez-Heck 2020).
   */
  @ParameterizedTest
  @CsvSource({
    "3, -2, 1",
    "4, -2, 1",
    "5, -2, 1",
    "6, -2, 1",
    "7, -2, 1",
    "8, -2, 1",
    "3, 3, 1",
    "4, 3, 1",
    "5, 3, 2",
    "6, 3, 2",
    "7, 3, 2",
    "8, 3, 2",
    "9, 3, 3"
  })
  void aProductIsReplacedExactly(int degree, double coefficient, int auxiliaries) {
    Model model = Model.named("product");
    model.bits("x", IntStream.range(0, degree).boxed().toList());
    BitTable bits = new BitTable(new Coding(model.snapshot(), Lowering.standard()));
    int[] all = IntStream.range(0, degree).toArray();
    Polynomial product = Polynomial.builder(degree).add(coefficient, all).build();
    Polynomial quadratic = DegreeReductionProperties.reduced(product, "product", bits);
    assertTrue(quadratic.degree() <= 2);
    assertEquals(degree + auxiliaries, bits.size());
    for (long pattern = 0; pattern < 1L << degree; pattern++) {
      double lowest = Double.POSITIVE_INFINITY;
      for (long others = 0; others < 1L << auxiliaries; others++) {
        State state = State.ofWords(bits.size(), pattern | others << degree);
        lowest = Math.min(lowest, quadratic.value(state));
      }
      assertEquals(product.value(State.ofWords(degree, pattern)), lowest);
      assertEquals(lowest, quadratic.value(completed(bits, pattern)), "completion");
    }
    assertSizesOfTheTable(quadratic, degree, coefficient, auxiliaries);
  }

  private static State completed(BitTable bits, long pattern) {
    boolean[] values = State.ofWords(bits.size(), pattern).toBooleans();
    bits.completions().forEach(completion -> completion.complete(values));
    return State.of(values);
  }

  /** The numbers of pairs and the largest coefficients that the documentation of Lowering gives. */
  private static void assertSizesOfTheTable(
      Polynomial quadratic, int degree, double coefficient, int auxiliaries) {
    int[] pairs = {0};
    double[] largest = {0};
    quadratic.forEachTerm(
        (value, variables) -> {
          pairs[0] += variables.length == 2 ? 1 : 0;
          largest[0] = Math.max(largest[0], Math.abs(value / coefficient));
        });
    boolean positive = coefficient > 0;
    int ofPositive =
        degree * (degree - 1) / 2 + degree * auxiliaries + auxiliaries * (auxiliaries - 1) / 2;
    assertTrue(pairs[0] <= (positive ? ofPositive : degree), "pairs " + pairs[0]);
    double most = positive ? degree * (degree + 2) / 8.0 : degree - 1;
    assertTrue(largest[0] <= most, "largest " + largest[0]);
  }

  @ParameterizedTest
  @CsvSource({"1", "-1"})
  void productsAndTheirOppositesInAModel(double coefficient) {
    Model model = Model.named("cubic");
    Expr product =
        Expr.product(model.bits("x", IntStream.range(0, 3).boxed().toList()).decisions());
    model.maximize("m", product.times(coefficient));
    Lowered lowered = Lowering.standard().lower(model);
    assertEquals(1, lowered.auxiliaryBits());
    State ones = State.zeros(3).flipped();
    State complete = lowered.complete(model.snapshot().plan(ones));
    assertEquals(coefficient, lowered.valueOf(lowered.qubo().value(complete)));
    assertTrue(lowered.ledger().meaning(3).contains("product of 3 in 'm'"));
  }
}
