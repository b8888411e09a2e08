package dev.couplet.lower;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.audit.RandomModels;
import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.form.State;
import dev.couplet.lower.Lowered.Weight;
import dev.couplet.model.Bit;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import java.util.List;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class IncumbentBoundTest {
  private final Model model = Model.named("rounds");
  private final Bit a = model.bit("a");
  private final Bit b = model.bit("b");
  private final Bit c = model.bit("c");

  private static void refused(Executable call, String... words) {
    IllegalArgumentException refusal = assertThrows(IllegalArgumentException.class, call);
    for (String word : words) {
      assertTrue(refusal.getMessage().contains(word), refusal.getMessage());
    }
  }

  @Test
  void theWeightIsJustAboveWhatCouldBeWon() {
    model.require("two", sum(a, b, c).exactly(2));
    model.maximize("gain", sum(a.times(5), b.times(4), c.times(1)));
    model.prefer("no a", a.isFalse(), 2);
    // The lowest energy is -10; the plan a, b is worth 9 - 2 = 7, b, c is worth 5.
    Plan good = model.plan().set(a, true).set(b, true).set(c, false).evaluate();
    Plan poor = model.plan().set(a, false).set(b, true).set(c, true).evaluate();
    Weight withGood = lower(good).weights().get(0);
    assertEquals(4, withGood.value());
    assertEquals(
        "above 3, all that can be won over a known plan: -10 at the least, -7 as it is",
        withGood.reason());
    assertEquals(6, lower(poor).weights().get(0).value());
    assertEquals(13, Lowering.standard().lower(model).weights().get(0).value());
    LoweringAudit.exhaustive(lower(good)).orThrow();
  }

  private Lowered lower(Plan plan) {
    return Lowering.standard().with(Weights.incumbentBound(plan)).lower(model);
  }

  /** Any feasible plan will do, the worst and the best; the lighter weights still suffice. */
  @ParameterizedTest
  @EnumSource(Regime.class)
  void sufficesWithAnyFeasiblePlan(Regime regime) {
    int tried = 0;
    for (long seed = 0; seed < 30; seed++) {
      Model random = RandomModels.of(regime, seed);
      Statement statement = random.snapshot();
      if (statement.literals() > 8) {
        continue;
      }
      tried++;
      List<Plan> feasible =
          LongStream.range(0, 1L << statement.literals())
              .mapToObj(word -> statement.plan(State.ofWords(statement.literals(), word)))
              .filter(Plan::feasible)
              .sorted()
              .toList();
      for (Plan plan : List.of(feasible.get(0), feasible.get(feasible.size() - 1))) {
        Lowered lowered = Lowering.standard().with(Weights.incumbentBound(plan)).lower(random);
        LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
        report.orThrow();
        assertEquals(feasible.size(), report.feasible());
      }
    }
    assertTrue(tried > 5, tried + " models were small enough");
  }

  @Test
  void plansThatDoNotFitAreRefused() {
    model.require("two", sum(a, b, c).exactly(2));
    Plan broken = model.plan().set(a, true).set(b, true).set(c, true).evaluate();
    refused(() -> Weights.incumbentBound(broken), "not feasible", "two: missed by 1");
    Plan good = model.plan().set(a, true).set(b, true).set(c, false).evaluate();
    Lowering lowering = Lowering.standard().with(Weights.incumbentBound(good));
    model.require("no b", b.isFalse());
    refused(() -> lowering.lower(model), "not feasible", "no b: missed by 1");
    Model other = Model.named("other");
    other.require("one", sum(other.bit("a"), other.bit("b"), other.bit("c")).exactly(1));
    refused(() -> lowering.lower(other), "rounds", "other", "evaluate it");
    model.bit("late");
    refused(() -> lowering.lower(model), "3 decisions", "4 decisions");
  }
}
