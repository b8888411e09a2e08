package dev.couplet.exact.plans;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.RandomModels;
import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.exact.PlanEnumeration;
import dev.couplet.exact.plans.PlanSearch.Found;
import dev.couplet.model.Choice;
import dev.couplet.model.Condition;
import dev.couplet.model.Expr;
import dev.couplet.model.Literal;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import java.util.function.Predicate;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class PlanSearchProperties {
  private static final Effort EFFORT = Effort.draws(1);

  private static Optional<Plan> byEveryPlan(Statement statement) {
    Vigil vigil = Vigil.begin(EFFORT, Watch.none());
    return PlanEnumeration.standard().search(statement, vigil).best();
  }

  private static Found searched(PlanSearch method, Statement statement, Optional<Plan> start) {
    return method.search(statement, start, EFFORT, Watch.none());
  }

  /** Values of decimals are sums of doubles, in another order for another plan. */
  private static double close(Plan plan) {
    return 1e-12 * (1 + Math.abs(plan.value()));
  }

  @Property(tries = 3000)
  void findsWhatEnumerationFinds(@ForAll Regime regime, @ForAll long seed) {
    Statement statement = RandomModels.of(regime, seed).snapshot();
    Plan expected = byEveryPlan(statement).orElseThrow();
    Found found = searched(PlanSearch.standard(), statement, Optional.empty());
    assertTrue(found.complete());
    Plan best = found.best().orElseThrow();
    assertTrue(best.feasible());
    double close = regime == Regime.DECIMAL ? close(expected) : 0;
    assertEquals(expected.value(), best.value(), close);
    assertEquals(best.value(), found.bound(), "what is proved is the value");
  }

  @Property(tries = 1000)
  void boundsHoldWhereverTheSearchIsCutShort(
      @ForAll Regime regime,
      @ForAll long seed,
      @ForAll @IntRange(min = 1, max = 12) int nodes,
      @ForAll boolean started) {
    Statement statement = RandomModels.of(regime, seed).snapshot();
    Plan expected = byEveryPlan(statement).orElseThrow();
    Optional<Plan> start = started ? Optional.of(expected) : Optional.empty();
    Found found = searched(PlanSearch.standard().nodes(nodes), statement, start);
    int sign = statement.sense().sign();
    assertTrue(sign * found.bound() <= sign * expected.value() + close(expected));
    if (found.best().isPresent()) {
      assertTrue(sign * found.best().get().value() >= sign * expected.value() - close(expected));
      assertTrue(sign * found.bound() <= sign * found.best().get().value());
    }
    assertTrue(found.nodes() <= nodes);
    assertTrue(!started || found.best().isPresent(), "the plan to start from is kept");
  }

  /**
   * What a search adds up on its way, through all its moves of costs, is what the plan is worth.
   */
  @Property(tries = 500)
  void costsArriveWhole(@ForAll Regime regime, @ForAll long seed) {
    Statement statement = RandomModels.of(regime, seed).snapshot();
    Vigil vigil = Vigil.begin(EFFORT, Watch.none());
    Network network = NetworkBuilder.of(statement, rule -> true);
    Best best = new Best(statement, network, ProofLog.NONE, OptionalDouble.empty(), vigil);
    Branching branching =
        new Branching(network, Interchange.none(network.variables), best, ProofLog.NONE, vigil);
    Partial root = new Partial(network);
    assertTrue(branching.begin(root, 3) && branching.multipliers().run(root, 5), "there is a plan");
    long lowest = branching.walk(root, Long.MAX_VALUE);
    assertEquals(best.cost(), lowest);
    Plan plan = best.plan().orElseThrow();
    assertEquals(plan.value(), best.inOwnSense(best.cost()), close(plan));
  }

  /** Two or three literals of each rule must not hold together; many of these have no plan. */
  @Property(tries = 500)
  void agreesWhereRulesMayContradict(@ForAll long seed) {
    Statement statement = contradictory(new SplittableRandom(seed)).snapshot();
    Optional<Plan> expected = byEveryPlan(statement);
    Found found = searched(PlanSearch.standard(), statement, Optional.empty());
    assertTrue(found.complete());
    assertEquals(expected.map(Plan::value), found.best().map(Plan::value));
    assertTrue(expected.isPresent() || found.bound() == Double.POSITIVE_INFINITY);
  }

  /** Left to themselves the rules have no plan, and with one fewer they have, if it says so. */
  @Property(tries = 300)
  void conflictsAreConflicts(@ForAll long seed) {
    Statement statement = contradictory(new SplittableRandom(seed)).snapshot();
    Optional<Conflict> conflict = PlanSearch.standard().conflict(statement, EFFORT, Watch.none());
    assertEquals(byEveryPlan(statement).isEmpty(), conflict.isPresent());
    if (conflict.isPresent()) {
      List<String> rules = conflict.get().rules();
      assertTrue(conflict.get().minimal());
      assertTrue(byEveryPlan(contradictory(new SplittableRandom(seed), rules::contains)).isEmpty());
      for (String rule : rules) {
        Predicate<String> others = name -> rules.contains(name) && !name.equals(rule);
        assertTrue(byEveryPlan(contradictory(new SplittableRandom(seed), others)).isPresent());
      }
    }
  }

  /** Options in one order or another: what is alike must not change what is found. */
  @Property(tries = 500)
  void findsTheSameWhereOptionsAreAlike(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Model model = Model.named("alike");
    int options = 2 + random.nextInt(3);
    List<Choice<Integer>> choices = new ArrayList<>();
    for (int d = 0; d < 3 + random.nextInt(3); d++) {
      choices.add(model.choice("choice " + d, Problems.upTo(options)));
    }
    int different = random.nextInt(3) == 0 ? random.nextInt(options) : -1;
    int most = 1 + random.nextInt(3);
    for (int option : Problems.upTo(options)) {
      Expr load = Expr.sum(choices, choice -> choice.is(option));
      model.require("load " + option, load.atMost(option == different ? most + 1 : most + 0.5));
    }
    List<Expr> parts = new ArrayList<>();
    for (int a = 0; a < choices.size(); a++) {
      for (int b = 0; b < a; b++) {
        int cost = random.nextInt(-3, 4);
        Choice<Integer> one = choices.get(a);
        Choice<Integer> other = choices.get(b);
        Problems.upTo(options).forEach(k -> parts.add(one.is(k).times(other.is(k)).times(cost)));
      }
    }
    model.maximize("sum", Expr.sum(parts));
    Optional<Plan> expected = byEveryPlan(model.snapshot());
    Found found = searched(PlanSearch.standard(), model.snapshot(), Optional.empty());
    assertTrue(found.complete());
    assertEquals(expected.map(Plan::value), found.best().map(Plan::value));
    boolean some = options > 2 || different < 0;
    assertEquals(some, !found.alike().isEmpty(), found.alike() + " of " + options);
  }

  private static Model contradictory(SplittableRandom random) {
    return contradictory(random, name -> true, "contradictory");
  }

  private static Statement contradictory(SplittableRandom random, Predicate<String> kept) {
    return contradictory(random, kept, "fewer rules").snapshot();
  }

  private static Model contradictory(SplittableRandom random, Predicate<String> kept, String name) {
    Model model = Model.named(name);
    List<Literal> literals = new ArrayList<>();
    for (int d = 0; d < 3 + random.nextInt(3); d++) {
      var choice = model.choice("choice " + d, List.of(0, 1, 2));
      choice.options().forEach(option -> literals.add(choice.is(option)));
    }
    for (int r = 0; r < 4 + random.nextInt(16); r++) {
      Literal one = literals.get(random.nextInt(literals.size()));
      Literal other = literals.get(random.nextInt(literals.size()));
      Literal third = literals.get(random.nextInt(literals.size()));
      Condition condition =
          random.nextBoolean()
              ? one.plus(other).atMost(1)
              : one.times(2).plus(other).plus(third).between(1, 2);
      try {
        if (kept.test("rule " + r)) {
          model.require("rule " + r, condition);
        }
      } catch (IllegalArgumentException noPlanKeepsIt) {
        continue;
      }
    }
    model.minimize("first ones", literals.get(0).plus(literals.get(4).times(3)));
    return model;
  }
}
