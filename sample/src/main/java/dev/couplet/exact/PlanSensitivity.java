package dev.couplet.exact;

import dev.couplet.exact.Sensitivity.Coefficient;
import dev.couplet.exact.Sensitivity.Limit;
import dev.couplet.form.State;
import dev.couplet.model.Plan;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import dev.couplet.model.Unmet;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Works out how far the numbers of a small model may move before its optimal plan changes, by
 * looking at every plan.
 *
 * <p>For a coefficient: the best plan in which its product holds, and the best in which it does
 * not, are all that can take turns. For a limit: the plans that keep every other rule, and how far
 * they lie beyond it. Time O(plans x size of the statement), memory O(terms + rules). Immutable and
 * thread-safe.
 */
public final class PlanSensitivity {
  /** The most plans that are looked at. */
  public static final long MOST_PLANS = 1L << 18;

  private PlanSensitivity() {}

  /** The method; it has no settings. */
  public static PlanSensitivity standard() {
    return new PlanSensitivity();
  }

  /**
   * The sensitivity of the optimal plan; nothing if no plan keeps all rules, or time or stop came
   * first.
   *
   * @throws IllegalArgumentException if the statement has more than {@value #MOST_PLANS} plans
   */
  public Optional<Sensitivity> of(Statement statement, Effort effort, Watch watch) {
    long plans = PlanEnumeration.standard().plans(statement);
    if (plans > MOST_PLANS) {
      throw new IllegalArgumentException(
          statement + " has " + plans + " plans, at most " + MOST_PLANS + " can be looked at");
    }
    Vigil vigil = Vigil.begin(effort, watch);
    Optional<Plan> best = PlanEnumeration.standard().search(statement, vigil).best();
    if (best.isEmpty() || vigil.over()) {
      return Optional.empty();
    }
    Table table = new Table(statement, best.get());
    boolean all = EveryPlan.of(statement, table::look, vigil);
    return all ? Optional.of(table.sensitivity()) : Optional.empty();
  }

  /** What the plans looked at so far have shown. */
  private static final class Table {
    private final Statement statement;
    private final Plan best;
    private final int sign;
    private final double cost;
    private final List<int[]> products = new ArrayList<>();
    private final List<Double> coefficients = new ArrayList<>();
    private final List<Rule> rules;

    /** The least that a plan costs where each product holds as in the best plan, and where not. */
    private final double[] otherwise;

    /** For each rule how far beyond its limits the nearest better plan lies, lower and upper. */
    private final double[][] beyond;

    Table(Statement statement, Plan best) {
      this.statement = statement;
      this.best = best;
      this.sign = statement.sense().sign();
      this.cost = sign * best.value();
      statement
          .objective()
          .forEachTerm(
              (coefficient, product) -> {
                if (product.length > 0) {
                  products.add(product);
                  coefficients.add(coefficient);
                }
              });
      this.rules =
          statement.rules().stream()
              .filter(rule -> rule.required() && rule.parts().size() == 1)
              .filter(rule -> rule.parts().get(0).step() == 1)
              .toList();
      this.otherwise = new double[products.size()];
      this.beyond = new double[rules.size()][2];
      Arrays.fill(otherwise, Double.POSITIVE_INFINITY);
      for (double[] both : beyond) {
        Arrays.fill(both, Double.POSITIVE_INFINITY);
      }
    }

    void look(Plan plan) {
      double own = sign * plan.value();
      if (plan.feasible()) {
        for (int t = 0; t < otherwise.length; t++) {
          if (holds(t, plan.literals()) != holds(t, best.literals())) {
            otherwise[t] = Math.min(otherwise[t], own);
          }
        }
      } else if (own < cost) {
        better(plan);
      }
    }

    /** A better plan that misses one required rule only says how far its limit may give way. */
    private void better(Plan plan) {
      List<Unmet> missed = plan.unmet().stream().filter(Unmet::required).toList();
      for (int r = 0; r < rules.size() && missed.size() == 1; r++) {
        Rule rule = rules.get(r);
        if (missed.get(0).rule().equals(rule.name())) {
          Rule.Part part = rule.parts().get(0);
          double sum = part.terms().value(plan.literals());
          int side = sum > part.highest() ? 1 : 0;
          double amount = part.amount(part.violation(sum));
          beyond[r][side] = Math.min(beyond[r][side], amount);
        }
      }
    }

    private boolean holds(int term, State literals) {
      for (int literal : products.get(term)) {
        if (!literals.get(literal)) {
          return false;
        }
      }
      return true;
    }

    Sensitivity sensitivity() {
      List<Coefficient> moved = new ArrayList<>();
      for (int t = 0; t < products.size(); t++) {
        moved.add(coefficient(t));
      }
      List<Limit> limits = new ArrayList<>();
      for (int r = 0; r < rules.size(); r++) {
        limits(r, limits);
      }
      return new Sensitivity(best, moved, limits);
    }

    private Coefficient coefficient(int t) {
      double gain = Math.max(0, otherwise[t] - cost);
      boolean dearer = holds(t, best.literals()) == (sign > 0);
      double fall = dearer ? Double.POSITIVE_INFINITY : gain;
      double rise = dearer ? gain : Double.POSITIVE_INFINITY;
      List<String> words = Arrays.stream(products.get(t)).mapToObj(statement::describe).toList();
      return new Coefficient(words, coefficients.get(t), fall, rise);
    }

    private void limits(int r, List<Limit> limits) {
      Rule.Part part = rules.get(r).parts().get(0);
      String name = rules.get(r).name();
      double sum = part.terms().value(best.literals());
      if (part.lowest() != Double.NEGATIVE_INFINITY) {
        limits.add(new Limit(name, false, part.amount(sum - part.lowest()), beyond[r][0]));
      }
      if (part.highest() != Double.POSITIVE_INFINITY) {
        limits.add(new Limit(name, true, part.amount(part.highest() - sum), beyond[r][1]));
      }
    }
  }
}
