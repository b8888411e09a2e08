package dev.couplet.lower;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.form.Ising;
import dev.couplet.form.State;
import dev.couplet.model.Count;
import dev.couplet.model.Model;
import dev.couplet.model.Order;
import dev.couplet.model.Plan;
import dev.couplet.model.Spin;
import dev.couplet.model.Subset;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Test;

/** Spins, counts, orders and subsets, lowered and audited. */
class DecisionsLoweredTest {
  private final Model model = Model.named("house");

  /** The frustrated triangle: minimum -1, six ground states; source: common practice. */
  @Test
  void spinsLowerToTheirOwnIsing() {
    Spin a = model.spin("a");
    Spin b = model.spin("b");
    Spin c = model.spin("c");
    model.minimize("triangle", a.times(b).plus(b.times(c)).plus(a.times(c)));
    Lowered lowered = Lowering.standard().lower(model);
    LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
    report.orThrow();
    assertEquals(-1, report.optimum().orElseThrow());
    Ising ising = lowered.qubo().toIsing();
    assertEquals(1, ising.pair(0, 1));
    assertEquals(0, ising.linear(0));
    int ground = 0;
    for (long pattern = 0; pattern < 8; pattern++) {
      ground += lowered.qubo().value(State.ofWords(3, pattern)) == -1 ? 1 : 0;
    }
    assertEquals(6, ground);
  }

  @Test
  void countsAreFaithfulInRulesAndSquares() {
    Count n = model.count("n", -3, 7);
    Count m = model.count("m", 0, 4);
    model.require("sum", n.plus(m.times(2)).exactly(3));
    model.require("product", n.times(m).atLeast(-2));
    model.minimize("distance", n.minus(2).times(n.minus(2)).plus(m));
    Lowered lowered = Lowering.standard().lower(model);
    LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
    report.orThrow();
    assertEquals(1, report.optimum().orElseThrow(), "n = 3, m = 0");
    Plan plan = model.plan().set(n, 1).set(m, 1).evaluate();
    assertEquals(2, lowered.qubo().value(lowered.complete(plan)));
  }

  @Test
  void ordersAreFaithful() {
    Order<Integer> order = model.order("visits", List.of(0, 1, 2, 3));
    model.minimize("way", order.stepCost((a, b) -> (a * 7 + b * 3) % 5));
    Lowered lowered = Lowering.standard().lower(model);
    assertEquals(16, lowered.decisionBits());
    LoweringAudit.exhaustive(lowered).orThrow();
  }

  @Test
  void partialOrdersAndSubsetsAreFaithful() {
    Order<Integer> order = model.order("podium", List.of(1, 2, 3), 2);
    Subset<String> subset = model.subset("tools", List.of("saw", "axe", "file"));
    model.require("two tools", subset.size().exactly(2));
    model.require("saw first", subset.contains("saw").implies(order.first(3)));
    model.maximize("win", order.placeOf(3).times(3).plus(subset.contains("saw").times(2)));
    Lowered lowered = Lowering.standard().lower(model);
    LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
    report.orThrow();
    assertEquals(3, report.optimum().orElseThrow());
    Plan plan =
        model.plan().set(order, List.of(1, 3)).set(subset, Set.of("axe", "file")).evaluate();
    assertEquals(-3, lowered.qubo().value(lowered.complete(plan)));
  }
}
