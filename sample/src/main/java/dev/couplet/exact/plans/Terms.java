package dev.couplet.exact.plans;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The products of literals of a statement as values of variables: at most two each, longer ones
 * through auxiliary variables, one for each product that is told apart.
 */
final class Terms {
  /** One product: a coefficient and values of different variables, in ascending order. */
  record Term(double coefficient, List<Integer> values) {}

  private final Map<List<Integer>, Integer> products = new LinkedHashMap<>();

  /** The values that literals stand for; those of auxiliary variables follow them. */
  private final Variables plain;

  Terms(Variables plain) {
    this.plain = plain;
  }

  /**
   * The terms of a polynomial that some plan can make hold, products longer than asked replaced.
   */
  List<Term> of(Polynomial polynomial, int longest) {
    List<Term> terms = new ArrayList<>();
    polynomial.forEachTerm(
        (coefficient, literals) -> {
          List<Integer> values = new ArrayList<>(literals.length);
          boolean possible = true;
          for (int literal : literals) {
            int value = plain.valueOf(literal);
            int before = values.isEmpty() ? -1 : values.get(values.size() - 1);
            possible &= before < 0 || plain.variableOf(before) != plain.variableOf(value);
            values.add(value);
          }
          if (possible) {
            boolean replaced = values.size() > longest;
            terms.add(new Term(coefficient, replaced ? List.of(product(values)) : values));
          }
        });
    return terms;
  }

  /** The value of an auxiliary variable that is taken where all of the values are. */
  private int product(List<Integer> values) {
    return products.computeIfAbsent(values, key -> plain.values() + 2 * products.size() + 1);
  }

  /** The products that auxiliary variables stand for, in order. */
  List<List<Integer>> products() {
    return List.copyOf(products.keySet());
  }
}
