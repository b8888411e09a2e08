package dev.couplet.exact.plans;

import dev.couplet.form.State;
import dev.couplet.model.Decision;
import dev.couplet.model.Plan;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * Replays the lines of a proof against the statement alone, slowly and in big integers; throws an
 * AssertionError at the first line that does not follow.
 *
 * <p>A "group" is what one value is taken from: options of which exactly one holds, or a bit and
 * its opposite. Values are numbered {@code 2 * literal} (holds) and {@code 2 * literal + 1} (does
 * not).
 */
final class ProofChecker {
  private record Limit(
      Map<Integer, BigInteger> terms, BigInteger lowest, BigInteger highest, BigInteger step) {
    /** Whether a sum lies between the values that keep the limit; steps have both limits. */
    boolean skips(BigInteger sum) {
      return !step.equals(BigInteger.ONE) && sum.subtract(lowest).mod(step).signum() != 0;
    }
  }

  private final Statement statement;
  private final List<List<Integer>> groups = new ArrayList<>();
  private final Map<Integer, Integer> groupOf = new HashMap<>();
  private final Map<String, Limit> limits = new HashMap<>();
  private final Map<Integer, BigInteger> linear = new HashMap<>();
  private final Map<List<Integer>, BigInteger> pairs = new HashMap<>();
  private BigInteger constant = BigInteger.ZERO;
  private BigInteger grain = BigInteger.ZERO;
  private BigInteger ceiling = BigInteger.ZERO;
  private BigInteger best;
  private final Deque<List<List<Integer>>> levels = new ArrayDeque<>();
  private final Deque<Integer> taken = new ArrayDeque<>();
  private final Map<String, BigInteger> rows = new HashMap<>();
  private final Map<List<Integer>, BigInteger> shifts = new HashMap<>();
  private boolean closed;

  private ProofChecker(Statement statement) {
    this.statement = statement;
    for (Decision decision : statement.decisions()) {
      List<List<Integer>> exactlyOne = statement.exactlyOne(decision);
      exactlyOne.forEach(group -> addGroup(group.stream().map(l -> 2 * l).toList()));
      for (int l : statement.free(decision)) {
        addGroup(List.of(2 * l, 2 * l + 1));
      }
    }
    for (int r = 0; r < statement.rules().size(); r++) {
      Rule rule = statement.rules().get(r);
      for (int p = 0; p < rule.parts().size(); p++) {
        limits.put(r + "." + p, limit(rule.parts().get(p)));
      }
    }
    levels.push(copy(groups));
  }

  private void addGroup(List<Integer> group) {
    group.forEach(value -> groupOf.put(value, groups.size()));
    groups.add(group);
  }

  private static Limit limit(Rule.Part part) {
    Map<Integer, BigInteger> terms = new HashMap<>();
    part.terms()
        .forEachTerm((c, product) -> terms.put(2 * product[0], new BigDecimal(c).toBigInteger()));
    BigInteger lowest = null;
    BigInteger highest = null;
    if (!Double.isInfinite(part.lowest())) {
      lowest = new BigDecimal(part.lowest()).toBigInteger();
    }
    if (!Double.isInfinite(part.highest())) {
      highest = new BigDecimal(part.highest()).toBigInteger();
    }
    BigInteger step = new BigDecimal(part.step()).toBigInteger();
    return new Limit(terms, lowest, highest, step);
  }

  private static List<List<Integer>> copy(List<List<Integer>> groups) {
    List<List<Integer>> copy = new ArrayList<>();
    groups.forEach(group -> copy.add(new ArrayList<>(group)));
    return copy;
  }

  /** Whether the lines prove that no plan is better than the best one in them, or that none is. */
  static boolean proves(Statement statement, List<String> lines, double value) {
    ProofChecker checker = new ProofChecker(statement);
    lines.forEach(checker::line);
    if (checker.best == null) {
      return checker.closed && value == Double.POSITIVE_INFINITY;
    }
    return checker.closed && checker.best.equals(checker.cost(value));
  }

  private BigDecimal unit = BigDecimal.ONE;

  private BigInteger cost(double value) {
    return BigDecimal.valueOf(value * statement.sense().sign()).multiply(unit).toBigIntegerExact();
  }

  private void line(String line) {
    if (closed) {
      return;
    }
    String[] words = line.split(" ");
    switch (words[0]) {
      case "unit" -> read(new BigDecimal(words[1]));
      case "root" -> {
        while (levels.size() > 1) {
          levels.pop();
          taken.pop();
        }
      }
      case "take" -> {
        int value = value(words[1]);
        levels.push(copy(levels.peek()));
        taken.push(value);
        levels.peek().get(groupOf.get(value)).removeIf(other -> other != value);
      }
      case "cut" -> {
        int value = value(words[1]);
        List<List<Integer>> tried = copy(levels.peek());
        tried.get(groupOf.get(value)).removeIf(other -> other != value);
        require(contradictory(tried), line);
        levels.peek().get(groupOf.get(value)).removeIf(other -> other == value);
      }
      case "plan" -> plan(State.parse(words[1]), line);
      case "row" -> rows.put(words[1], new BigInteger(words[2]));
      case "shift" ->
          shifts.put(
              List.of(value(words[1]), group(Integer.parseInt(words[2]))),
              new BigInteger(words[3]));
      case "skip" -> {
        int value = value(words[1]);
        List<List<Integer>> tried = copy(levels.peek());
        tried.get(groupOf.get(value)).removeIf(other -> other != value);
        require(tooDear(tried), line);
        levels.peek().get(groupOf.get(value)).removeIf(other -> other == value);
        forget();
      }
      case "close" -> {
        List<List<Integer>> left = levels.peek();
        require(words[1].equals("cost") ? tooDear(left) : contradictory(copy(left)), line);
        forget();
        levels.pop();
        if (taken.isEmpty()) {
          closed = true;
        } else {
          int value = taken.pop();
          levels.peek().get(groupOf.get(value)).removeIf(other -> other == value);
        }
      }
      default -> throw new AssertionError("no such line: " + line);
    }
  }

  private void forget() {
    rows.clear();
    shifts.clear();
  }

  private static void require(boolean holds, String line) {
    if (!holds) {
      throw new AssertionError("does not follow: " + line);
    }
  }

  private static int value(String signed) {
    int literal = Integer.parseInt(signed.substring(1));
    return signed.charAt(0) == '+' ? 2 * literal : 2 * literal + 1;
  }

  private int group(int literal) {
    return groupOf.get(2 * literal);
  }

  private void read(BigDecimal newUnit) {
    unit = newUnit;
    statement
        .objective()
        .forEachTerm(
            (c, product) -> {
              BigInteger cost = cost(c);
              if (product.length == 0) {
                constant = cost;
              } else if (product.length == 1) {
                linear.put(2 * product[0], cost);
              } else {
                pairs.put(List.of(2 * product[0], 2 * product[1]), cost);
              }
              grain = product.length == 0 ? grain : grain.gcd(cost);
              ceiling = ceiling.add(product.length == 0 ? cost : cost.max(BigInteger.ZERO));
            });
  }

  private void plan(State literals, String line) {
    Plan plan = statement.plan(literals);
    require(plan.feasible(), line);
    BigInteger cost = cost(plan.value());
    best = best == null ? cost : best.min(cost);
  }

  /** Whether rules alone, applied again and again, leave some group without a value. */
  private boolean contradictory(List<List<Integer>> left) {
    for (boolean changed = true; changed; ) {
      changed = false;
      for (List<Integer> group : left) {
        if (group.isEmpty()) {
          return true;
        }
        for (int value : List.copyOf(group)) {
          if (excluded(left, value)) {
            group.remove((Integer) value);
            changed = true;
          }
        }
      }
    }
    return left.stream().anyMatch(List::isEmpty);
  }

  private boolean excluded(List<List<Integer>> left, int value) {
    for (Limit limit : limits.values()) {
      BigInteger[] range = range(limit, left, value);
      if ((limit.highest() != null && range[0].compareTo(limit.highest()) > 0)
          || (limit.lowest() != null && range[1].compareTo(limit.lowest()) < 0)) {
        return true;
      }
      if (range[0].equals(range[1]) && limit.skips(range[0])) {
        return true;
      }
    }
    return false;
  }

  /** Between what a rule's terms can be with a value taken; none if it is negative. */
  private BigInteger[] range(Limit limit, List<List<Integer>> left, int value) {
    BigInteger[] range = {BigInteger.ZERO, BigInteger.ZERO};
    for (int g = 0; g < left.size(); g++) {
      List<Integer> group = value >= 0 && groupOf.get(value) == g ? List.of(value) : left.get(g);
      BigInteger least = null;
      BigInteger most = null;
      for (int one : group) {
        BigInteger own = limit.terms().getOrDefault(one, BigInteger.ZERO);
        least = least == null ? own : least.min(own);
        most = most == null ? own : most.max(own);
      }
      range[0] = range[0].add(least == null ? BigInteger.ZERO : least);
      range[1] = range[1].add(most == null ? BigInteger.ZERO : most);
    }
    return range;
  }

  /** Whether every plan with values that are left costs too much, by rows and shifts. */
  private boolean tooDear(List<List<Integer>> left) {
    if (left.stream().anyMatch(List::isEmpty)) {
      return true;
    }
    BigInteger bound = constant;
    for (Map.Entry<String, BigInteger> row : rows.entrySet()) {
      bound = bound.add(rest(limits.get(row.getKey()), row.getValue(), left));
    }
    for (List<Integer> group : left) {
      bound = bound.add(group.stream().map(this::alone).min(BigInteger::compareTo).orElseThrow());
    }
    for (int g = 0; g < left.size(); g++) {
      for (int h = g + 1; h < left.size(); h++) {
        bound = bound.add(together(g, h, left));
      }
    }
    return best == null
        ? bound.compareTo(ceiling) > 0
        : bound.compareTo(best.subtract(grain.max(BigInteger.ONE))) > 0;
  }

  /** A value's cost, with what rows add and without what is moved to pairs. */
  private BigInteger alone(int value) {
    BigInteger cost = linear.getOrDefault(value, BigInteger.ZERO);
    for (Map.Entry<String, BigInteger> row : rows.entrySet()) {
      BigInteger own = limits.get(row.getKey()).terms().getOrDefault(value, BigInteger.ZERO);
      cost = cost.add(own.multiply(row.getValue()));
    }
    for (int g = 0; g < groups.size(); g++) {
      cost = cost.subtract(shifts.getOrDefault(List.of(value, g), BigInteger.ZERO));
    }
    return cost;
  }

  private BigInteger together(int g, int h, List<List<Integer>> left) {
    BigInteger least = null;
    for (int one : left.get(g)) {
      for (int other : left.get(h)) {
        List<Integer> both = List.of(Math.min(one, other), Math.max(one, other));
        if (allowed(g, one, h, other)) {
          BigInteger cost =
              pairs
                  .getOrDefault(both, BigInteger.ZERO)
                  .add(shifts.getOrDefault(List.of(one, h), BigInteger.ZERO))
                  .add(shifts.getOrDefault(List.of(other, g), BigInteger.ZERO));
          least = least == null ? cost : least.min(cost);
        }
      }
    }
    // Two groups that exclude each other altogether are for the rules to find.
    return least == null ? BigInteger.ZERO : least;
  }

  /** Whether no rule over these two groups alone excludes the two values. */
  private boolean allowed(int g, int one, int h, int other) {
    for (Limit limit : limits.values()) {
      if (limit.terms().keySet().stream()
          .allMatch(v -> groupOf.get(v) == g || groupOf.get(v) == h)) {
        BigInteger sum =
            limit
                .terms()
                .getOrDefault(one, BigInteger.ZERO)
                .add(limit.terms().getOrDefault(other, BigInteger.ZERO));
        if ((limit.highest() != null && sum.compareTo(limit.highest()) > 0)
            || (limit.lowest() != null && sum.compareTo(limit.lowest()) < 0)
            || limit.skips(sum)) {
          return false;
        }
      }
    }
    return true;
  }

  /** The least of minus the multiplier times the terms, over sums that keep the rule. */
  private BigInteger rest(Limit limit, BigInteger multiplier, List<List<Integer>> left) {
    BigInteger[] range = range(limit, left, -1);
    boolean upper = multiplier.signum() > 0;
    BigInteger at = upper ? limit.highest() : limit.lowest();
    BigInteger nearest = upper ? at.min(range[1]) : at.max(range[0]);
    return multiplier.multiply(nearest).negate();
  }
}
