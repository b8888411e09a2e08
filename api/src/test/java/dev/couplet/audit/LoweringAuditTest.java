package dev.couplet.audit;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.Findings.Finding;
import dev.couplet.audit.LoweringAudit.WeightSlack;
import dev.couplet.lower.Lowering;
import dev.couplet.lower.Weights;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class LoweringAuditTest {
  private static Model knapsack() {
    Model model = Model.named("knapsack");
    int[] crates = {3, 4, 5, 6};
    int[] gain = {4, 5, 7, 9};
    List<Expr> load = new ArrayList<>();
    List<Expr> value = new ArrayList<>();
    for (int i = 0; i < crates.length; i++) {
      Bit taken = model.bit("take " + i);
      load.add(taken.times(crates[i]));
      value.add(taken.times(gain[i]));
    }
    model.require("capacity", sum(load).atMost(9));
    model.maximize("gain", sum(value));
    return model;
  }

  private static List<String> checks(LoweringAudit.Report report) {
    return report.findings().all().stream().map(Finding::check).toList();
  }

  /** By hand: of the 16 subsets, 9 weigh at most 9; the best are {0, 3} and its value is 13. */
  @Test
  void figuresOfASmallModel() {
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(knapsack()));
    report.orThrow();
    assertTrue(report.passed());
    assertEquals(16, report.patterns());
    assertEquals(9, report.feasible());
    assertEquals(OptionalDouble.of(13), report.optimum());
    assertEquals(1, report.weights().size());
    // The whole range is 25, the weight 26. {2, 3} weighs 11 and gains 16: -16 + 26 * 4 = 88 lies
    // 101 above -13; {1, 3} weighs 10 and gains 14: -14 + 26 lies 25 above -13, the lowest.
    assertEquals(26, report.weights().get(0).weight());
    assertEquals(OptionalDouble.of(25), report.margin());
    // {1, 3} asks for -14 + v > -13; {2, 3} only for -16 + 4 v > -13.
    assertEquals(OptionalDouble.of(1), report.weights().get(0).infimum());
    assertTrue(report.toString().contains("'capacity' weighs 26, enough above 1"));
    assertTrue(report.toString().contains("16 patterns, 9 feasible, optimum 13, margin 25"));
  }

  @Test
  void aWeightTooLightIsFoundWithItsRuleAndTheMend() {
    LoweringAudit.Report report =
        LoweringAudit.exhaustive(Lowering.standard().with(Weights.fixed(0.5)).lower(knapsack()));
    assertFalse(report.passed());
    assertEquals(List.of("others"), checks(report));
    AssertionError error = assertThrows(AssertionError.class, report::orThrow);
    String message = error.getMessage();
    // {2, 3} at -16 + 4 / 2 is the lowest of those that are too heavy.
    assertTrue(message.contains("energy -14, not above"), message);
    assertTrue(message.contains("take 2 = true, take 3 = true; value 16"), message);
    assertTrue(message.contains("unmet [capacity: missed by 2]"), message);
    assertTrue(message.contains("'capacity' weighs 0.5, raise it above 1"), message);
  }

  /** At the infimum itself the broken pattern ties with the best plan: not strictly above. */
  @Test
  void theInfimumItselfDoesNotSuffice() {
    Lowering at = Lowering.standard().weight("capacity", 1);
    Lowering above = Lowering.standard().weight("capacity", 1 + 0x1p-20);
    assertFalse(LoweringAudit.exhaustive(at.lower(knapsack())).passed());
    assertTrue(LoweringAudit.exhaustive(above.lower(knapsack())).passed());
  }

  @Test
  void aCodeTooLightIsFoundByTheNameOfItsChoice() {
    Model model = Model.named("two options");
    Choice<String> van = model.choice("van", List.of("small", "large"));
    model.maximize("crates", van.is("small").times(3).plus(van.is("large").times(4)));
    Lowering light = Lowering.standard().with(Weights.fixed(2));
    LoweringAudit.Report report = LoweringAudit.exhaustive(light.lower(model));
    AssertionError error = assertThrows(AssertionError.class, report::orThrow);
    String message = error.getMessage();
    assertTrue(message.contains("van = undecided"), message);
    assertTrue(message.contains("'one option of 'van'' weighs 2, raise it above 3"), message);
    assertEquals(2, report.feasible());
    assertEquals(OptionalDouble.of(4), report.optimum());
    assertEquals(OptionalDouble.of(-1), report.margin());
  }

  /** Two rules forbid the same: neither weight alone decides, and each may be 0. */
  @Test
  void aRuleThatAnotherGuardsToo() {
    Model model = Model.named("twice");
    Bit bit = model.bit("b");
    model.require("once", bit.isFalse());
    model.require("again", bit.isFalse());
    model.maximize("gain", bit.times(3));
    LoweringAudit.Report enough = LoweringAudit.exhaustive(Lowering.standard().lower(model));
    enough.orThrow();
    assertEquals(List.of(0.0, 0.0), infima(enough));
    LoweringAudit.Report light =
        LoweringAudit.exhaustive(Lowering.standard().with(Weights.fixed(1)).lower(model));
    assertFalse(light.passed());
    assertEquals(List.of(2.0, 2.0), infima(light), "3 - 1 that the other takes");
  }

  /** A pattern that only one rule guards leaves the other's weight without effect on it. */
  @Test
  void noWeightOfTheWrongRuleIsEnough() {
    Model model = Model.named("apart");
    Bit a = model.bit("a");
    Bit b = model.bit("b");
    model.require("no a", a.isFalse());
    model.require("no b", b.isFalse());
    model.maximize("gain", a.times(3).plus(b.times(3)));
    Lowering light = Lowering.standard().weight("no a", 2);
    LoweringAudit.Report report = LoweringAudit.exhaustive(light.lower(model));
    assertEquals(List.of(3.0, Double.POSITIVE_INFINITY), infima(report));
  }

  private static List<Double> infima(LoweringAudit.Report report) {
    return report.weights().stream().map(slack -> slack.infimum().orElseThrow()).toList();
  }

  @Test
  void aModelWithoutAFeasiblePlanIsAFindingOfItsOwn() {
    Model model = Model.named("too much");
    Bit a = model.bit("a");
    Bit b = model.bit("b");
    model.require("not both", a.plus(b).atMost(1));
    model.require("a", a.isTrue());
    model.require("b", b.isTrue());
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(model));
    assertEquals(List.of("feasible plan"), checks(report));
    assertEquals(0, report.feasible());
    assertEquals(OptionalDouble.empty(), report.optimum());
    assertEquals(OptionalDouble.empty(), report.margin());
    for (WeightSlack slack : report.weights()) {
      assertEquals(OptionalDouble.empty(), slack.infimum(), slack.toString());
    }
    assertTrue(report.findings().toString().contains("none of the 4 plans"));
  }

  @Test
  void modelsWithNextToNothing() {
    Model empty = Model.named("empty");
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(empty));
    report.orThrow();
    assertEquals(1, report.feasible());
    assertEquals(OptionalDouble.of(0), report.optimum());
    assertEquals(OptionalDouble.empty(), report.margin(), "there is no other pattern");
    Model only = Model.named("decisions only");
    only.bit("b");
    only.choice("c", List.of(1, 2, 3));
    LoweringAudit.Report ofDecisions = LoweringAudit.exhaustive(Lowering.standard().lower(only));
    ofDecisions.orThrow();
    assertEquals(6, ofDecisions.feasible());
    assertEquals(OptionalDouble.of(1), ofDecisions.margin());
  }

  @Test
  void preferredRulesHaveNoWeightToAnalyse() {
    Model model = Model.named("wish");
    List<Bit> bits = List.of(model.bit("a"), model.bit("b"), model.bit("c"));
    model.prefer("about one", sum(bits).exactly(1), 2);
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(model));
    report.orThrow();
    assertEquals(OptionalDouble.empty(), report.weights().get(0).infimum());
    assertTrue(report.weights().get(0).toString().endsWith("not analysed"));
  }

  @Test
  void moreThanTwentyFourBitsAreRefusedWithAWayOut() {
    Model model = Model.named("wide");
    List<Integer> keys = new ArrayList<>();
    for (int key = 0; key < 25; key++) {
      keys.add(key);
    }
    assertEquals(25, model.bits("b", keys).keys().size());
    IllegalArgumentException refused =
        assertThrows(
            IllegalArgumentException.class,
            () -> LoweringAudit.exhaustive(Lowering.standard().lower(model)));
    assertTrue(refused.getMessage().contains("25 decision bits"), refused.getMessage());
    assertTrue(refused.getMessage().contains("smaller model"), refused.getMessage());
  }
}
