package dev.couplet.model;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.model.Statement.Objective;
import dev.couplet.model.Statement.Sense;
import java.util.List;
import java.util.stream.Collectors;

/** Writes a statement in words that a person can proof-read; as long as the statement is. */
final class Description {
  private final Statement statement;
  private final StringBuilder text = new StringBuilder();

  private Description(Statement statement) {
    this.statement = statement;
  }

  static String of(Statement statement) {
    Description description = new Description(statement);
    description.write();
    return description.text.toString();
  }

  private void write() {
    text.append("model ").append(statement.name()).append('\n');
    for (Decision decision : statement.decisions()) {
      text.append("  decide ").append(decision.name()).append(": ");
      text.append(statement.isFixed(decision) ? "fixed to " + fixed(decision) : values(decision))
          .append('\n');
    }
    for (Rule rule : statement.rules()) {
      text.append(rule.required() ? "  require " : "  prefer ").append(rule.name()).append(": ");
      for (int p = 0; p < rule.parts().size(); p++) {
        text.append(p == 0 ? "" : "; and ").append(part(rule.parts().get(p)));
      }
      text.append(cost(rule)).append('\n');
    }
    String order = statement.inStrictOrder() ? "in strict order " : "";
    for (Objective objective : statement.objectives()) {
      text.append(statement.sense() == Sense.MINIMIZE ? "  minimize " : "  maximize ")
          .append(order);
      text.append(objective.name()).append(": ").append(terms(objective.terms())).append('\n');
    }
  }

  private Object fixed(Decision decision) {
    State literals = statement.withFixed(State.zeros(statement.literals()));
    return new Values(literals).shown(decision);
  }

  private static String values(Decision decision) {
    if (decision instanceof Choice<?> choice) {
      return "one of " + listed(choice.options());
    } else if (decision instanceof Spin) {
      return "up or down, 1 or -1";
    } else if (decision instanceof Count count) {
      return "a whole number from " + count.lowest() + " to " + count.highest();
    } else if (decision instanceof Order<?> order) {
      return "the order, at " + order.places() + " places, of " + listed(order.items());
    } else if (decision instanceof Subset<?> subset) {
      return "any of " + listed(subset.items());
    }
    return "yes or no";
  }

  private static String listed(List<?> items) {
    return items.stream().map(String::valueOf).collect(Collectors.joining(", "));
  }

  private String part(Rule.Part part) {
    String limits = Text.between(terms(part.terms()), part.lowest(), part.highest());
    String step = part.step() == 1 ? "" : " in steps of " + Text.number(part.step());
    String unit = part.unit() == 1 ? "" : " (in units of " + Text.number(part.unit()) + ")";
    return limits + step + unit;
  }

  private static String cost(Rule rule) {
    String of = rule.squared() ? ", the amount squared costs " : ", each unit costs ";
    String cost = rule.required() ? "" : of + Text.number(rule.costPerUnit());
    return cost + (rule.alwaysKept() ? "; every plan keeps it" : "");
  }

  private String terms(Polynomial polynomial) {
    StringBuilder sum = new StringBuilder();
    polynomial.forEachTerm(
        (coefficient, literals) -> {
          sum.append(sum.isEmpty() ? "" : coefficient < 0 ? " - " : " + ");
          double shown = sum.isEmpty() ? coefficient : Math.abs(coefficient);
          sum.append(shown == 1 && literals.length > 0 ? "" : Text.number(shown));
          for (int literal : literals) {
            sum.append('[').append(statement.describe(literal)).append(']');
          }
        });
    return sum.isEmpty() ? "0" : sum.toString();
  }
}
