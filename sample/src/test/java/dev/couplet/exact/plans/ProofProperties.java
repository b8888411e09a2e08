package dev.couplet.exact.plans;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.RandomModels;
import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.exact.plans.PlanSearch.Found;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Watch;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

/** Proofs are replayed by a checker that shares no code with the search, and none that is false. */
class ProofProperties {
  private record Proved(Statement statement, Found found, List<String> lines) {
    double value() {
      return found.best().map(Plan::value).orElse(Double.POSITIVE_INFINITY);
    }

    boolean checked(List<String> given) {
      try {
        return ProofChecker.proves(statement, given, value());
      } catch (AssertionError doesNotFollow) {
        return false;
      }
    }
  }

  private static Proved proved(Statement statement) {
    List<String> lines = new ArrayList<>();
    PlanSearch search = PlanSearch.standard().proof(lines::add);
    Found found = search.search(statement, Optional.empty(), Effort.draws(1), Watch.none());
    assertTrue(found.complete());
    return new Proved(statement, found, lines);
  }

  private static void holds(Statement statement) {
    Proved proved = proved(statement);
    assertTrue(ProofChecker.proves(statement, proved.lines(), proved.value()));
    List<String> cutShort = proved.lines().subList(0, proved.lines().size() - 1);
    assertFalse(proved.checked(cutShort), "not closed");
    int last = -1;
    for (int k = 0; k < proved.lines().size(); k++) {
      last = proved.lines().get(k).startsWith("plan ") ? k : last;
    }
    if (last >= 0) {
      List<String> without = new ArrayList<>(proved.lines());
      without.remove(last);
      assertFalse(proved.checked(without), "without its best plan");
    }
  }

  @Property(tries = 400)
  void proofsOfRandomModelsHold(@ForAll Regime regime, @ForAll long seed) {
    Statement statement = RandomModels.of(regime, seed).snapshot();
    boolean simple = statement.objective().degree() <= 2;
    for (var rule : statement.rules()) {
      simple &= rule.required() && rule.parts().stream().allMatch(p -> p.terms().degree() <= 1);
    }
    if (simple && regime != Regime.DECIMAL) {
      holds(statement);
    } else if (regime != Regime.DECIMAL) {
      assertThrows(IllegalArgumentException.class, () -> proved(statement));
    }
  }

  /** A rule that a sum is odd, of which one literal is open. */
  @Example
  void proofsOfRulesInStepsHold() {
    holds(RandomModels.of(Regime.LOGIC, 8545519).snapshot());
  }

  @Property(tries = 60)
  void proofsOfAssignmentsHold(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    double[][] profits = new double[2][];
    double[][] loads = new double[2][];
    for (int agent = 0; agent < 2; agent++) {
      profits[agent] = random.ints(6, 1, 30).asDoubleStream().toArray();
      loads[agent] = random.ints(6, 1, 12).asDoubleStream().toArray();
    }
    double[] capacities = {random.nextInt(8, 25), random.nextInt(8, 25)};
    Model model;
    try {
      model = Problems.assignment(profits, loads, capacities);
    } catch (IllegalArgumentException noPlanKeepsARule) {
      return;
    }
    holds(model.snapshot());
  }

  @Example
  void proofsOfToursAndColouringsHold() {
    long[][] distances = {
      {0, 3, 9, 4, 7}, {3, 0, 5, 8, 2}, {9, 5, 0, 6, 1}, {4, 8, 6, 0, 5}, {7, 2, 1, 5, 0}
    };
    holds(Problems.tour(distances).snapshot());
    boolean[][] cycle = new boolean[5][5];
    for (int v = 0; v < 5; v++) {
      cycle[v][(v + 1) % 5] = true;
      cycle[(v + 1) % 5][v] = true;
    }
    holds(Problems.colouring(cycle, 2).snapshot());
    holds(Problems.colouring(cycle, 3).snapshot());
    holds(Problems.clique(cycle).snapshot());
  }

  @Example
  void aBoundThatIsTooHighIsFoundOut() {
    Model model = Model.named("three choices");
    List<Expr> parts = new ArrayList<>();
    List<Choice<Integer>> choices = new ArrayList<>();
    for (int d = 0; d < 4; d++) {
      Choice<Integer> choice = model.choice("choice " + d, List.of(0, 1, 2));
      for (Choice<Integer> other : choices) {
        for (int k = 0; k < 3; k++) {
          parts.add(choice.is(k).times(other.is(k)).times(1 + (5 * d + 3 * k) % 7));
        }
      }
      choices.add(choice);
    }
    model.minimize("sum", Expr.sum(parts));
    Proved proved = proved(model.snapshot());
    assertTrue(proved.checked(proved.lines()));
    List<String> changed = new ArrayList<>(proved.lines());
    int tampered = 0;
    for (int k = 0; k < changed.size(); k++) {
      if (changed.get(k).startsWith("close cost") || changed.get(k).startsWith("skip")) {
        List<String> one = new ArrayList<>(changed);
        one.removeAll(changed.subList(0, k).stream().filter(l -> l.startsWith("shift")).toList());
        tampered += proved.checked(one) ? 0 : 1;
      }
    }
    assertTrue(tampered > 0, "bounds need their shifts");
    assertEquals(proved.value(), proved.found().bound());
  }
}
