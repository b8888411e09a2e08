package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Bit;
import dev.couplet.model.Decision;
import dev.couplet.model.Rule;
import dev.couplet.model.Rule.Part;
import dev.couplet.model.Spin;
import dev.couplet.model.Statement;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.IntPredicate;

/**
 * What changing a single literal can do: the least and the most that setting it adds to objective
 * and costs, whatever the others are, and whether setting or clearing it can break a required rule
 * further. Linear in the size of the statement.
 */
final class BitChanges {
  private final Statement statement;
  private final double[] least;
  private final double[] most;
  private final boolean[] canSet;
  private final boolean[] canClear;
  private final boolean[] plain;

  BitChanges(Statement statement) {
    int n = statement.literals();
    this.statement = statement;
    this.least = new double[n];
    this.most = new double[n];
    this.canSet = new boolean[n];
    this.canClear = new boolean[n];
    this.plain = new boolean[n];
    Arrays.fill(canSet, true);
    Arrays.fill(canClear, true);
    for (int literal = 0; literal < n; literal++) {
      Decision decision = statement.decisionOf(literal);
      plain[literal] = decision instanceof Bit || decision instanceof Spin;
    }
    take(statement.objective().times(statement.sense().sign()));
    for (Rule rule : statement.rules()) {
      for (Part part : rule.parts()) {
        if (!part.alwaysKept() && rule.required()) {
          limit(part);
        } else if (!part.alwaysKept()) {
          prefer(part, rule.squared());
        }
      }
    }
  }

  private void take(Polynomial terms) {
    terms.forEachTerm(
        (coefficient, literals) -> {
          for (int literal : literals) {
            least[literal] += literals.length == 1 ? coefficient : Math.min(0, coefficient);
            most[literal] += literals.length == 1 ? coefficient : Math.max(0, coefficient);
          }
        });
  }

  private void prefer(Part part, boolean squared) {
    int[] literals = Terms.variables(part.terms());
    for (int literal : literals) {
      double low = Double.POSITIVE_INFINITY;
      double high = Double.NEGATIVE_INFINITY;
      for (boolean other : new boolean[] {false, true}) {
        double with = cost(part, v -> v == literal || other);
        double without = cost(part, v -> v != literal && other);
        low = Math.min(low, with - without);
        high = Math.max(high, with - without);
      }
      boolean bounded = literals.length <= 2 && !squared;
      least[literal] += bounded ? low : Double.NEGATIVE_INFINITY;
      most[literal] += bounded ? high : Double.POSITIVE_INFINITY;
    }
  }

  private static double cost(Part part, IntPredicate one) {
    return part.cost(part.violation(Terms.value(part.terms(), one)));
  }

  private void limit(Part part) {
    int side = side(part);
    if (side == 0) {
      for (int literal : Terms.variables(part.terms())) {
        canSet[literal] = false;
        canClear[literal] = false;
      }
      return;
    }
    part.terms()
        .forEachTerm(
            (coefficient, literals) -> {
              boolean towards = side * coefficient < 0;
              canSet[literals[0]] &= towards;
              canClear[literals[0]] &= !towards;
            });
  }

  /**
   * 1 if a linear sum is limited from above alone, -1 from below, 0 for everything else. No pattern
   * may lie farther from the limit than plans do, since a slack has room for plans alone.
   */
  private static int side(Part part) {
    boolean below = part.lowest() > part.range().lowest();
    boolean above = part.highest() < part.range().highest();
    if (part.terms().degree() > 1 || part.step() > 1 || below == above) {
      return 0;
    }
    boolean room =
        above
            ? part.range().lowest() <= Terms.lowest(part.terms())
            : part.range().highest() >= Terms.highest(part.terms());
    return !room ? 0 : above ? 1 : -1;
  }

  /** The most that the best repair of a required rule can cost; empty if none is known. */
  OptionalDouble repair(Rule rule) {
    List<Part> parts = rule.parts().stream().filter(part -> !part.alwaysKept()).toList();
    if (!rule.required() || parts.size() != 1 || side(parts.get(0)) == 0) {
      return OptionalDouble.empty();
    }
    double[] cost = {0};
    int side = side(parts.get(0));
    parts
        .get(0)
        .terms()
        .forEachTerm(
            (coefficient, literals) -> {
              int literal = literals[0];
              double own = side * coefficient < 0 ? toSet(literal) : toClear(literal);
              cost[0] = Math.max(cost[0], plain[literal] ? own : Double.POSITIVE_INFINITY);
            });
    return bounded(cost[0]);
  }

  /** The same for a decision with one option of several. */
  OptionalDouble repair(Decision decision) {
    List<List<Integer>> groups = statement.exactlyOne(decision);
    if (groups.size() != 1) {
      return OptionalDouble.empty();
    }
    List<Integer> group = groups.get(0);
    double clear = group.stream().mapToDouble(this::toClear).max().orElse(0);
    double set = group.stream().mapToDouble(this::toSet).min().orElse(0);
    return bounded(Math.max(0, Math.max(clear, set)));
  }

  private double toSet(int literal) {
    return canSet[literal] ? most[literal] : Double.POSITIVE_INFINITY;
  }

  private double toClear(int literal) {
    return canClear[literal] ? -least[literal] : Double.POSITIVE_INFINITY;
  }

  private static OptionalDouble bounded(double cost) {
    return cost < Double.POSITIVE_INFINITY ? OptionalDouble.of(cost) : OptionalDouble.empty();
  }
}
