package dev.couplet.bench.models;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Decision;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.chocosolver.solver.Model;
import org.chocosolver.solver.Solution;
import org.chocosolver.solver.variables.BoolVar;
import org.chocosolver.solver.variables.IntVar;

/**
 * A statement in the terms of a general-purpose constraint solver: a 0/1 variable a literal, a
 * variable a choice, a linear constraint a part of a rule, and for each product of literals a
 * variable that equals it.
 */
final class Reference {
  private static final int MOST_DECIMALS = 3;
  private static final int LARGEST = 1_000_000;

  /** What the solver came to. */
  enum Verdict {
    OPTIMAL,
    INFEASIBLE,
    UNDECIDED
  }

  /**
   * An answer.
   *
   * @param value in the statement's own sense, if it is proved to be optimal
   */
  record Answer(Verdict verdict, OptionalDouble value) {}

  private final Statement statement;
  private final Model model = new Model();
  private final BoolVar[] literals;
  private final Map<List<Integer>, BoolVar> products = new LinkedHashMap<>();

  private Reference(Statement statement) {
    this.statement = statement;
    this.literals = model.boolVarArray(statement.literals());
    for (Decision decision : statement.decisions()) {
      statement.exactlyOne(decision).forEach(this::addChoice);
    }
    statement.rules().forEach(this::add);
  }

  /** Solves a statement, for so many seconds at most. */
  static Answer solve(Statement statement, int seconds) {
    return new Reference(statement).solve(seconds);
  }

  private void addChoice(List<Integer> set) {
    BoolVar[] options = set.stream().map(literal -> literals[literal]).toArray(BoolVar[]::new);
    IntVar choice = model.intVar(0, options.length - 1);
    model.boolsIntChanneling(options, choice, 0).post();
  }

  private void add(Rule rule) {
    if (!rule.required() || rule.parts().stream().anyMatch(part -> part.step() != 1)) {
      throw new IllegalArgumentException("not stated here: " + rule);
    }
    for (Rule.Part part : rule.parts()) {
      Row row = new Row(part.terms(), 1);
      if (Double.isFinite(part.lowest())) {
        model.scalar(row.variables, row.coefficients, ">=", (int) part.lowest()).post();
      }
      if (Double.isFinite(part.highest())) {
        model.scalar(row.variables, row.coefficients, "<=", (int) part.highest()).post();
      }
    }
  }

  /** A polynomial without its constant, scaled to whole coefficients. */
  private final class Row {
    final IntVar[] variables;
    final int[] coefficients;

    Row(Polynomial terms, int scale) {
      List<IntVar> of = new ArrayList<>();
      List<Integer> by = new ArrayList<>();
      terms.forEachTerm(
          (coefficient, term) -> {
            if (term.length > 0) {
              of.add(product(term));
              by.add((int) Math.rint(coefficient * scale));
            }
          });
      variables = of.toArray(IntVar[]::new);
      coefficients = by.stream().mapToInt(Integer::intValue).toArray();
    }
  }

  private BoolVar product(int[] term) {
    if (term.length == 1) {
      return literals[term[0]];
    }
    List<Integer> key = Arrays.stream(term).boxed().toList();
    return products.computeIfAbsent(key, this::tied);
  }

  private BoolVar tied(List<Integer> term) {
    BoolVar product = model.boolVar();
    BoolVar[] factors = term.stream().map(literal -> literals[literal]).toArray(BoolVar[]::new);
    model.min(product, factors).post();
    return product;
  }

  private Answer solve(int seconds) {
    int scale = scale(statement.objective());
    Row row = new Row(statement.objective(), scale);
    IntVar value = model.intVar(-LARGEST, LARGEST, true);
    model.scalar(row.variables, row.coefficients, "=", value).post();
    model.getSolver().limitTime(seconds + "s");
    boolean maximise = statement.sense().sign() < 0;
    Solution best = model.getSolver().findOptimalSolution(value, maximise);
    if (model.getSolver().isStopCriterionMet()) {
      return new Answer(Verdict.UNDECIDED, OptionalDouble.empty());
    }
    return best == null
        ? new Answer(Verdict.INFEASIBLE, OptionalDouble.empty())
        : new Answer(
            Verdict.OPTIMAL,
            OptionalDouble.of(
                best.getIntVal(value) / (double) scale + statement.objective().constant()));
  }

  /** The power of ten that makes every coefficient whole. */
  private static int scale(Polynomial objective) {
    int scale = 1;
    for (int decimals = 0; decimals < MOST_DECIMALS; decimals++) {
      boolean[] whole = {true};
      int power = scale;
      objective.forEachTerm(
          (coefficient, term) ->
              whole[0] &= Math.abs(coefficient * power - Math.rint(coefficient * power)) < 1e-9);
      if (whole[0]) {
        return scale;
      }
      scale *= 10;
    }
    return scale;
  }
}
