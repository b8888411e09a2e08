package dev.couplet.audit;

import static dev.couplet.lower.Lowering.standard;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.Findings.Finding;
import dev.couplet.audit.LoweringAudit.WeightSlack;
import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.audit.Spec.Limit;
import dev.couplet.lower.Lowered;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Rule;
import java.math.BigDecimal;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

/** Random problems, lowered and audited, against exact decimal arithmetic over all assignments. */
class LoweringAuditProperties {
  @Property(tries = 300)
  void sparse(@ForAll long seed) {
    check(Specs.of(Regime.SPARSE, seed));
  }

  @Property(tries = 300)
  void dense(@ForAll long seed) {
    check(Specs.of(Regime.DENSE, seed));
  }

  @Property(tries = 300)
  void tied(@ForAll long seed) {
    check(Specs.of(Regime.TIED, seed));
  }

  @Property(tries = 300)
  void hugeRange(@ForAll long seed) {
    check(Specs.of(Regime.HUGE_RANGE, seed));
  }

  @Property(tries = 300)
  void decimal(@ForAll long seed) {
    check(Specs.of(Regime.DECIMAL, seed));
  }

  @Property(tries = 300)
  void choices(@ForAll long seed) {
    check(Specs.of(Regime.CHOICES, seed));
  }

  @Property(tries = 300)
  void mixed(@ForAll long seed) {
    check(Specs.of(Regime.MIXED, seed));
  }

  /** Preferred rules with decimal costs, of which no plan ever pays one: nothing can be won. */
  @Example
  void anObjectiveThatCanWinNothing() {
    check(Specs.of(Regime.DECIMAL, -5314));
  }

  private static void check(Spec spec) {
    SpecModel stated = new SpecModel(spec);
    SpecJudge judge = new SpecJudge(spec);
    for (Limit rule : stated.refused) {
      judge.forEach(values -> assertTrue(!SpecJudge.kept(rule, values), rule + " can be kept"));
    }
    if (!stated.refused.isEmpty()) {
      return;
    }
    Lowered lowered = standard().lower(stated.model);
    LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
    assertEquals(judge.feasible, report.feasible());
    if (judge.feasible == 0) {
      List<String> checks = report.findings().all().stream().map(Finding::check).toList();
      assertEquals(List.of("feasible plan"), checks);
    } else {
      report.orThrow();
      double optimum = judge.optimum.orElseThrow().doubleValue();
      assertEquals(optimum, report.optimum().orElseThrow(), 1e-9);
    }
    judge.forEach(values -> checkPlan(spec, judge, stated.plan(values), values));
  }

  /** Setting one weight a little above or below its infimum makes or breaks the form. */
  @Property(tries = 150)
  void infimaAreSharp(@ForAll long seed) {
    Regime[] regimes = {Regime.SPARSE, Regime.DENSE, Regime.CHOICES, Regime.MIXED};
    Model model = RandomModels.of(regimes[(int) Math.floorMod(seed, 4L)], seed);
    Set<String> rules =
        model.snapshot().rules().stream().map(Rule::name).collect(Collectors.toSet());
    for (WeightSlack slack : LoweringAudit.exhaustive(standard().lower(model)).weights()) {
      double infimum = slack.infimum().orElse(0);
      if (infimum > 0 && rules.contains(slack.rule())) {
        Lowered below = standard().weight(slack.rule(), infimum * (1 - 0x1p-12)).lower(model);
        Lowered above = standard().weight(slack.rule(), infimum * (1 + 0x1p-12)).lower(model);
        assertFalse(LoweringAudit.exhaustive(below).passed(), slack + " of\n" + model.describe());
        LoweringAudit.exhaustive(above).orThrow();
      }
    }
  }

  /** Every plan by hand is judged as the exact decimals judge it, rule by rule. */
  private static void checkPlan(Spec spec, SpecJudge judge, Plan plan, int[] values) {
    assertEquals(judge.value(values).doubleValue(), plan.value(), 1e-9);
    for (Limit rule : spec.rules()) {
      BigDecimal miss = SpecJudge.miss(rule, values);
      double unmet =
          plan.unmet().stream()
              .filter(one -> one.rule().equals(rule.name()))
              .mapToDouble(one -> one.amount())
              .sum();
      assertEquals(miss.doubleValue(), unmet, rule.toString());
    }
  }
}
