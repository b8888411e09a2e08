package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A linear inequality that says no more than "none of these literals, and at most one of those":
 * the sum of the former and of the products of pairs of the latter. No auxiliary bit.
 *
 * <p>Written as {@code sum c_k l_k <= capacity} with all {@code c_k > 0} (a literal l is x or 1 -
 * x), a literal with {@code c_k > capacity} can never hold; the rest must be such that any two of
 * them exceed the capacity. The value is at least 1 where the inequality is broken, and never
 * negative.
 */
final class ConflictForm {
  private record Weighted(int variable, boolean negated, double weight) {
    int sign() {
      return negated ? -1 : 1;
    }
  }

  private ConflictForm() {}

  static Optional<Penalty> of(Limits limits, int size) {
    if (limits.terms().degree() != 1 || limits.hasLowest() == limits.hasHighest()) {
      return Optional.empty();
    }
    int sign = limits.hasHighest() ? 1 : -1;
    List<Weighted> literals = literals(limits.terms(), sign);
    double capacity = limits.hasHighest() ? limits.highest() : -limits.lowest();
    for (Weighted literal : literals) {
      capacity += literal.negated() ? literal.weight() : 0;
    }
    return conflicts(literals, capacity, size);
  }

  private static List<Weighted> literals(Polynomial terms, int sign) {
    List<Weighted> literals = new ArrayList<>();
    terms.forEachTerm(
        (coefficient, variables) -> {
          double signed = sign * coefficient;
          literals.add(new Weighted(variables[0], signed < 0, Math.abs(signed)));
        });
    return literals;
  }

  private static Optional<Penalty> conflicts(List<Weighted> literals, double capacity, int size) {
    List<Weighted> never = new ArrayList<>();
    List<Weighted> atMostOne = new ArrayList<>();
    double smallest = Double.POSITIVE_INFINITY;
    double second = Double.POSITIVE_INFINITY;
    for (Weighted literal : literals) {
      double weight = literal.weight();
      (weight > capacity ? never : atMostOne).add(literal);
      if (weight <= capacity) {
        second = Math.min(second, Math.max(smallest, weight));
        smallest = Math.min(smallest, weight);
      }
    }
    if (smallest + second <= capacity) {
      return Optional.empty();
    }
    Polynomial.Builder sum = Polynomial.builder(size);
    never.forEach(literal -> add(sum, literal));
    for (int a = 0; a < atMostOne.size(); a++) {
      for (int b = a + 1; b < atMostOne.size(); b++) {
        add(sum, atMostOne.get(a), atMostOne.get(b));
      }
    }
    return Optional.of(new Penalty(sum.build(), words(never.size(), atMostOne.size())));
  }

  private static String words(int never, int atMostOne) {
    if (never == 0) {
      return "pairs, at most one of " + atMostOne;
    }
    return atMostOne == 0
        ? "linear, none of " + never
        : "pairs, none of " + never + " and at most one of " + atMostOne;
  }

  /** Adds a literal. */
  private static void add(Polynomial.Builder sum, Weighted literal) {
    sum.add(literal.negated() ? 1 : 0).add(literal.sign(), literal.variable());
  }

  /** Adds the product of two literals, multiplied out. */
  private static void add(Polynomial.Builder sum, Weighted a, Weighted b) {
    sum.add(a.sign() * b.sign(), a.variable(), b.variable());
    if (a.negated()) {
      sum.add(b.sign(), b.variable());
    }
    if (b.negated()) {
      sum.add(a.sign(), a.variable());
    }
    if (a.negated() && b.negated()) {
      sum.add(1);
    }
  }
}
