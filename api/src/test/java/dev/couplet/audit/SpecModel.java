package dev.couplet.audit;

import dev.couplet.audit.Spec.Fact;
import dev.couplet.audit.Spec.Limit;
import dev.couplet.audit.Spec.Term;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Condition;
import dev.couplet.model.Decision;
import dev.couplet.model.Expr;
import dev.couplet.model.Literal;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/** A {@link Spec} stated in the model language. */
final class SpecModel {
  final Model model = Model.named("spec");
  final List<Decision> decisions = new ArrayList<>();

  /** Rules that the model refused since no plan can keep them. */
  final List<Limit> refused = new ArrayList<>();

  SpecModel(Spec spec) {
    for (int d = 0; d < spec.options().size(); d++) {
      int options = spec.options().get(d);
      decisions.add(
          options == 0
              ? model.bit("b" + d)
              : model.choice("c" + d, IntStream.range(0, options).boxed().toList()));
    }
    if (spec.maximise()) {
      model.maximize("objective", expr(spec.objective()));
    } else {
      model.minimize("objective", expr(spec.objective()));
    }
    spec.rules().forEach(this::add);
  }

  private void add(Limit rule) {
    Condition condition = condition(rule);
    if (rule.cost().isPresent()) {
      model.prefer(rule.name(), condition, rule.cost().get().doubleValue());
      return;
    }
    try {
      model.require(rule.name(), condition);
    } catch (IllegalArgumentException e) {
      if (!e.getMessage().startsWith("rule '" + rule.name() + "' can be kept by no plan")) {
        throw e;
      }
      refused.add(rule);
    }
  }

  private Condition condition(Limit rule) {
    Expr sum = expr(rule.terms());
    if (rule.lowest().isEmpty()) {
      return sum.atMost(rule.highest().orElseThrow().doubleValue());
    }
    double lowest = rule.lowest().get().doubleValue();
    return rule.highest().isEmpty()
        ? sum.atLeast(lowest)
        : sum.between(lowest, rule.highest().get().doubleValue());
  }

  private Expr expr(List<Term> terms) {
    return Expr.sum(
        terms,
        term -> Expr.product(term.facts(), this::literal).times(term.coefficient().doubleValue()));
  }

  private Literal literal(Fact fact) {
    Decision decision = decisions.get(fact.decision());
    Literal positive;
    if (decision instanceof Choice<?> choice) {
      positive = option(choice).is(fact.option());
    } else {
      positive = fact.option() == 1 ? (Bit) decision : ((Bit) decision).not();
    }
    return fact.negated() ? positive.not() : positive;
  }

  @SuppressWarnings("unchecked")
  private static Choice<Integer> option(Choice<?> choice) {
    return (Choice<Integer>) choice;
  }

  Plan plan(int[] values) {
    Plan.Draft draft = model.plan();
    for (int d = 0; d < values.length; d++) {
      if (decisions.get(d) instanceof Choice<?> choice) {
        draft.set(option(choice), values[d]);
      } else {
        draft.set((Bit) decisions.get(d), values[d] == 1);
      }
    }
    return draft.evaluate();
  }
}
