package dev.couplet.audit;

import dev.couplet.audit.LogicSpec.Rule;
import dev.couplet.audit.LogicSpec.Said;
import dev.couplet.audit.LogicSpec.Table;
import dev.couplet.audit.LogicSpec.Term;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import java.util.SplittableRandom;

/** Random {@link LogicSpec}s; some have no feasible assignment. Options of a choice: 2 or more. */
final class LogicSpecs {
  private static final int MOST_LITERALS = 9;

  private final SplittableRandom random;
  private final List<Integer> options = new ArrayList<>();
  private final List<Integer> choices = new ArrayList<>();

  private LogicSpecs(long seed) {
    this.random = new SplittableRandom(seed);
  }

  static LogicSpec of(long seed) {
    return new LogicSpecs(seed).spec();
  }

  private LogicSpec spec() {
    int room = 2 + random.nextInt(MOST_LITERALS - 1);
    while (room > 0) {
      int size =
          room >= 2 && random.nextInt(3) == 0 ? 2 + random.nextInt(Math.min(room, 4) - 1) : 0;
      if (size > 0) {
        choices.add(options.size());
      }
      options.add(size);
      room -= Math.max(1, size);
    }
    List<Rule> rules = new ArrayList<>();
    int count = random.nextInt(4);
    for (int r = 0; r < count; r++) {
      boolean wish = random.nextInt(3) == 0;
      OptionalInt cost = wish ? OptionalInt.of(random.nextInt(5)) : OptionalInt.empty();
      rules.add(new Rule("rule " + r, said(), cost, wish && random.nextBoolean()));
    }
    return new LogicSpec(options, rules, terms(1 + random.nextInt(5)), tables());
  }

  private Said said() {
    return switch (random.nextInt(8)) {
      case 0 -> new LogicSpec.Implies(formula(2), formula(2));
      case 1 -> new LogicSpec.Same(formula(2), formula(1));
      case 2, 3 -> limits();
      case 4 -> new LogicSpec.OddWhen(formulas(0, 4), formula(1));
      case 5 -> different();
      default -> new LogicSpec.Holds(formula(2), random.nextInt(4) == 0);
    };
  }

  private Said limits() {
    List<Term> terms = terms(1 + random.nextInt(4));
    int around = 0;
    for (Term term : terms) {
      around += random.nextBoolean() ? term.coefficient() : 0;
    }
    int kind = random.nextInt(4);
    int lowest = kind == 0 ? -LogicSpec.Limits.NONE : around - random.nextInt(2);
    int highest = kind == 1 ? LogicSpec.Limits.NONE : around + (kind == 2 ? 0 : random.nextInt(3));
    lowest = kind == 2 ? highest : lowest;
    return new LogicSpec.Limits(terms, lowest, highest, formulas(1, random.nextInt(3)));
  }

  /** Choices of the same number of options, or of different ones. */
  private Said different() {
    if (choices.size() < 2) {
      return limits();
    }
    int most = choices.stream().mapToInt(options::get).max().orElseThrow();
    return choices.size() > most ? limits() : new LogicSpec.Different(choices, most);
  }

  private List<Term> terms(int count) {
    List<Term> terms = new ArrayList<>();
    for (int t = 0; t < count; t++) {
      int coefficient = (1 + random.nextInt(5)) * (random.nextBoolean() ? 1 : -1);
      terms.add(new Term(coefficient, formula(random.nextInt(4) == 0 ? 1 : 0)));
    }
    return terms;
  }

  private List<Table> tables() {
    List<Table> tables = new ArrayList<>();
    if (choices.size() >= 2 && random.nextBoolean()) {
      int[][] costs = new int[options.get(choices.get(0))][options.get(choices.get(1))];
      for (int[] row : costs) {
        for (int c = 0; c < row.length; c++) {
          row[c] = random.nextInt(11) - 5;
        }
      }
      tables.add(new Table(choices.get(0), choices.get(1), costs));
    }
    return tables;
  }

  private List<Formula> formulas(int depth, int count) {
    List<Formula> formulas = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      formulas.add(formula(depth));
    }
    return formulas;
  }

  private Formula formula(int depth) {
    if (depth == 0 || random.nextInt(4) == 0) {
      int decision = random.nextInt(options.size());
      Formula is = new Formula.Is(decision, random.nextInt(Math.max(2, options.get(decision))));
      return random.nextInt(4) == 0 ? new Formula.Not(is) : is;
    }
    List<Formula> parts = formulas(depth - 1, 1 + random.nextInt(3));
    return switch (random.nextInt(4)) {
      case 0 -> new Formula.All(parts);
      case 1 -> new Formula.Any(parts);
      case 2 -> new Formula.Odd(parts);
      default ->
          new Formula.Not(random.nextBoolean() ? new Formula.All(parts) : new Formula.Odd(parts));
    };
  }
}
