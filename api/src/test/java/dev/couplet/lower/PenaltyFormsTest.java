package dev.couplet.lower;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.lower.Lowered.Weight;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Condition;
import dev.couplet.model.Expr;
import dev.couplet.model.Literal;
import dev.couplet.model.Model;
import java.util.BitSet;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What single rules become. */
class PenaltyFormsTest {
  private final Model model = Model.named("one rule");
  private final List<Bit> x =
      List.copyOf(model.bits("x", IntStream.range(0, 4).boxed().toList()).decisions());

  private Lowered required(Condition condition) {
    model.require("rule", condition);
    return Lowering.standard().with(Weights.fixed(1)).lower(model);
  }

  private static void assertTerms(Polynomial.Builder expected, Lowered lowered) {
    assertEquals(expected.build(), lowered.qubo().toPolynomial());
  }

  private Polynomial.Builder terms() {
    return Polynomial.builder(4);
  }

  private String form() {
    return Lowering.standard().lower(model).weights().get(0).form();
  }

  // Glover, Kochenberger and Du (2019), table of penalties for pairs.

  @Test
  void notBoth() {
    assertTerms(terms().add(1, 0, 1), required(x.get(0).plus(x.get(1)).atMost(1)));
  }

  @Test
  void atLeastOne() {
    Lowered lowered = required(x.get(0).plus(x.get(1)).atLeast(1));
    assertTerms(terms().add(1).add(-1, 0).add(-1, 1).add(1, 0, 1), lowered);
  }

  @Test
  void exactlyOne() {
    Lowered lowered = required(x.get(0).plus(x.get(1)).exactly(1));
    assertTerms(terms().add(1).add(-1, 0).add(-1, 1).add(2, 0, 1), lowered);
  }

  @Test
  void implies() {
    assertTerms(terms().add(1, 0).add(-1, 0, 1), required(x.get(0).implies(x.get(1))));
    assertEquals("exact on 2 bits", form());
  }

  @Test
  void equal() {
    Lowered lowered = required(x.get(0).equalTo(x.get(1)));
    assertTerms(terms().add(1, 0).add(1, 1).add(-2, 0, 1), lowered);
  }

  @Test
  void atMostOneOfThree() {
    Lowered lowered = required(sum(x.subList(0, 3)).atMost(1));
    assertTerms(terms().add(1, 0, 1).add(1, 0, 2).add(1, 1, 2), lowered);
    assertEquals("pairs, at most one of 3", form());
  }

  // Forms worked out by hand.

  @Test
  void atLeastThreeOfFourLeavesAtMostOneOut() {
    Lowered lowered = required(sum(x).atLeast(3));
    Polynomial.Builder expected = terms();
    for (int i = 0; i < 4; i++) {
      for (int j = 0; j < i; j++) {
        expected.add(1).add(-1, i).add(-1, j).add(1, i, j);
      }
    }
    assertTerms(expected, lowered);
    assertEquals(0, lowered.auxiliaryBits());
  }

  @Test
  void whatIsTooHeavyNeverHolds() {
    Expr load = sum(x.get(0).times(9), x.get(1).times(3), x.get(2).times(4), x.get(3).times(2));
    assertTerms(terms().add(1, 0).add(1, 1, 2).add(1, 1, 3).add(1, 2, 3), required(load.atMost(4)));
    assertEquals("pairs, none of 1 and at most one of 3", form());
  }

  @Test
  void noneOfThem() {
    assertTerms(terms().add(1, 0).add(1, 1).add(1, 2), required(sum(x.subList(0, 3)).exactly(0)));
    assertEquals("linear, none of 3", form());
  }

  @Test
  void factorsAndImpliedLimitsAreTakenOut() {
    Expr doubled = sum(x.subList(0, 3)).times(2);
    Lowered lowered = required(doubled.between(-5, 3));
    assertTerms(terms().add(1, 0, 1).add(1, 0, 2).add(1, 1, 2), lowered);
  }

  @Test
  void equalityIsASquareWithoutAuxiliaryBits() {
    Lowered lowered = required(sum(x).exactly(2));
    Polynomial two = Polynomial.builder(4).add(-2).add(1, 0).add(1, 1).add(1, 2).add(1, 3).build();
    assertEquals(two.times(two), lowered.qubo().toPolynomial());
    assertEquals("square", form());
  }

  @Test
  void aCodeIsTheSquareOfWhatIsMissingToOne() {
    Choice<String> choice = model.choice("c", List.of("p", "q", "r"));
    Lowered lowered = Lowering.standard().with(Weights.fixed(1)).lower(model);
    Polynomial.Builder one = Polynomial.builder(7).add(-1).add(1, 4).add(1, 5).add(1, 6);
    assertEquals(one.build().times(one.build()), lowered.qubo().toPolynomial());
    assertEquals("one option of 'c'", lowered.weights().get(0).rule());
    assertEquals(List.of(List.of(4, 5, 6)), lowered.structure().exactlyOne());
    assertEquals(3, choice.values());
  }

  /** 3 x + 2 y + 2 z + w between 3 and 6: the slack holds 0..3 in two bits. */
  @Test
  void slackIsAsLongAsTheRangeLeft() {
    Expr load = sum(x.get(0).times(3), x.get(1).times(2), x.get(2).times(2), x.get(3));
    Lowered lowered = required(load.between(3, 6));
    assertEquals(2, lowered.auxiliaryBits());
    assertEquals("square, slack 0..3 in 2 bits", form());
    assertEquals("1 of the slack of 'rule'", lowered.ledger().meaning(4));
    assertEquals("2 of the slack of 'rule'", lowered.ledger().meaning(5));
  }

  @ParameterizedTest
  @ValueSource(longs = {0, 1, 2, 3, 4, 5, 7, 8, 100, 255, 256, 257, 1000})
  void slackHoldsEveryValueOfItsRangeAndNoOther(long highest) {
    long[] coefficients = Slack.coefficients(highest);
    BitSet sums = new BitSet();
    for (long pattern = 0; pattern < 1L << coefficients.length; pattern++) {
      long chosen = pattern;
      long value =
          IntStream.range(0, coefficients.length)
              .mapToLong(k -> (chosen >>> k & 1) * coefficients[k])
              .sum();
      sums.set((int) value);
    }
    assertEquals(highest + 1, sums.cardinality());
    assertEquals(highest + 1, sums.length());
    int bits = highest == 0 ? 0 : 64 - Long.numberOfLeadingZeros(highest);
    assertEquals(bits, coefficients.length, "floor(log2 R) + 1");
  }

  @ParameterizedTest
  @ValueSource(longs = {0, 1, 5, 8, 13, 64, 100})
  void slackIsSetToTheNearestValue(long highest) {
    BitTable bits = new BitTable(new Coding(model.snapshot(), Lowering.standard()));
    Slack slack = Slack.upTo(highest, "slack", bits);
    long[] coefficients = Slack.coefficients(highest);
    for (long wanted = -3; wanted <= highest + 3; wanted++) {
      boolean[] values = new boolean[bits.size()];
      slack.set(wanted, values);
      long held = 0;
      for (int k = 0; k < coefficients.length; k++) {
        held += values[4 + k] ? coefficients[k] : 0;
      }
      assertEquals(Math.max(0, Math.min(highest, wanted)), held);
    }
  }

  @Test
  void slackOfAWideRangeTakesItsLogarithm() {
    long[] coefficients = Slack.coefficients((1L << 40) + 5);
    assertEquals(41, coefficients.length);
    assertEquals((1L << 40) + 5, LongStream.of(coefficients).sum());
  }

  @Test
  void whatEveryPlanKeepsTakesNothing() {
    Lowered lowered = required(sum(x).atMost(4));
    assertTerms(terms(), lowered);
    assertEquals(new Weight("rule", "nothing", 0, "every plan keeps it"), lowered.weights().get(0));
  }

  @Test
  void preferredRulesTakeTheFormThatFits() {
    Literal first = x.get(0);
    model.prefer("two bits", first.plus(x.get(1)).atMost(1), 5);
    model.prefer("above all", sum(x).atLeast(4), 2);
    model.prefer("never", sum(x).atMost(0), 2);
    model.prefer("within", sum(x).exactly(2), 3);
    Lowered lowered = Lowering.standard().lower(model);
    List<String> forms = lowered.weights().stream().map(Weight::form).toList();
    assertEquals("exact on 2 bits", forms.get(0));
    assertEquals("the amount itself", forms.get(1));
    assertEquals("the amount itself", forms.get(2));
    assertTrue(forms.get(3).startsWith("amount counted in 4 bits"), forms.get(3));
    // At 0000: "above all" misses by 4 at 2, "within" by 2 at 3.
    assertEquals(14, model.snapshot().plan(State.zeros(4)).value());
  }
}
