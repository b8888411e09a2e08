package dev.couplet.exact.plans;

import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;

/** How much a network of a statement would hold, without building it. */
final class NetworkSize {
  private static final long MOST_ENTRIES = 1L << 22;

  /** Numbers kept along the longest path of a search. */
  private static final long MOST_KEPT = 1L << 25;

  private final Variables variables;
  private final Set<Long> seen = new HashSet<>();
  private long entries;
  private long shifts;

  private NetworkSize(Variables variables) {
    this.variables = variables;
  }

  /** Whether tables and a path of partial plans fit into a modest part of the memory. */
  static boolean fits(Statement statement) {
    Variables plain = Variables.of(statement, 0);
    Terms terms = new Terms(plain);
    List<Terms.Term> objective = terms.of(statement.objective(), 2);
    List<List<Terms.Term>> sums = new ArrayList<>();
    for (Rule rule : statement.rules()) {
      rule.parts().forEach(part -> sums.add(terms.of(part.terms(), 1)));
    }
    int products = terms.products().size();
    NetworkSize size = new NetworkSize(Variables.of(statement, products));
    objective.forEach(term -> size.add(term.values()));
    for (int k = 0; k < products; k++) {
      int auxiliary = plain.values() + 2 * k;
      terms.products().get(k).forEach(value -> size.add(List.of(value, auxiliary)));
    }
    for (List<Terms.Term> sum : sums) {
      size.add(size.firstOfEach(sum));
    }
    return size.fits(sums.size());
  }

  /** The first value of each variable in a sum. */
  private List<Integer> firstOfEach(List<Terms.Term> sum) {
    return sum.stream()
        .map(term -> variables.first(variables.variableOf(term.values().get(0))))
        .distinct()
        .toList();
  }

  /** A table, if these are values of two variables. */
  private void add(List<Integer> values) {
    if (values.size() == 2) {
      add(values.get(0), values.get(1));
    }
  }

  private void add(int value, int other) {
    int one = variables.variableOf(value);
    int two = variables.variableOf(other);
    if (one != two && seen.add((long) Math.min(one, two) << 32 | Math.max(one, two))) {
      entries += (long) variables.values(one) * variables.values(two);
      shifts += variables.values(one) + variables.values(two);
    }
  }

  private boolean fits(int rows) {
    long kept = variables.count() * (variables.values() + shifts + rows);
    return entries <= MOST_ENTRIES && kept <= MOST_KEPT;
  }
}
