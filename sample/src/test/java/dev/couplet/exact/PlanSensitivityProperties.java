package dev.couplet.exact;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.Sensitivity.Coefficient;
import dev.couplet.exact.Sensitivity.Limit;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Literal;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

/** What is said to be within reach is tried: the number is moved, and the model solved again. */
class PlanSensitivityProperties {
  private static final Effort EFFORT = Effort.draws(1);
  private static final double BIT = 0.25;

  /** A random model of whole numbers, some of which are moved. */
  private static final class Moved {
    final List<Literal> literals = new ArrayList<>();
    final double[] costs;
    final double[][] loads;
    final double[] lowest;
    final double[] highest;
    final boolean maximises;

    Moved(SplittableRandom random) {
      costs = random.ints(7, -9, 10).filter(c -> c != 0).asDoubleStream().toArray();
      loads = new double[2][];
      lowest = new double[2];
      highest = new double[2];
      for (int r = 0; r < 2; r++) {
        loads[r] = random.ints(7, -3, 6).asDoubleStream().toArray();
        lowest[r] = random.nextInt(-3, 2);
        highest[r] = lowest[r] + random.nextInt(1, 6);
      }
      maximises = random.nextBoolean();
    }

    Model model() {
      Model model = Model.named("moved");
      literals.clear();
      for (int b = 0; b < 4; b++) {
        literals.add(model.bit("bit " + b));
      }
      Choice<Integer> choice = model.choice("choice", List.of(0, 1, 2));
      choice.options().forEach(option -> literals.add(choice.is(option)));
      for (int r = 0; r < 2; r++) {
        model.require("rule " + r, sum(loads[r]).between(lowest[r], highest[r]));
      }
      List<Expr> parts = new ArrayList<>();
      for (int k = 0; k < costs.length; k++) {
        parts.add(product(k).times(costs[k]));
      }
      if (maximises) {
        model.maximize("objective", Expr.sum(parts));
      } else {
        model.minimize("objective", Expr.sum(parts));
      }
      return model;
    }

    private Expr product(int k) {
      return k < 4 ? literals.get(k) : literals.get(k).times(literals.get(k - 4));
    }

    private Expr sum(double[] own) {
      List<Expr> parts = new ArrayList<>();
      for (int k = 0; k < own.length; k++) {
        parts.add(literals.get(k).times(own[k]));
      }
      return Expr.sum(parts);
    }
  }

  private static Optional<Plan> best(Model model) {
    Vigil vigil = Vigil.begin(EFFORT, Watch.none());
    return PlanEnumeration.standard().search(model.snapshot(), vigil).best();
  }

  /** Whether the plan's literals are a feasible plan of another model, and an optimal one. */
  private static boolean optimal(Plan plan, Model model) {
    Plan own = model.snapshot().plan(plan.literals());
    return own.feasible() && own.value() == best(model).orElseThrow().value();
  }

  private static Optional<Moved> feasible(long seed) {
    try {
      Moved moved = new Moved(new SplittableRandom(seed));
      return best(moved.model()).map(plan -> moved);
    } catch (IllegalArgumentException noPlanKeepsARule) {
      return Optional.empty();
    }
  }

  private static Sensitivity of(Moved moved) {
    return PlanSensitivity.standard()
        .of(moved.model().snapshot(), EFFORT, Watch.none())
        .orElseThrow();
  }

  @Property(tries = 300)
  void coefficientsMayMoveSoFar(@ForAll long seed) {
    Optional<Moved> feasible = feasible(seed);
    if (feasible.isEmpty()) {
      return;
    }
    Moved moved = feasible.get();
    Sensitivity sensitivity = of(moved);
    assertEquals(moved.costs.length, sensitivity.coefficients().size());
    for (int k = 0; k < moved.costs.length; k++) {
      Coefficient own = sensitivity.coefficients().get(k);
      assertEquals(moved.costs[k], own.value());
      moves(moved, k, own.rise(), 1, sensitivity.plan());
      moves(moved, k, own.fall(), -1, sensitivity.plan());
    }
  }

  private static void moves(Moved moved, int k, double by, int direction, Plan plan) {
    double before = moved.costs[k];
    moved.costs[k] = before + direction * (by == Double.POSITIVE_INFINITY ? 1000.5 : by);
    assertTrue(optimal(plan, moved.model()), "within reach");
    if (by != Double.POSITIVE_INFINITY) {
      moved.costs[k] = before + direction * (by + BIT);
      assertTrue(!optimal(plan, moved.model()), "out of reach");
    }
    moved.costs[k] = before;
  }

  @Property(tries = 300)
  void limitsMayMoveSoFar(@ForAll long seed) {
    Optional<Moved> feasible = feasible(seed);
    if (feasible.isEmpty()) {
      return;
    }
    Moved moved = feasible.get();
    Sensitivity sensitivity = of(moved);
    for (Limit limit : sensitivity.limits()) {
      int r = limit.rule().equals("rule 0") ? 0 : 1;
      double[] limits = limit.upper() ? moved.highest : moved.lowest;
      int outward = limit.upper() ? 1 : -1;
      double before = limits[r];
      limits[r] = before - outward * limit.tighter();
      assertTrue(optimal(sensitivity.plan(), moved.model()), "tighter, within reach");
      boolean open = limit.looser() == Double.POSITIVE_INFINITY;
      limits[r] = before + outward * (open ? 1000 : limit.looser() - BIT);
      assertTrue(optimal(sensitivity.plan(), moved.model()), "looser, within reach");
      if (!open) {
        limits[r] = before + outward * limit.looser();
        assertTrue(!optimal(sensitivity.plan(), moved.model()), "looser, a better plan");
      }
      limits[r] = before;
    }
  }

  @Example
  void tooManyPlansAreRefused() {
    Model model = Model.named("many");
    List<Bit> bits = new ArrayList<>();
    for (int b = 0; b < 20; b++) {
      bits.add(model.bit("bit " + b));
    }
    model.minimize("sum", Expr.sum(bits));
    assertThrows(
        IllegalArgumentException.class,
        () -> PlanSensitivity.standard().of(model.snapshot(), EFFORT, Watch.none()));
  }
}
