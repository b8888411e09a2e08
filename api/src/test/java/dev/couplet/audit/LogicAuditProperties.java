package dev.couplet.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.Findings.Finding;
import dev.couplet.lower.Lowering;
import dev.couplet.model.Plan;
import dev.couplet.model.Unmet;
import java.util.List;
import java.util.Optional;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

/** Random problems of nested logic, lowered and audited, against formulas judged directly. */
class LogicAuditProperties {
  @Property(tries = 1000)
  void logic(@ForAll long seed) {
    check(LogicSpecs.of(seed));
  }

  private static void check(LogicSpec spec) {
    LogicSpecModel stated = new LogicSpecModel(spec);
    for (LogicSpec.Rule rule : stated.refused) {
      spec.forEach(values -> assertTrue(rule.said().miss(values) > 0, rule + " can be kept"));
    }
    if (!stated.refused.isEmpty()) {
      return;
    }
    long[] feasible = {0};
    double[] best = {Double.POSITIVE_INFINITY};
    spec.forEach(
        values -> {
          Plan plan = stated.plan(values);
          checkPlan(spec, stated, plan, values);
          assertEquals(spec.feasible(values), plan.feasible());
          feasible[0] += plan.feasible() ? 1 : 0;
          best[0] = plan.feasible() ? Math.min(best[0], plan.value()) : best[0];
        });
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(stated.model));
    assertEquals(feasible[0], report.feasible());
    if (feasible[0] == 0) {
      List<String> checks = report.findings().all().stream().map(Finding::check).toList();
      assertEquals(List.of("feasible plan"), checks);
    } else {
      report.orThrow();
      assertEquals(best[0], report.optimum().orElseThrow());
    }
  }

  private static void checkPlan(LogicSpec spec, LogicSpecModel stated, Plan plan, int[] values) {
    double value = spec.objective(values);
    for (LogicSpec.Rule rule : spec.rules()) {
      double miss = rule.said().miss(values);
      Optional<Unmet> unmet =
          plan.unmet().stream().filter(one -> one.rule().equals(rule.name())).findFirst();
      assertEquals(miss > 0, unmet.isPresent(), rule.toString());
      double amount = unmet.map(Unmet::amount).orElse(0.0);
      if (countsExactly(rule.said())) {
        assertEquals(miss, amount, rule.toString());
      }
      assertTrue(amount >= miss && amount == Math.rint(amount), rule.toString());
      double cost = unmet.map(Unmet::cost).orElse(0.0);
      if (!rule.required() && (!rule.squared() || amount <= 1)) {
        assertEquals(amount * rule.cost().getAsInt(), cost, rule.toString());
      }
      value += cost;
      checkLiteral(stated, plan, rule.said(), values);
    }
    assertEquals(value, plan.value());
  }

  private static boolean countsExactly(LogicSpec.Said said) {
    return said instanceof LogicSpec.Limits
        || said instanceof LogicSpec.OddWhen
        || said instanceof LogicSpec.Different
        || (said instanceof LogicSpec.Holds holds && holds.asNumber());
  }

  private static void checkLiteral(
      LogicSpecModel stated, Plan plan, LogicSpec.Said said, int[] values) {
    if (said instanceof LogicSpec.Holds holds) {
      boolean truth = holds.formula().holds(values);
      assertEquals(truth, plan.holds(stated.literal(holds.formula())));
      assertEquals(truth ? 1 : 0, plan.number(stated.literal(holds.formula())));
      assertEquals(!truth, plan.holds(stated.literal(holds.formula()).not()));
    }
  }
}
