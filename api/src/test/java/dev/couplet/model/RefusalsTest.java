package dev.couplet.model;

import static dev.couplet.model.Expr.constant;
import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Every mistake is refused at the call, by a message that names the thing and its value. */
class RefusalsTest {
  private final Model model = Model.named("rounds");
  private final Bit a = model.bit("a");
  private final Bit b = model.bit("b");
  private final Choice<String> van = model.choice("van", List.of("small", "large"));

  /** The call is refused with all these words, and leaves the model as it was. */
  private void refused(Executable call, String... words) {
    String before = model.describe();
    IllegalArgumentException refusal = assertThrows(IllegalArgumentException.class, call);
    for (String word : words) {
      assertTrue(refusal.getMessage().contains(word), refusal.getMessage());
    }
    assertEquals(before, model.describe());
  }

  @Test
  void namesThatAreBlankOrTaken() {
    refused(() -> Model.named(" "), "a model", "blank");
    refused(() -> model.bit(""), "a decision", "blank");
    refused(() -> model.choice("\t", List.of(1)), "a decision", "blank");
    refused(() -> model.bits(" ", List.of(1)), "a family", "blank");
    refused(() -> model.require("", a.isTrue()), "a rule", "blank");
    refused(() -> model.prefer(" ", a.isTrue(), 1), "a rule", "blank");
    refused(() -> model.minimize(" ", a), "an objective", "blank");
    refused(() -> model.bit("a"), "decision", "'a'", "already");
    refused(() -> model.bit("van"), "'van'", "already");
    model.require("kept", a.isTrue());
    refused(() -> model.require("kept", b.isTrue()), "rule or objective", "'kept'", "already");
    refused(() -> model.minimize("kept", a), "'kept'", "already");
  }

  @Test
  void choicesWithoutOptionsOrWithOneTwice() {
    refused(() -> model.choice("c", List.of()), "choice 'c'", "no options");
    refused(() -> model.choice("c", List.of("x", "y", "x")), "choice 'c'", "option x twice");
    refused(() -> van.is("bike"), "'bike'", "choice 'van'", "[small, large]");
  }

  private record Key(int number) {
    @Override
    public String toString() {
      return "key";
    }
  }

  @Test
  void familiesWithAKeyTwiceOrTwoWrittenAlike() {
    refused(() -> model.bits("f", List.of("x", "y", "x")), "family 'f'", "key x twice");
    refused(() -> model.bits("f", List.of(new Key(1), new Key(2))), "family 'f'", "written key");
    model.bit("f y");
    refused(() -> model.bits("f", List.of("x", "y")), "'f y'", "already");
    Family<String, Bit> good = model.bits("g", List.of("x", "y"));
    refused(() -> good.of("z"), "family 'g'", "z", "[x, y]");
  }

  @Test
  void decisionsOfAnotherModel() {
    Model other = Model.named("other");
    Bit foreign = other.bit("a");
    Choice<String> foreignVan = other.choice("van", List.of("small"));
    refused(() -> a.plus(foreign), "model 'rounds'", "model 'other'");
    refused(() -> a.times(foreignVan.is("small")), "model 'rounds'", "model 'other'");
    refused(() -> sum(a, b, foreign), "model 'other'");
    refused(() -> model.require("r", foreign.isTrue()), "'other'", "'rounds'");
    refused(() -> model.minimize("m", foreign), "'other'", "'rounds'");
    Plan.Draft draft = model.plan();
    refused(() -> draft.set(foreign, true), "decision 'a'", "'other'", "'rounds'");
    refused(() -> draft.set(foreignVan, "small"), "decision 'van'", "'other'");
    Plan plan = model.plan().set(a, true).set(b, true).set(van, "small").evaluate();
    refused(() -> plan.value(foreign), "decision 'a'", "'other'");
    refused(() -> plan.find(foreignVan), "decision 'van'", "'other'");
    refused(() -> plan.number(foreign), "'other'");
  }

  @ParameterizedTest
  @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
  void numbersThatAreNone(double number) {
    String shown = String.valueOf(number);
    refused(() -> constant(number), "constant", shown);
    refused(() -> a.plus(number), "constant");
    refused(() -> a.minus(number), "constant");
    refused(() -> a.times(number), "factor", shown);
    refused(() -> a.atMost(number), "upper limit", shown);
    refused(() -> a.atLeast(number), "lower limit", shown);
    refused(() -> a.exactly(number), "value", shown);
    refused(() -> a.between(number, 1), "lower limit", shown);
    refused(() -> a.between(0, number), "upper limit", shown);
    refused(() -> model.prefer("r", a.isTrue(), number), "rule 'r'", shown);
  }

  @Test
  void limitsAndCostsTheWrongWayRound() {
    refused(() -> a.between(2, 1), "lower limit 2", "upper limit 1");
    refused(() -> model.prefer("r", a.isTrue(), -1), "rule 'r'", "-1", "0 or more");
  }

  @Test
  void objectivesThatPullBothWays() {
    model.minimize("cost", a);
    refused(() -> model.maximize("gain", b), "'gain'", "maximize", "'cost'", "opposite");
    model.minimize("more cost", b);
    assertEquals(2, model.snapshot().objectives().size());
  }

  @Test
  void rulesThatNoPlanCanKeep() {
    refused(
        () -> model.require("r", a.plus(b).atLeast(3)),
        "rule 'r' can be kept by no plan",
        "a + b >= 3",
        "between 0 and 2");
    refused(() -> model.require("r", constant(5).atMost(3)), "rule 'r'", "5 <= 3", "no decision");
    refused(
        () -> model.require("r", van.is("small").plus(van.is("large")).exactly(0)),
        "rule 'r'",
        "between 1 and 1");
    refused(
        () -> model.require("r", a.times(0.2).plus(b.times(0.4)).atLeast(1.5)),
        "between 0 and 0.6");
  }

  @Test
  void rulesThatNoPlanCanKeepSinceFactorsDoNotDivide() {
    refused(
        () -> model.require("r", a.times(2).plus(b.times(4)).exactly(3)),
        "rule 'r' can be kept by no plan",
        "common factor");
    refused(
        () -> model.require("r", a.times(0.6).plus(b.times(0.9)).between(0.7, 0.8)),
        "rule 'r' can be kept by no plan",
        "common factor");
  }

  @Test
  void numbersBeyondExactArithmetic() {
    refused(() -> model.require("r", a.times(1e16).plus(b).atMost(5)), "rule 'r'", "2^51", "unit");
    refused(
        () -> model.require("r", a.times(1e9).plus(b.times(1e-9)).atMost(5)),
        "rule 'r'",
        "fewer decimals");
    refused(() -> model.require("r", a.atMost(0.1234567890123456789)), "rule 'r'", "decimals");
    double large = 0x1p50;
    refused(
        () -> model.require("r", sum(a.times(large), b.times(large), a.times(-large)).atMost(5)),
        "rule 'r'",
        "add up to");
    refused(() -> model.minimize("m", a.times(1e200).times(1e200)), "objective 'm'", "Infinity");
    refused(
        () -> model.minimize("m", a.times(1e308).plus(a.times(1e308))),
        "objective 'm'",
        "Infinity");
  }

  @Test
  void decisionsMadeAfterTheSnapshot() {
    Plan.Draft draft = model.plan().set(a, true).set(b, true).set(van, "small");
    Plan plan = draft.evaluate();
    Bit late = model.bit("late");
    Choice<Integer> lateChoice = model.choice("late choice", List.of(1));
    refused(() -> draft.set(late, true), "decision 'late'", "after", "again");
    refused(() -> plan.value(late), "decision 'late'", "after");
    refused(() -> plan.value(lateChoice), "decision 'late choice'", "after");
    refused(() -> plan.number(a.plus(late)), "decision 'late'", "after");
  }

  @Test
  void literalsThatThereAreNot() {
    Statement statement = model.snapshot();
    refused(() -> statement.describe(4), "literal 4", "'rounds'", "has 4");
    refused(() -> statement.decisionOf(-1), "literal -1", "'rounds'");
  }

  @Test
  void plansThatAreNotFilledIn() {
    IllegalStateException open =
        assertThrows(IllegalStateException.class, () -> model.plan().set(a, true).evaluate());
    assertTrue(open.getMessage().contains("decision 'b' is not set"), open.getMessage());
    refused(() -> model.plan().set(van, "bike"), "'bike'", "choice 'van'");
  }
}
