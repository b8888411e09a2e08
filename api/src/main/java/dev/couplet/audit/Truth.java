package dev.couplet.audit;

import dev.couplet.model.Choice;
import dev.couplet.model.Decision;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * What the statement itself says of a pattern of literals: whether it is a plan, whether that is
 * feasible, and what it is worth; from the rules and objectives alone, without the form.
 */
final class Truth implements Flips {
  /** A rule and the value of its terms. */
  private record Tracked(Rule rule, Running terms) {
    double violation() {
      double value = terms.value();
      return Math.max(0, Math.max(value - rule.highest(), rule.lowest() - value));
    }
  }

  private final long[] codes;
  private final List<Tracked> required = new ArrayList<>();
  private final List<Tracked> preferred = new ArrayList<>();
  private final List<Map<Double, Double>> costs = new ArrayList<>();
  private final Running objective;
  private final int sign;

  Truth(Statement statement) {
    List<Long> masks = new ArrayList<>();
    for (Decision decision : statement.decisions()) {
      if (decision instanceof Choice<?> choice) {
        masks.add(((1L << choice.values()) - 1) << statement.firstLiteral(choice));
      }
    }
    codes = masks.stream().mapToLong(Long::longValue).toArray();
    for (Rule rule : statement.rules()) {
      (rule.required() ? required : preferred).add(new Tracked(rule, new Running(rule.terms())));
    }
    preferred.forEach(rule -> costs.add(new HashMap<>()));
    objective = new Running(statement.objective());
    sign = statement.sense().sign();
  }

  @Override
  public void reset(long pattern) {
    objective.reset(pattern);
    required.forEach(rule -> rule.terms().reset(pattern));
    preferred.forEach(rule -> rule.terms().reset(pattern));
  }

  @Override
  public void flip(int bit, long pattern) {
    objective.flip(bit, pattern);
    for (Tracked rule : required) {
      rule.terms().flip(bit, pattern);
    }
    for (Tracked rule : preferred) {
      rule.terms().flip(bit, pattern);
    }
  }

  /** Whether every choice has exactly one option. */
  boolean decided(long pattern) {
    for (long code : codes) {
      if (Long.bitCount(pattern & code) != 1) {
        return false;
      }
    }
    return true;
  }

  /** Whether the pattern, the one walked to last, is a plan that keeps every required rule. */
  boolean feasible(long pattern) {
    if (!decided(pattern)) {
      return false;
    }
    for (Tracked rule : required) {
      if (rule.violation() > 0) {
        return false;
      }
    }
    return true;
  }

  /** What the plan is worth, with the sign under which it is minimised. */
  double minimised() {
    double cost = 0;
    for (int r = 0; r < preferred.size(); r++) {
      Rule rule = preferred.get(r).rule();
      double violation = preferred.get(r).violation();
      if (violation > 0) {
        cost += costs.get(r).computeIfAbsent(violation, rule::cost);
      }
    }
    return sign * objective.value() + cost;
  }

  /** About how many numbers a flip of the bit reads. */
  int effort(int bit) {
    int sum = objective.termsOf(bit);
    for (Tracked rule : required) {
      sum += rule.terms().termsOf(bit);
    }
    return sum;
  }
}
