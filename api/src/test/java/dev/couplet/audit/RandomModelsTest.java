package dev.couplet.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowering;
import dev.couplet.model.Choice;
import dev.couplet.model.Model;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import dev.couplet.model.Statement.Sense;
import java.util.HashSet;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class RandomModelsTest {
  @ParameterizedTest
  @EnumSource(Regime.class)
  void sameSeedSameModel(Regime regime) {
    for (long seed = 0; seed < 20; seed++) {
      Model first = RandomModels.of(regime, seed);
      Model second = RandomModels.of(regime, seed);
      assertEquals(first.describe(), second.describe());
      assertEquals(
          Lowering.standard().lower(first).qubo(), Lowering.standard().lower(second).qubo());
    }
  }

  /** Every model has a feasible plan, so that the whole audit holds. */
  @ParameterizedTest
  @EnumSource(Regime.class)
  void smallFeasibleAndLoweredFaithfully(Regime regime) {
    Set<String> different = new HashSet<>();
    for (long seed = 0; seed < 40; seed++) {
      Model model = RandomModels.of(regime, seed);
      Lowered lowered = Lowering.standard().lower(model);
      assertTrue(lowered.decisionBits() >= 1);
      assertTrue(lowered.decisionBits() <= RandomModels.MOST_LITERALS);
      LoweringAudit.exhaustive(lowered).orThrow();
      different.add(model.describe());
    }
    assertEquals(40, different.size());
  }

  @Test
  void regimesAreWhatTheySay() {
    assertTrue(any(Regime.MIXED, s -> s.objective().degree() == 4));
    assertTrue(any(Regime.MIXED, s -> s.rules().stream().anyMatch(rule -> !rule.required())));
    assertTrue(any(Regime.MIXED, s -> s.sense() == Sense.MAXIMIZE));
    assertTrue(any(Regime.DECIMAL, s -> parts(s).anyMatch(part -> part.unit() == 0.01)));
    assertFalse(
        any(
            Regime.CHOICES,
            s -> s.literals() > 5 && s.decisions().stream().noneMatch(d -> d instanceof Choice)));
    assertTrue(any(Regime.HUGE_RANGE, s -> most(s) > 30_000));
    assertFalse(any(Regime.DENSE, s -> s.objective().degree() > 2));
    assertTrue(any(Regime.LOGIC, s -> parts(s).anyMatch(part -> part.step() == 2)));
    assertTrue(any(Regime.LOGIC, s -> s.rules().stream().anyMatch(Rule::squared)));
    assertTrue(any(Regime.LOGIC, s -> s.rules().stream().anyMatch(r -> r.parts().size() > 2)));
    assertTrue(any(Regime.LOGIC, s -> s.sense() == Sense.MAXIMIZE));
    assertFalse(any(Regime.SPARSE, s -> parts(s).anyMatch(part -> part.terms().terms() > 3)));
  }

  private static Stream<Rule.Part> parts(Statement statement) {
    return statement.rules().stream().flatMap(rule -> rule.parts().stream());
  }

  private static double most(Statement statement) {
    double[] most = {0};
    statement
        .objective()
        .forEachTerm((coefficient, literals) -> most[0] = Math.max(most[0], coefficient));
    return most[0];
  }

  private static boolean any(Regime regime, java.util.function.Predicate<Statement> property) {
    for (long seed = 0; seed < 200; seed++) {
      if (property.test(RandomModels.of(regime, seed).snapshot())) {
        return true;
      }
    }
    return false;
  }
}
