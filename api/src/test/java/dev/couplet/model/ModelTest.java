package dev.couplet.model;

import static dev.couplet.model.Expr.constant;
import static dev.couplet.model.Expr.product;
import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTimeout;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.model.Statement.Objective;
import dev.couplet.model.Statement.Range;
import dev.couplet.model.Statement.Sense;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class ModelTest {
  private final Model model = Model.named("rounds");

  private static Rule.Part only(Rule rule) {
    assertEquals(1, rule.parts().size());
    return rule.parts().get(0);
  }

  private List<Bit> bits(int count) {
    return List.copyOf(model.bits("bit", IntStream.range(0, count).boxed().toList()).decisions());
  }

  @Test
  void decimalsOfRulesAreExact() {
    List<Bit> x = bits(2);
    Rule rule = model.require("r", x.get(0).times(0.1).plus(x.get(1).times(0.2)).atMost(0.3));
    assertTrue(rule.alwaysKept(), "0.1 + 0.2 is not above 0.3");
    Rule.Part tight =
        only(model.require("t", x.get(0).times(0.1).plus(x.get(1).times(0.2)).exactly(0.3)));
    assertTrue(tight.violation(State.of(true, true)) == 0);
    assertEquals(0.1, tight.unit());
    assertEquals(3, tight.lowest());
    assertEquals(0.2, tight.amount(tight.violation(State.of(true, false))));
  }

  @Test
  void commonFactorsAreTakenOut() {
    List<Bit> x = bits(2);
    Rule.Part rule =
        only(model.require("r", x.get(0).times(150).plus(x.get(1).times(250)).atMost(300)));
    assertEquals(50, rule.unit());
    assertEquals(6, rule.highest());
    assertEquals(3, rule.terms().coefficient(0));
    assertEquals(100, rule.amount(rule.violation(State.of(true, true))));
  }

  @Test
  void whatEveryPlanKeepsIsKnown() {
    List<Bit> x = bits(3);
    assertTrue(model.require("r", sum(x).atMost(3)).alwaysKept());
    assertFalse(model.require("s", sum(x).atMost(2)).alwaysKept());
    Choice<Integer> choice = model.choice("c", List.of(1, 2, 3));
    Expr shown = sum(choice.options(), o -> choice.is(o).times(o));
    assertTrue(model.require("t", shown.between(1, 3)).alwaysKept());
    assertFalse(model.require("u", shown.atMost(2)).alwaysKept());
    assertEquals(new Range(1, 3), only(model.snapshot().rules().get(3)).range());
    assertTrue(model.require("v", constant(2).atMost(2)).alwaysKept());
  }

  @Test
  void conditionsOfLiterals() {
    List<Bit> x = bits(2);
    Bit a = x.get(0);
    Bit b = x.get(1);
    Object[][] cases = {
      {a.isTrue(), false, true, false, true},
      {a.isFalse(), true, false, true, false},
      {a.not().isTrue(), true, false, true, false},
      {a.implies(b), true, false, true, true},
      {a.not().implies(b), false, true, true, true},
      {a.equalTo(b), true, false, false, true},
      {a.atLeast(b), true, true, false, true},
      {a.exactly(b.not()), false, true, true, false},
    };
    for (int c = 0; c < cases.length; c++) {
      Rule rule = model.require("rule " + c, (Condition) cases[c][0]);
      for (int pattern = 0; pattern < 4; pattern++) {
        State state = State.of((pattern & 1) != 0, (pattern & 2) != 0);
        assertEquals(cases[c][1 + pattern], rule.kept(state), rule + " at " + state);
      }
    }
    assertSame(a, a.not().not());
  }

  @Test
  void aMillionTermsByRepeatedPlus() {
    List<Bit> x = bits(1000);
    assertTimeout(
        Duration.ofSeconds(20),
        () -> {
          Expr total = constant(0);
          for (int i = 0; i < 1_000_000; i++) {
            total = total.plus(x.get(i % 1000).times(2));
          }
          Objective objective = model.minimize("total", total);
          assertEquals(1000, objective.terms().terms());
          assertEquals(2000, objective.terms().coefficient(999));
          assertEquals(2_000_000, allTrue().number(total));
          assertTrue(total.toString().length() < 2000, total.toString());
        });
  }

  @Test
  void longProductsAndPowersDoNotBlowUp() {
    List<Bit> x = bits(5000);
    Objective all = model.minimize("all", product(x));
    assertEquals(1, all.terms().terms());
    assertEquals(5000, all.terms().degree());
    Expr scaled = constant(1);
    for (int i = 0; i < 5000; i++) {
      scaled = scaled.times(x.get(i)).times(1);
    }
    assertEquals(all.terms(), model.minimize("scaled", scaled).terms());
    // (x + y)^40 = x + y + (2^40 - 2) xy, since x^k = x.
    Expr power = constant(1);
    for (int k = 0; k < 40; k++) {
      power = power.times(x.get(0).plus(x.get(1)));
    }
    Polynomial expanded = model.minimize("power", power).terms();
    assertEquals(3, expanded.terms());
    assertEquals(0x1p40 - 2, expanded.coefficient(0, 1));
    assertEquals(0x1p40, allTrue().number(power));
    Rule.Part rule = only(model.require("power rule", power.atMost(0x1p39)));
    assertEquals(0x1p39 - 1, rule.terms().coefficient(0, 1) / 2);
  }

  private Plan allTrue() {
    Plan.Draft draft = model.plan();
    for (Decision decision : model.snapshot().decisions()) {
      draft.set((Bit) decision, true);
    }
    return draft.evaluate();
  }

  @Test
  void aPlanByHandIsScoredInTheModelsUnits() {
    List<Bit> x = bits(3);
    Choice<String> van = model.choice("van", List.of("small", "large"));
    model.require("load", sum(x, bit -> bit.times(2.5)).atMost(5));
    model.prefer("small van", van.is("small").isTrue(), 3);
    model.prefer("crates", sum(x, bit -> bit.times(0.1)).atLeast(0.3), 10);
    model.maximize("gain", sum(x, bit -> bit.times(4)));
    Plan all =
        model
            .plan()
            .set(x.get(0), true)
            .set(x.get(1), true)
            .set(x.get(2), true)
            .set(van, "small")
            .set(van, "large")
            .evaluate();
    assertFalse(all.feasible());
    assertEquals(9, all.value(), "12 less 3 for the large van");
    assertEquals(
        List.of(new Unmet("load", true, 2.5, 0), new Unmet("small van", false, 1, 3)), all.unmet());
    Plan two =
        model
            .plan()
            .set(x.get(0), true)
            .set(x.get(1), true)
            .set(x.get(2), false)
            .set(van, "small")
            .evaluate();
    assertTrue(two.feasible());
    assertEquals(7, two.value(), "8 less 0.1 at 10 a unit");
    assertEquals(List.of(new Unmet("crates", false, 0.1, 1)), two.unmet());
    assertEquals("small", two.value(van));
    assertTrue(two.value(x.get(1)));
    assertTrue(two.holds(van.is("large").not()));
    assertEquals(5.5, two.number(sum(x, bit -> bit.times(2.5)).plus(0.5)));
    assertTrue(two.compareTo(all) < 0, "feasible first, though worth less");
    assertEquals(
        "Plan(bit 0 = true, bit 1 = true, bit 2 = false, van = small; value 7, feasible, unmet"
            + " [crates: missed by 0.1, cost 1])",
        two.toString());
  }

  @Test
  void plansOfOneStatementAreOrderedByFeasibilityAndValue() {
    Bit bit = model.bit("b");
    model.maximize("gain", bit);
    Plan one = model.plan().set(bit, true).evaluate();
    Plan none = model.plan().set(bit, false).evaluate();
    assertTrue(one.compareTo(none) < 0, "a maximisation puts the larger value first");
    assertEquals(one, model.plan().set(bit, true).evaluate());
    assertNotEquals(one, none);
  }

  @Test
  void choicesWithNoneOrSeveralOptionsAreUndecided() {
    Choice<String> van = model.choice("van", List.of("small", "large", "bike"));
    Statement statement = model.snapshot();
    Plan none = statement.plan(State.parse("000"));
    assertEquals(List.of(van), none.undecided());
    assertEquals(Optional.empty(), none.find(van));
    assertFalse(none.feasible());
    assertEquals(List.of(new Unmet("one option of 'van'", true, 1, 0)), none.unmet());
    Plan three = statement.plan(State.parse("111"));
    assertEquals(2, three.unmet().get(0).amount());
    IllegalStateException open = assertThrows(IllegalStateException.class, () -> three.value(van));
    assertTrue(open.getMessage().contains("decision 'van' is undecided"), open.getMessage());
    Plan second = statement.plan(State.parse("010"));
    assertEquals("large", second.value(van));
    assertTrue(second.undecided().isEmpty());
  }

  @Test
  void aSnapshotDoesNotFollowTheModel() {
    Bit first = model.bit("first");
    Statement before = model.snapshot();
    model.bit("second");
    model.require("r", first.isTrue());
    model.maximize("m", first);
    assertEquals(1, before.literals());
    assertEquals(0, before.rules().size());
    assertEquals(0, before.objectives().size());
    assertEquals(Sense.MINIMIZE, before.sense());
    assertEquals(2, model.snapshot().literals());
    assertEquals(2, model.snapshot().rules().get(0).parts().get(0).terms().size());
    assertTrue(before.sameModel(model.snapshot()));
    assertFalse(before.sameModel(Model.named("rounds").snapshot()));
  }

  @Test
  void descriptionsCanBeProofRead() {
    List<Bit> x = bits(2);
    Choice<String> van = model.choice("van", List.of("small", "large"));
    model.require("load", x.get(0).times(2.5).plus(x.get(1)).atMost(3));
    model.prefer("large", van.is("large").isTrue(), 0.5);
    model.require("free", x.get(0).atMost(1));
    model.maximize("gain", x.get(0).times(x.get(1)).times(-3).plus(x.get(1)).plus(7));
    assertEquals(
        """
        model rounds
          decide bit 0: yes or no
          decide bit 1: yes or no
          decide van: one of small, large
          require load: 5[bit 0] + 2[bit 1] <= 6 (in units of 0.5)
          prefer large: [van = large] >= 1, each unit costs 0.5
          require free: [bit 0] <= 1; every plan keeps it
          maximize gain: 7 + [bit 1] - 3[bit 0][bit 1]
        """,
        model.describe());
    assertEquals("Model(rounds: 3 decisions, 3 rules, 1 objectives)", model.toString());
    assertEquals(
        "0 <= bit 0 + 2 (not bit 1) <= 1",
        x.get(0).plus(x.get(1).not().times(2)).between(0, 1).toString());
    assertEquals("(bit 0)(van = small) = 1", x.get(0).times(van.is("small")).exactly(1).toString());
  }

  @Test
  void textsAreBounded() {
    List<Bit> x = bits(500);
    Expr deep = x.get(0);
    for (int k = 0; k < 100_000; k++) {
      deep = deep.times(1.5);
    }
    assertTrue(deep.toString().length() < 2000);
    assertTrue(sum(x).toString().length() < 2000);
    assertTrue(allTrue().toString().length() < 2000);
    assertTrue(sum(new ArrayList<>()).toString().equals("0"));
  }
}
