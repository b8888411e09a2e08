package dev.couplet.audit;

import dev.couplet.audit.Spec.Fact;
import dev.couplet.audit.Spec.Limit;
import dev.couplet.audit.Spec.Term;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/**
 * Tries every assignment of a {@link Spec} in exact decimals. Shares no code with the library: this
 * is the truth that models, lowerings and audits are held against.
 */
final class SpecJudge {
  private final Spec spec;
  long assignments;
  long feasible;
  Optional<BigDecimal> optimum = Optional.empty();

  SpecJudge(Spec spec) {
    this.spec = spec;
    forEach(this::count);
  }

  private void count(int[] values) {
    assignments++;
    if (spec.rules().stream().allMatch(rule -> rule.cost().isPresent() || kept(rule, values))) {
      feasible++;
      BigDecimal value = value(values);
      boolean better =
          optimum.isEmpty()
              || (spec.maximise()
                  ? value.compareTo(optimum.get()) > 0
                  : value.compareTo(optimum.get()) < 0);
      optimum = better ? Optional.of(value) : optimum;
    }
  }

  void forEach(Consumer<int[]> visitor) {
    int[] values = new int[spec.options().size()];
    while (true) {
      visitor.accept(values);
      int d = 0;
      while (d < values.length && ++values[d] == valuesOf(spec.options().get(d))) {
        values[d++] = 0;
      }
      if (d == values.length) {
        return;
      }
    }
  }

  private static int valuesOf(int options) {
    return options == 0 ? 2 : options;
  }

  BigDecimal value(int[] values) {
    BigDecimal value = sum(spec.objective(), values);
    for (Limit rule : spec.rules()) {
      if (rule.cost().isPresent()) {
        BigDecimal cost = miss(rule, values).multiply(rule.cost().get());
        value = spec.maximise() ? value.subtract(cost) : value.add(cost);
      }
    }
    return value;
  }

  static boolean kept(Limit rule, int[] values) {
    return miss(rule, values).signum() == 0;
  }

  /** By how much a rule is missed, in its own units. */
  static BigDecimal miss(Limit rule, int[] values) {
    BigDecimal value = sum(rule.terms(), values);
    BigDecimal miss = BigDecimal.ZERO;
    if (rule.lowest().isPresent()) {
      miss = miss.max(rule.lowest().get().subtract(value));
    }
    if (rule.highest().isPresent()) {
      miss = miss.max(value.subtract(rule.highest().get()));
    }
    return miss;
  }

  private static BigDecimal sum(List<Term> terms, int[] values) {
    BigDecimal sum = BigDecimal.ZERO;
    for (Term term : terms) {
      boolean all = true;
      for (Fact fact : term.facts()) {
        all &= (values[fact.decision()] == fact.option()) != fact.negated();
      }
      sum = all ? sum.add(term.coefficient()) : sum;
    }
    return sum;
  }
}
