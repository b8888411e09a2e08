package dev.couplet.audit;

import dev.couplet.audit.LogicSpec.Said;
import dev.couplet.audit.LogicSpec.Term;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Condition;
import dev.couplet.model.Expr;
import dev.couplet.model.Literal;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/** A {@link LogicSpec} stated in the model language. */
final class LogicSpecModel {
  final Model model = Model.named("logic");

  /** Rules that the model refused since no plan can keep them. */
  final List<LogicSpec.Rule> refused = new ArrayList<>();

  private final List<Bit> bits = new ArrayList<>();
  private final List<Choice<Integer>> choices = new ArrayList<>();
  private final LogicSpec spec;

  LogicSpecModel(LogicSpec spec) {
    this.spec = spec;
    for (int d = 0; d < spec.options().size(); d++) {
      int options = spec.options().get(d);
      bits.add(options == 0 ? model.bit("b" + d) : null);
      List<Integer> values = IntStream.range(0, options).boxed().toList();
      choices.add(options == 0 ? null : model.choice("c" + d, values));
    }
    Expr tables =
        Expr.sum(
            spec.tables(),
            table ->
                choices
                    .get(table.first())
                    .lookUp(
                        choices.get(table.second()), (row, column) -> table.costs()[row][column]));
    model.minimize("objective", expr(spec.objective()).plus(tables));
    spec.rules().forEach(this::add);
  }

  private void add(LogicSpec.Rule rule) {
    Condition condition = condition(rule.said());
    if (!rule.required() && rule.squared()) {
      model.preferSquared(rule.name(), condition, rule.cost().getAsInt());
    } else if (!rule.required()) {
      model.prefer(rule.name(), condition, rule.cost().getAsInt());
    } else {
      try {
        model.require(rule.name(), condition);
      } catch (IllegalArgumentException e) {
        if (!e.getMessage().startsWith("rule '" + rule.name() + "' can be kept by no plan")) {
          throw e;
        }
        refused.add(rule);
      }
    }
  }

  private Condition condition(Said said) {
    if (said instanceof LogicSpec.Holds holds) {
      Literal literal = literal(holds.formula());
      return holds.asNumber() ? literal.atLeast(1) : literal.isTrue();
    } else if (said instanceof LogicSpec.Implies implies) {
      return literal(implies.first()).implies(literal(implies.second()));
    } else if (said instanceof LogicSpec.Same same) {
      return literal(same.first()).equalTo(literal(same.second()));
    } else if (said instanceof LogicSpec.OddWhen odd) {
      return Literal.oddOf(literals(odd.formulas())).isTrue().when(literal(odd.guard()));
    } else if (said instanceof LogicSpec.Limits limits) {
      return limits(limits);
    }
    LogicSpec.Different different = (LogicSpec.Different) said;
    return Condition.allDifferent(different.decisions().stream().map(choices::get).toList());
  }

  private Condition limits(LogicSpec.Limits limits) {
    Expr sum = expr(limits.terms());
    Condition condition;
    if (limits.lowest() == -LogicSpec.Limits.NONE) {
      condition = sum.atMost(limits.highest());
    } else if (limits.highest() == LogicSpec.Limits.NONE) {
      condition = sum.atLeast(limits.lowest());
    } else {
      condition = sum.between(limits.lowest(), limits.highest());
    }
    for (Formula guard : limits.guards()) {
      condition = condition.when(literal(guard));
    }
    return condition;
  }

  private Expr expr(List<Term> terms) {
    return Expr.sum(terms, term -> literal(term.formula()).times(term.coefficient()));
  }

  private List<Literal> literals(List<Formula> formulas) {
    return formulas.stream().map(this::literal).toList();
  }

  Literal literal(Formula formula) {
    if (formula instanceof Formula.Not not) {
      return literal(not.of()).not();
    } else if (formula instanceof Formula.All all) {
      return Literal.allOf(literals(all.of()));
    } else if (formula instanceof Formula.Any any) {
      return Literal.anyOf(literals(any.of()));
    } else if (formula instanceof Formula.Odd odd) {
      return Literal.oddOf(literals(odd.of()));
    }
    Formula.Is is = (Formula.Is) formula;
    if (spec.options().get(is.decision()) > 0) {
      return choices.get(is.decision()).is(is.option());
    }
    Bit bit = bits.get(is.decision());
    return is.option() == 1 ? bit : bit.not();
  }

  Plan plan(int[] values) {
    Plan.Draft draft = model.plan();
    for (int d = 0; d < values.length; d++) {
      if (spec.options().get(d) > 0) {
        draft.set(choices.get(d), values[d]);
      } else {
        draft.set(bits.get(d), values[d] == 1);
      }
    }
    return draft.evaluate();
  }
}
