package dev.couplet.model;

import dev.couplet.model.Compound.Kind;
import java.util.ArrayList;
import java.util.List;

/**
 * What conditions on literals come to in sums of literals: as few and as light ones as the shape of
 * the literals allows, without multiplying out what need not be.
 */
final class Logic {
  private static final int PARTS_MULTIPLIED_OUT = 2;

  private Logic() {}

  /** The condition that a literal holds. */
  static Condition holds(Literal literal) {
    if (!(literal instanceof Compound compound)) {
      return literal.atLeast(1);
    }
    return switch (compound.kind()) {
      case ALL -> all(compound);
      case ANY -> any(compound);
      case ODD -> odd(compound);
    };
  }

  /** The plain parts in one sum, of which each that fails counts one; the others by themselves. */
  private static Condition all(Compound literal) {
    List<Condition> conditions = new ArrayList<>();
    List<Literal> plain = new ArrayList<>();
    for (Literal part : literal.parts()) {
      if (part instanceof Compound) {
        conditions.add(holds(part));
      } else {
        plain.add(part);
      }
    }
    if (!plain.isEmpty()) {
      conditions.add(0, Expr.sum(plain).atLeast(plain.size()));
    }
    return Condition.all(conditions);
  }

  /** At least one of the parts; where one of these is an "and", for each of its own parts. */
  private static Condition any(Compound literal) {
    List<Literal> others = new ArrayList<>();
    List<Compound> conjunctions = new ArrayList<>();
    for (Literal part : literal.parts()) {
      if (part instanceof Compound compound && compound.kind() == Kind.ALL) {
        conjunctions.add(compound);
      } else {
        others.add(part);
      }
    }
    if (conjunctions.size() != 1) {
      return Expr.sum(literal.parts()).atLeast(1);
    }
    List<Condition> clauses = new ArrayList<>();
    for (Literal part : conjunctions.get(0).parts()) {
      List<Literal> clause = new ArrayList<>(others);
      clause.add(part);
      clauses.add(holds(Compound.of(Kind.ANY, clause)));
    }
    return Condition.all(clauses);
  }

  private static Condition odd(Compound literal) {
    int most = literal.parts().size();
    int highest = most % 2 == 1 ? most : most - 1;
    Expr sum = Expr.sum(literal.parts());
    return highest == 1 ? sum.exactly(1) : Condition.odd(sum, highest, literal);
  }

  /**
   * The condition that the second literal holds wherever the first one does: of an "or" each part
   * implies it, and of an "and" each part is implied.
   */
  static Condition implies(Literal first, Literal second) {
    if (first instanceof Compound any && any.kind() == Kind.ANY) {
      return Condition.all(any.parts().stream().map(part -> implies(part, second)).toList());
    }
    if (second instanceof Compound all && all.kind() == Kind.ALL) {
      return Condition.all(all.parts().stream().map(part -> implies(first, part)).toList());
    }
    if (first instanceof Compound || second instanceof Compound) {
      return holds(Compound.of(Kind.ANY, List.of(first.not(), second)));
    }
    return first.atMost(second);
  }

  /** The condition that two literals hold together or not at all. */
  static Condition equal(Literal first, Literal second) {
    if (isOdd(first) || isOdd(second)) {
      return holds(Compound.of(Kind.ODD, List.of(first, second.not())));
    }
    if (isShort(first) && isShort(second)) {
      return first.exactly(second);
    }
    return implies(first, second).and(implies(second, first));
  }

  private static boolean isOdd(Literal literal) {
    return literal instanceof Compound compound && compound.kind() == Kind.ODD;
  }

  private static boolean isShort(Literal literal) {
    return !(literal instanceof Compound compound)
        || (compound.parts().size() <= PARTS_MULTIPLIED_OUT
            && compound.parts().stream().noneMatch(part -> part instanceof Compound));
  }
}
