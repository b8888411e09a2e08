package dev.couplet.audit;

import java.util.List;
import java.util.OptionalInt;
import java.util.function.Consumer;

/**
 * A decision problem of nested logic in plain records, judged by itself in whole numbers. Shares no
 * code with the library.
 *
 * @param options for each decision the number of its options; 0 stands for a bit
 * @param objective terms that count where their formula holds, to be minimised
 * @param tables costs by the options of two choices, added to the objective
 */
record LogicSpec(
    List<Integer> options, List<Rule> rules, List<Term> objective, List<Table> tables) {
  record Term(int coefficient, Formula formula) {}

  /** Rows are the options of the first choice, columns of the second. */
  record Table(int first, int second, int[][] costs) {}

  /** What a rule says, and what a miss costs if it is a wish. */
  record Rule(String name, Said said, OptionalInt cost, boolean squared) {
    boolean required() {
      return cost.isEmpty();
    }
  }

  /** By how much an assignment misses what is said; what is not 0 may differ where noted. */
  sealed interface Said {
    int miss(int[] values);
  }

  /** The amount may be larger where several things are to hold. */
  record Holds(Formula formula, boolean asNumber) implements Said {
    @Override
    public int miss(int[] values) {
      return formula.holds(values) ? 0 : 1;
    }
  }

  /** The amount may be larger, as above. */
  record Implies(Formula first, Formula second) implements Said {
    @Override
    public int miss(int[] values) {
      return first.holds(values) && !second.holds(values) ? 1 : 0;
    }
  }

  /** The amount may be larger, as above. */
  record Same(Formula first, Formula second) implements Said {
    @Override
    public int miss(int[] values) {
      return first.holds(values) == second.holds(values) ? 0 : 1;
    }
  }

  /** Terms between two limits where all guards hold. */
  record Limits(List<Term> terms, int lowest, int highest, List<Formula> guards) implements Said {
    static final int NONE = 1_000_000;

    @Override
    public int miss(int[] values) {
      for (Formula guard : guards) {
        if (!guard.holds(values)) {
          return 0;
        }
      }
      int sum = sum(terms, values);
      return Math.max(0, Math.max(lowest - sum, sum - highest));
    }
  }

  /** An odd number of formulas holds where the guard does. */
  record OddWhen(List<Formula> formulas, Formula guard) implements Said {
    @Override
    public int miss(int[] values) {
      int count = 0;
      for (Formula formula : formulas) {
        count += formula.holds(values) ? 1 : 0;
      }
      return guard.holds(values) && count % 2 == 0 ? 1 : 0;
    }
  }

  /** No two of the choices are the same option. */
  record Different(List<Integer> decisions, int options) implements Said {
    @Override
    public int miss(int[] values) {
      int miss = 0;
      for (int option = 0; option < options; option++) {
        int takers = 0;
        for (int decision : decisions) {
          takers += values[decision] == option ? 1 : 0;
        }
        miss += Math.max(0, takers - 1);
      }
      return miss;
    }
  }

  static int sum(List<Term> terms, int[] values) {
    int sum = 0;
    for (Term term : terms) {
      sum += term.formula().holds(values) ? term.coefficient() : 0;
    }
    return sum;
  }

  int objective(int[] values) {
    int sum = sum(objective, values);
    for (Table table : tables) {
      sum += table.costs()[values[table.first()]][values[table.second()]];
    }
    return sum;
  }

  boolean feasible(int[] values) {
    for (Rule rule : rules) {
      if (rule.required() && rule.said().miss(values) > 0) {
        return false;
      }
    }
    return true;
  }

  void forEach(Consumer<int[]> visitor) {
    int[] values = new int[options.size()];
    while (true) {
      visitor.accept(values);
      int d = 0;
      while (d < values.length && ++values[d] == Math.max(2, options.get(d))) {
        values[d++] = 0;
      }
      if (d == values.length) {
        return;
      }
    }
  }
}
