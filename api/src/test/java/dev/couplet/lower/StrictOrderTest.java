package dev.couplet.lower;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement.Objective;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import org.junit.jupiter.api.Test;

/** Objectives in strict order, against plans compared objective by objective. */
class StrictOrderTest {
  /** Bits and one choice, up to three objectives, a wish; coefficients are hundredths of units. */
  private static final class Drawn {
    final Model model = Model.named("ordered");
    final List<Bit> bits = new ArrayList<>();
    final Choice<Integer> choice = model.choice("c", List.of(0, 1, 2));
    final List<Objective> objectives = new ArrayList<>();
    final SplittableRandom random;
    final boolean maximise;

    Drawn(long seed) {
      random = new SplittableRandom(seed);
      maximise = random.nextBoolean();
      for (int k = 0; k < 2 + random.nextInt(4); k++) {
        bits.add(model.bit("b" + k));
      }
      model.strictOrder();
      int count = 1 + random.nextInt(3);
      for (int k = 0; k < count; k++) {
        Expr terms = terms().plus(random.nextInt(3));
        String name = "objective " + k;
        objectives.add(maximise ? model.maximize(name, terms) : model.minimize(name, terms));
      }
      if (random.nextBoolean()) {
        model.prefer("wish", sum(bits).atMost(1), (1 + random.nextInt(400)) / 100.0);
      }
      if (random.nextBoolean()) {
        model.require("rule", sum(bits).plus(choice.is(1)).atLeast(1));
      }
    }

    private Expr terms() {
      List<Expr> terms = new ArrayList<>();
      int unit = random.nextBoolean() ? 100 : 1 + random.nextInt(50);
      for (int t = 0; t < 1 + random.nextInt(5); t++) {
        Bit bit = bits.get(random.nextInt(bits.size()));
        Expr product = random.nextBoolean() ? bit.times(choice.is(random.nextInt(3))) : bit;
        terms.add(product.times(unit * (random.nextInt(9) - 4) / 100.0));
      }
      return sum(terms);
    }

    List<Plan> plans() {
      List<Plan> plans = new ArrayList<>();
      for (int pattern = 0; pattern < 3 << bits.size(); pattern++) {
        Plan.Draft draft = model.plan().set(choice, pattern % 3);
        for (int k = 0; k < bits.size(); k++) {
          draft.set(bits.get(k), (pattern / 3 >> k & 1) != 0);
        }
        plans.add(draft.evaluate());
      }
      return plans;
    }

    /**
     * In hundredths, which are whole numbers: each objective, the last one with the wish's cost.
     */
    private long[] values(Plan plan) {
      long[] values = new long[objectives.size()];
      for (int k = 0; k < values.length; k++) {
        double own = plan.value(objectives.get(k));
        double cost = plan.unmet().stream().mapToDouble(one -> one.cost()).sum();
        double signed = (maximise ? -own : own) + (k == values.length - 1 ? cost : 0);
        values[k] = Math.round(signed * 100);
      }
      return values;
    }

    int compare(Plan left, Plan right) {
      long[] a = values(left);
      long[] b = values(right);
      for (int k = 0; k < a.length; k++) {
        if (a[k] != b[k]) {
          return Long.compare(a[k], b[k]);
        }
      }
      return 0;
    }
  }

  @Property(tries = 200)
  void valuesOrderPlansAsTheObjectivesDoOneByOne(@ForAll long seed) {
    Drawn drawn = new Drawn(seed);
    List<Plan> plans = drawn.plans();
    int sign = drawn.maximise ? -1 : 1;
    for (Plan plan : plans) {
      int asValues =
          Math.abs(plan.value() - plans.get(0).value()) < 1e-6
              ? 0
              : Double.compare(sign * plan.value(), sign * plans.get(0).value());
      assertEquals(drawn.compare(plan, plans.get(0)), asValues, () -> drawn.model.describe());
    }
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(drawn.model));
    report.orThrow();
    Plan best =
        plans.stream()
            .filter(Plan::feasible)
            .min(Comparator.comparing(p -> p, drawn::compare))
            .get();
    assertEquals(best.value(), report.optimum().orElseThrow(), 1e-6);
  }

  @Test
  void eachObjectiveIsToldInItsOwnUnits() {
    Model model = Model.named("m");
    Bit a = model.bit("a");
    Bit b = model.bit("b");
    model.strictOrder();
    Objective first = model.maximize("first", a.times(0.5).plus(b.times(1.5)).plus(7));
    Objective second = model.maximize("second", a.times(100).minus(b.times(20)));
    Plan plan = model.plan().set(a, true).set(b, true).evaluate();
    assertEquals(9, plan.value(first));
    assertEquals(80, plan.value(second));
    assertEquals(4 * 121 + 80, plan.value(), "4 steps of 0.5, each worth more than 120");
    assertEquals(9, plan.number(a.times(0.5).plus(b.times(1.5)).plus(7)));
    assertTrue(model.describe().contains("maximize in strict order first: "), model.describe());
    Model other = Model.named("other");
    Objective foreign = other.minimize("third", other.bit("x"));
    assertThrows(IllegalArgumentException.class, () -> plan.value(foreign));
  }

  @Test
  void withoutItObjectivesAddUp() {
    Model model = Model.named("m");
    Bit a = model.bit("a");
    model.minimize("first", a);
    model.minimize("second", a.times(-5));
    assertEquals(-4, model.plan().set(a, true).evaluate().value());
    assertFalse(model.describe().contains("strict"));
    model.strictOrder();
    assertEquals(6 - 5, model.plan().set(a, true).evaluate().value());
  }

  @Test
  void ordersBeyondExactNumbersAreRefused() {
    Model model = Model.named("m");
    Bit a = model.bit("a");
    Bit b = model.bit("b");
    model.minimize("first", a.plus(b));
    model.minimize("second", a.times(0x1p30).plus(b));
    model.minimize("third", a.times(0x1p30).plus(b));
    assertEquals(0x1p31 + 2, model.plan().set(a, true).set(b, true).evaluate().value() - 2);
    model.strictOrder();
    IllegalArgumentException refusal =
        assertThrows(IllegalArgumentException.class, () -> model.snapshot());
    for (String word : List.of("'second'", "'third'", "strictly before", "larger units")) {
      assertTrue(refusal.getMessage().contains(word), refusal.getMessage());
    }
  }
}
