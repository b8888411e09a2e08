package dev.couplet.lower;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Count;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import org.junit.jupiter.api.Test;

/** Counts that are the largest or smallest of expressions, against those worked out in the test. */
class ExtremeTest {
  @Property(tries = 60)
  void theExtremeOfRandomExpressions(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Model model = Model.named("extremes");
    List<Bit> bits = List.copyOf(model.bits("b", List.of(0, 1, 2)).decisions());
    int[][] factors = new int[1 + random.nextInt(3)][4];
    List<Expr> exprs = new ArrayList<>();
    for (int[] row : factors) {
      for (int k = 0; k < row.length; k++) {
        row[k] = random.nextInt(5) - 2;
      }
      Expr sum = sum(bits, bit -> bit.times(row[bits.indexOf(bit)]));
      exprs.add(sum.plus(row[3]));
    }
    boolean largest = random.nextBoolean();
    Count count = largest ? model.largest("top", exprs) : model.smallest("top", exprs);
    if (random.nextBoolean()) {
      model.minimize("objective", count.plus(bits.get(0).times(random.nextInt(3))));
    } else {
      model.maximize("objective", count.times(2).minus(bits.get(1)));
    }
    double best = Double.NEGATIVE_INFINITY;
    int sign = model.snapshot().sense().sign();
    for (int pattern = 0; pattern < 8; pattern++) {
      Plan.Draft draft = model.plan();
      int expected = largest ? Integer.MIN_VALUE : Integer.MAX_VALUE;
      for (int[] row : factors) {
        int value = row[3];
        for (int k = 0; k < 3; k++) {
          value += (pattern >> k & 1) * row[k];
        }
        expected = largest ? Math.max(expected, value) : Math.min(expected, value);
      }
      for (int k = 0; k < 3; k++) {
        draft.set(bits.get(k), (pattern >> k & 1) != 0);
      }
      Plan plan = draft.evaluate();
      assertEquals(expected, plan.value(count), model.describe());
      assertTrue(plan.feasible(), plan.toString());
      best = Math.max(best, -sign * plan.value());
      for (long wrong = count.lowest(); wrong <= count.highest(); wrong++) {
        assertEquals(wrong == expected, draft.set(count, wrong).evaluate().feasible());
      }
    }
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(model));
    report.orThrow();
    assertEquals(-sign * best, report.optimum().orElseThrow());
  }

  /** Five jobs of 3, 3, 2, 2, 2 on two machines: 6 is half of the sum. */
  @Test
  void aMakespan() {
    Model model = Model.named("machines");
    List<Integer> jobs = List.of(3, 3, 2, 2, 2);
    Family<Integer, Bit> second = model.bits("second machine", List.of(0, 1, 2, 3, 4));
    Expr there = sum(List.of(0, 1, 2, 3, 4), j -> second.of(j).times(jobs.get(j)));
    Expr here = sum(List.of(0, 1, 2, 3, 4), j -> second.of(j).not().times(jobs.get(j)));
    Count end = model.ceiling("end", List.of(here, there));
    model.minimize("end of all", end);
    assertEquals(12, end.highest());
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(model));
    report.orThrow();
    assertEquals(6, report.optimum().orElseThrow());
    Plan.Draft draft = model.plan();
    second.decisions().forEach(bit -> draft.set(bit, false));
    assertEquals(12, draft.evaluate().value());
    assertFalse(draft.set(end, 11).evaluate().feasible());
  }

  @Test
  void ofChoicesAndCounts() {
    Model model = Model.named("mixed");
    Choice<Integer> choice = model.choice("c", List.of(1, 4, 6));
    Count count = model.count("n", -2, 5);
    Count low = model.smallest("low", List.of(choice.lookUp(c -> c), count));
    assertEquals(-2, low.lowest());
    assertEquals(5, low.highest());
    assertEquals(4, model.plan().set(choice, 4).set(count, 5).evaluate().value(low));
    model.maximize("low", low);
    LoweringAudit.Report report = LoweringAudit.exhaustive(Lowering.standard().lower(model));
    report.orThrow();
    assertEquals(5, report.optimum().orElseThrow());
    IllegalStateException open =
        assertThrows(IllegalStateException.class, () -> model.plan().set(choice, 1).evaluate());
    assertTrue(open.getMessage().contains("'n' is not set"), open.getMessage());
  }

  @Test
  void mistakesAreRefused() {
    Model model = Model.named("m");
    Bit a = model.bit("a");
    Bit foreign = Model.named("other").bit("a");
    refused(() -> model.largest("top", List.of()), "'top'", "no expressions");
    refused(() -> model.largest("top", List.of(a.times(0.5))), "'top'", "0.5", "times(100)");
    refused(() -> model.smallest("top", List.of(a, foreign)), "'other'");
    refused(() -> model.largest("top", List.of(a.times(0x1p52))), "'top'", "2^51");
    refused(() -> model.largest("a", List.of(a, a.not())), "'a'", "already");
    assertEquals(1, model.snapshot().decisions().size());
    assertEquals(0, model.snapshot().rules().size());
  }

  private static void refused(Runnable call, String... words) {
    IllegalArgumentException refusal = assertThrows(IllegalArgumentException.class, call::run);
    for (String word : words) {
      assertTrue(refusal.getMessage().contains(word), refusal.getMessage());
    }
  }
}
