package dev.couplet.exact.plans;

import dev.couplet.form.State;
import dev.couplet.model.Decision;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * What is decided, one variable after the other: a group of literals of which exactly one holds is
 * one variable with a value for each, any other literal a variable with two values.
 *
 * <p>Values of all variables are numbered through: those of variable i are {@code first(i) ..
 * first(i + 1) - 1}. The second value of a two-valued variable is the one where its literal holds.
 * Auxiliary two-valued variables, which stand for products, come last. Immutable.
 */
final class Variables {
  private final int[] first;
  private final int[] variableOf;
  private static final int FIXED = -1;

  private final int[] valueOf;
  private final int[] literalOf;
  private final boolean[] alone;
  private final int literals;

  private Variables(int[] first, int[] valueOf, boolean[] alone) {
    this.first = first;
    this.valueOf = valueOf;
    this.alone = alone;
    this.literalOf = new int[first[first.length - 1]];
    for (int literal = 0; literal < valueOf.length; literal++) {
      if (valueOf[literal] != FIXED) {
        literalOf[valueOf[literal]] = literal;
      }
      if (alone[literal]) {
        literalOf[valueOf[literal] - 1] = literal;
      }
    }
    this.literals = valueOf.length;
    this.variableOf = new int[first[first.length - 1]];
    for (int i = 0; i + 1 < first.length; i++) {
      for (int v = first[i]; v < first[i + 1]; v++) {
        variableOf[v] = i;
      }
    }
  }

  /** The variables of a statement, and so many auxiliary ones. */
  static Variables of(Statement statement, int auxiliary) {
    int literals = statement.literals();
    int[] valueOf = new int[literals];
    Arrays.fill(valueOf, FIXED);
    boolean[] alone = new boolean[literals];
    List<Integer> first = new ArrayList<>();
    int next = 0;
    for (Decision decision : statement.decisions()) {
      List<List<Integer>> groups = statement.exactlyOne(decision);
      for (List<Integer> group : groups) {
        first.add(next);
        for (int literal : group) {
          valueOf[literal] = next++;
        }
      }
      for (int literal : statement.free(decision)) {
        first.add(next);
        valueOf[literal] = next + 1;
        alone[literal] = true;
        next += 2;
      }
    }
    for (int k = 0; k < auxiliary; k++) {
      first.add(next);
      next += 2;
    }
    first.add(next);
    return new Variables(first.stream().mapToInt(Integer::intValue).toArray(), valueOf, alone);
  }

  /** The number of variables. */
  int count() {
    return first.length - 1;
  }

  /** The number of values of all variables together. */
  int values() {
    return variableOf.length;
  }

  /** The first value of a variable. */
  int first(int variable) {
    return first[variable];
  }

  /** One after the last value of a variable. */
  int end(int variable) {
    return first[variable + 1];
  }

  /** The number of values of a variable. */
  int values(int variable) {
    return first[variable + 1] - first[variable];
  }

  /** The variable of a value. */
  int variableOf(int value) {
    return variableOf[value];
  }

  /** The value that a literal is. */
  int valueOf(int literal) {
    return valueOf[literal];
  }

  /** The literal that a value speaks of. */
  int literal(int value) {
    return literalOf[value];
  }

  /** A value as its literal with a sign: minus where the literal does not hold. */
  String inWords(int value) {
    int literal = literalOf[value];
    return (valueOf[literal] == value ? "+" : "-") + literal;
  }

  /** The literals that hold under a choice of one value for each variable. */
  State literals(int[] chosen) {
    boolean[] holds = new boolean[literals];
    for (int literal = 0; literal < literals; literal++) {
      int value = valueOf[literal];
      holds[literal] = value != FIXED && chosen[variableOf[value]] == value;
    }
    return State.of(holds);
  }

  /** The value that each variable takes under a plan's literals, auxiliary ones left out. */
  int[] taken(State holding) {
    int[] taken = new int[literals];
    int count = 0;
    for (int literal = 0; literal < literals; literal++) {
      if (valueOf[literal] == FIXED) {
        continue;
      }
      if (holding.get(literal)) {
        taken[count++] = valueOf[literal];
      } else if (alone[literal]) {
        taken[count++] = valueOf[literal] - 1;
      }
    }
    return Arrays.copyOf(taken, count);
  }
}
