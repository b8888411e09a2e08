package dev.couplet.audit;

import dev.couplet.model.Choice;
import dev.couplet.model.Condition;
import dev.couplet.model.Expr;
import dev.couplet.model.Literal;
import dev.couplet.model.Plan;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/** Random statements of nested logic, which a known plan keeps. */
final class RandomLogic {
  private static final int DEPTH = 2;

  private final SplittableRandom random;
  private final List<Literal> literals;
  private final List<Choice<Integer>> choices;
  private final Plan planted;

  RandomLogic(
      SplittableRandom random,
      List<Literal> literals,
      List<Choice<Integer>> choices,
      Plan planted) {
    this.random = random;
    this.literals = literals;
    this.choices = choices;
    this.planted = planted;
  }

  /** A literal that counts in an objective, or what a table has for choices. */
  Expr expr() {
    if (choices.isEmpty() || random.nextInt(4) > 0) {
      return literal(1);
    }
    Choice<Integer> first = choices.get(random.nextInt(choices.size()));
    Choice<Integer> second = choices.get(random.nextInt(choices.size()));
    int slope = 1 + random.nextInt(3);
    return first == second
        ? first.lookUp(option -> option * slope - 1)
        : first.lookUp(second, (one, other) -> Math.abs(one - other) * slope);
  }

  /** A condition that the plan keeps. */
  Condition condition() {
    return switch (random.nextInt(7)) {
      case 0 -> implication();
      case 1 -> agreeing(literal(DEPTH), literal(1));
      case 2 -> agreeing(literal(1), literal(0)).and(kept(literal(1)).isTrue());
      case 3, 4 -> limits();
      case 5 -> several();
      default -> kept(literal(DEPTH)).isTrue();
    };
  }

  private Literal kept(Literal literal) {
    return planted.holds(literal) ? literal : literal.not();
  }

  private Condition agreeing(Literal first, Literal second) {
    boolean same = planted.holds(first) == planted.holds(second);
    return first.equalTo(same ? second : second.not());
  }

  private Condition implication() {
    Literal first = literal(DEPTH);
    Literal second = literal(1);
    return first.implies(planted.holds(first) ? kept(second) : second);
  }

  /** Limits on a sum where a literal holds, or two do; an odd number where a literal holds. */
  private Condition limits() {
    Literal guard = literal(1);
    if (random.nextInt(3) == 0) {
      List<Literal> parts = List.of(literal(0), literal(0), literal(0));
      return kept(Literal.oddOf(parts)).isTrue().when(guard);
    }
    Expr sum = sum();
    double value = planted.number(sum);
    double room = random.nextInt(3);
    Condition condition =
        switch (random.nextInt(3)) {
          case 0 -> sum.atMost(value + room);
          case 1 -> sum.atLeast(value - room);
          default -> sum.between(value - room, value);
        };
    return random.nextBoolean() ? condition.when(guard) : condition.when(guard).when(literal(0));
  }

  /** So many of several; or choices that all differ, if they do. */
  private Condition several() {
    if (choices.size() > 1 && differ()) {
      return Condition.allDifferent(choices);
    }
    List<Literal> some = List.of(literal(0), literal(1), literal(0), literal(0));
    int count = (int) some.stream().filter(planted::holds).count();
    return switch (random.nextInt(3)) {
      case 0 -> Condition.atMost(count, some);
      case 1 -> Condition.atLeast(count, some);
      default -> Condition.exactly(count, some);
    };
  }

  private boolean differ() {
    return choices.stream().map(planted::value).distinct().count() == choices.size();
  }

  private Expr sum() {
    List<Expr> terms = new ArrayList<>();
    int count = 1 + random.nextInt(4);
    for (int t = 0; t < count; t++) {
      terms.add(literal(0).times(random.nextInt(9) - 4.0));
    }
    return Expr.sum(terms);
  }

  private Literal literal(int depth) {
    if (depth == 0 || random.nextInt(4) == 0) {
      Literal literal = literals.get(random.nextInt(literals.size()));
      return random.nextInt(4) == 0 ? literal.not() : literal;
    }
    Literal first = literal(depth - 1);
    Literal second = literal(depth - 1);
    return switch (random.nextInt(5)) {
      case 0 -> first.and(second, literal(0));
      case 1 -> first.or(second);
      case 2 -> first.xor(second);
      case 3 -> first.xor(second, literal(0)).not();
      default -> first.and(second).not();
    };
  }
}
