package dev.couplet.exact;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.State;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Decision;
import dev.couplet.model.Expr;
import dev.couplet.model.Literal;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.Size;

class PlanEnumerationProperties {
  /** Independent twin: every pattern of the literals, those kept that are plans at all. */
  private static Optional<Plan> byPatterns(Statement statement) {
    Optional<Plan> best = Optional.empty();
    for (long pattern = 0; pattern < 1L << statement.literals(); pattern++) {
      Plan plan = statement.plan(State.ofWords(statement.literals(), pattern));
      if (plan.feasible() && (best.isEmpty() || plan.compareTo(best.get()) < 0)) {
        best = Optional.of(plan);
      }
    }
    return best;
  }

  @Property(tries = 300)
  void findsTheBestOfAllPatterns(@ForAll long seed) {
    Statement statement = randomModel(new SplittableRandom(seed)).snapshot();
    PlanEnumeration.Found found =
        PlanEnumeration.standard().search(statement, Vigil.begin(Effort.draws(1), Watch.none()));
    Optional<Plan> expected = byPatterns(statement);
    assertTrue(found.complete());
    assertEquals(PlanEnumeration.standard().plans(statement), found.looked());
    assertEquals(expected.isPresent(), found.best().isPresent());
    expected.ifPresent(plan -> assertEquals(plan.value(), found.best().get().value()));
  }

  @Property(tries = 100)
  void theWalkVisitsEveryTupleOnceAndMovesOneDigitByOne(
      @ForAll @Size(max = 5) List<@IntRange(min = 2, max = 5) Integer> radices) {
    int[] radix = radices.stream().mapToInt(Integer::intValue).toArray();
    MixedRadix walk = new MixedRadix(radix);
    long expected = radices.stream().mapToLong(Integer::longValue).reduce(1, (a, b) -> a * b);
    List<Integer> before = tuple(walk, radix.length);
    Set<List<Integer>> seen = new HashSet<>(Set.of(before));
    for (int moved = walk.step(); moved >= 0; moved = walk.step()) {
      List<Integer> now = tuple(walk, radix.length);
      for (int d = 0; d < radix.length; d++) {
        int distance = Math.abs(now.get(d) - before.get(d));
        assertEquals(d == moved ? 1 : 0, distance);
      }
      assertTrue(seen.add(now), "a tuple comes twice");
      before = now;
    }
    assertEquals(expected, seen.size());
  }

  private static List<Integer> tuple(MixedRadix walk, int digits) {
    List<Integer> tuple = new ArrayList<>();
    for (int d = 0; d < digits; d++) {
      tuple.add(walk.digit(d));
    }
    return tuple;
  }

  private static Model randomModel(SplittableRandom random) {
    Model model = Model.named("random");
    List<Literal> literals = new ArrayList<>();
    int decisions = 1 + random.nextInt(5);
    for (int d = 0; d < decisions; d++) {
      if (random.nextBoolean()) {
        Bit bit = model.bit("bit " + d);
        literals.add(bit);
        literals.add(bit.not());
      } else {
        List<Integer> options = new ArrayList<>();
        for (int k = 0; k <= random.nextInt(3); k++) {
          options.add(k);
        }
        Choice<Integer> choice = model.choice("choice " + d, options);
        options.forEach(option -> literals.add(choice.is(option)));
      }
    }
    boolean decimals = random.nextBoolean();
    for (int r = 0; r < random.nextInt(4); r++) {
      Expr expr = expression(random, literals, decimals);
      double limit = random.nextInt(-4, 5);
      try {
        if (random.nextBoolean()) {
          model.require("rule " + r, expr.atMost(limit));
        } else {
          model.prefer("rule " + r, expr.atLeast(limit), random.nextInt(4) / 2.0);
        }
      } catch (IllegalArgumentException noPlanKeepsIt) {
        continue;
      }
    }
    Expr objective = expression(random, literals, decimals);
    if (random.nextBoolean()) {
      model.minimize("objective", objective);
    } else {
      model.maximize("objective", objective);
    }
    for (Decision decision : model.snapshot().decisions()) {
      assertTrue(decision.values() >= 1);
    }
    return model;
  }

  private static Expr expression(
      SplittableRandom random, List<Literal> literals, boolean decimals) {
    Expr sum = Expr.constant(random.nextInt(-2, 3));
    for (int t = 0; t < 1 + random.nextInt(6); t++) {
      Expr product = Expr.constant(1);
      for (int f = 0; f <= random.nextInt(3); f++) {
        product = product.times(literals.get(random.nextInt(literals.size())));
      }
      double factor = random.nextInt(-5, 6) / (decimals ? 10.0 : 1.0);
      sum = sum.plus(product.times(factor));
    }
    return sum;
  }
}
