package dev.couplet.lower;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.model.Bit;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ClauseFormTest {
  private final Model model = Model.named("clauses");

  private List<Bit> bits(int count) {
    return List.copyOf(model.bits("x", IntStream.range(0, count).boxed().toList()).decisions());
  }

  /**
   * "At least one of n" as a product of negations takes ceil(log2 n) - 1 auxiliary bits (Boros,
   * Crama and Rodriguez-Heck 2020), where the slack of a square takes floor(log2(n - 1)) + 1.
   */
  @ParameterizedTest
  @CsvSource({
    "2, 0, 1",
    "3, 1, 2",
    "4, 1, 2",
    "5, 2, 3",
    "6, 2, 3",
    "8, 2, 3",
    "9, 3, 4",
    "16, 3, 4"
  })
  void atLeastOneTakesFewerBitsThanASlack(int n, int auxiliaries, int ofSlack) {
    List<Bit> x = bits(n);
    model.require("some", sum(x).atLeast(1));
    model.minimize("count", sum(x));
    Lowered lowered = Lowering.standard().lower(model);
    assertEquals(auxiliaries, lowered.auxiliaryBits());
    assertEquals(ofSlack, Slack.coefficients(n - 1).length);
    LoweringAudit.exhaustive(lowered).orThrow();
    LoweringAudit.exhaustive(Lowering.standard().smallestCoefficients().lower(model)).orThrow();
    assertTrue(largest(n) <= Math.max(1, n * (3 * n - 2) / 8.0), "the table of Lowering");
  }

  /** The largest coefficient of the penalty by itself. */
  private static double largest(int n) {
    Model alone = Model.named("alone");
    alone.require(
        "some",
        sum(alone.bits("x", IntStream.range(0, n).boxed().toList()).decisions()).atLeast(1));
    Qubo form = Lowering.standard().with(Weights.fixed(1)).lower(alone).qubo();
    double[] largest = {0};
    form.toPolynomial()
        .forEachTerm(
            (value, variables) ->
                largest[0] = Math.max(largest[0], variables.length > 0 ? Math.abs(value) : 0));
    return largest[0];
  }

  /** Any coefficients and negations that leave one broken pattern. */
  @Test
  void whateverSaysAtLeastOne() {
    List<Bit> x = bits(7);
    model.require("weighted", weighted(x.subList(0, 4), 3, 5, 4, 9).atLeast(3));
    model.require("negated", x.get(0).not().plus(x.get(4)).plus(x.get(5).not()).atLeast(1));
    model.require("not all", sum(x.subList(2, 7)).atMost(4));
    model.require("two of them", sum(x.subList(1, 5)).atLeast(2));
    model.maximize("gain", weighted(x, 1, -2, 3, -4, 5, -6, 7));
    Lowered lowered = Lowering.standard().lower(model);
    List<String> forms = lowered.weights().stream().map(Lowered.Weight::form).toList();
    assertEquals("at least one of 4, as a product", forms.get(0));
    assertEquals("at least one of 3, as a product", forms.get(1));
    assertEquals("at least one of 5, as a product", forms.get(2));
    assertTrue(forms.get(3).startsWith("square, slack 0..2"), forms.get(3));
    LoweringAudit.exhaustive(lowered).orThrow();
  }

  /** A preferred one costs exactly its amount, or the square of it, without a tie. */
  @Test
  void preferredOnesCostTheirAmount() {
    List<Bit> x = bits(6);
    model.prefer("five", weighted(x.subList(0, 5), 2, 3, 2, 2, 4).atLeast(2), 7);
    model.minimize("count", sum(x));
    Lowered lowered = Lowering.standard().lower(model);
    assertEquals(2, lowered.auxiliaryBits());
    assertEquals("its own cost, exactly", lowered.weights().get(0).reason());
    assertEquals(14, lowered.qubo().value(lowered.complete(model.snapshot().plan(State.zeros(6)))));
    LoweringAudit.exhaustive(lowered).orThrow();
  }

  private static Expr weighted(List<Bit> x, double... factors) {
    return sum(IntStream.range(0, x.size()).mapToObj(k -> x.get(k).times(factors[k])).toList());
  }
}
