package dev.couplet.lower;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.audit.RandomModels;
import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Count;
import dev.couplet.model.Decision;
import dev.couplet.model.Model;
import dev.couplet.model.Order;
import dev.couplet.model.Plan;
import dev.couplet.model.Spin;
import dev.couplet.model.Statement;
import dev.couplet.model.Subset;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.SplittableRandom;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

/** A fixed decision is one that a rule holds at its value, at no bit. */
class FixProperties {
  @Property(tries = 200)
  void fixingIsRequiring(@ForAll long seed) {
    for (Regime regime : List.of(Regime.CHOICES, Regime.MIXED, Regime.DECIMAL)) {
      Model fixed = RandomModels.of(regime, seed);
      Model required = RandomModels.of(regime, seed);
      SplittableRandom random = new SplittableRandom(seed);
      List<Decision> here = fixed.snapshot().decisions();
      List<Decision> there = required.snapshot().decisions();
      for (int d = 0; d < here.size(); d++) {
        if (random.nextInt(3) == 0) {
          settle(fixed, here.get(d), required, there.get(d), random);
        }
      }
      double wanted = optimum(required).orElse(Double.POSITIVE_INFINITY);
      assertEquals(
          wanted, optimum(fixed).orElse(Double.POSITIVE_INFINITY), 1e-9, regime + " " + seed);
    }
  }

  private static void settle(
      Model fixed, Decision here, Model required, Decision there, SplittableRandom random) {
    if (here instanceof Bit bit) {
      boolean value = random.nextBoolean();
      fixed.fix(bit, value);
      required.require(
          "fix " + there.name(), value ? ((Bit) there).isTrue() : ((Bit) there).isFalse());
    } else {
      fix(fixed, (Choice<?>) here, required, (Choice<?>) there, random);
    }
  }

  private static <T, U> void fix(
      Model fixed, Choice<T> here, Model required, Choice<U> there, SplittableRandom random) {
    int option = random.nextInt(here.options().size());
    fixed.fix(here, here.options().get(option));
    required.require("fix " + there.name(), there.is(there.options().get(option)).isTrue());
  }

  /** Empty where no plan is feasible, whether that shows at once or by looking at all. */
  private static OptionalDouble optimum(Model model) {
    Lowered lowered;
    try {
      lowered = Lowering.standard().lower(model);
    } catch (IllegalArgumentException impossible) {
      assertTrue(impossible.getMessage().contains("can be kept by no plan"), impossible.toString());
      return OptionalDouble.empty();
    }
    LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
    if (report.feasible() > 0) {
      report.orThrow();
    }
    return report.optimum();
  }

  @Example
  void fixedDecisionsOfEveryKindTakeNoBits() {
    Model model = Model.named("house");
    Bit bit = model.bit("b");
    Spin spin = model.spin("s");
    Count count = model.count("n", -2, 5);
    Order<String> order = model.order("o", List.of("x", "y", "z"), 2);
    Subset<String> subset = model.subset("u", List.of("p", "q"));
    model.minimize("all", bit.plus(spin).plus(count).plus(order.placeOf("x")).plus(subset.size()));
    model.require("few", count.plus(subset.size()).atMost(3));
    model.fix(bit, true);
    model.fix(spin, -1);
    model.fix(count, 2);
    model.fix(order, List.of("z", "x"));
    Statement statement = model.snapshot();
    Lowered lowered = Lowering.standard().lower(statement);
    assertEquals(2, lowered.decisionBits());
    LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
    report.orThrow();
    assertEquals(1 - 1 + 2 + 1, report.optimum().orElseThrow());
    Plan plan = model.plan().set(subset, Set.of("q")).evaluate();
    assertEquals(4, plan.value());
    assertTrue(plan.feasible());
    assertEquals(2, plan.value(count));
    assertEquals(List.of("z", "x"), plan.value(order));
    assertTrue(model.describe().contains("decide n: fixed to 2"), model.describe());
    assertThrows(IllegalArgumentException.class, () -> model.plan().set(count, 3));
    model.fix(subset, Set.of("p", "q"));
    IllegalArgumentException broken =
        assertThrows(IllegalArgumentException.class, () -> Lowering.standard().lower(model));
    assertTrue(broken.getMessage().contains("rule 'few' can be kept by no plan"));
    assertThrows(IllegalArgumentException.class, () -> Model.named("other").fix(bit, true));
  }
}
