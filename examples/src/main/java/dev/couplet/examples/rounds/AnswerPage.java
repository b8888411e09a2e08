package dev.couplet.examples.rounds;

import dev.couplet.solve.Answer;
import dev.couplet.solve.Proof;
import java.util.stream.Collectors;

/**
 * The sixth page of the report: what the plan is worth, how good any plan can be, what is proved.
 */
final class AnswerPage {
  private final RoundsModel rounds;
  private final Answer answer;

  private AnswerPage(RoundsModel rounds, Answer answer) {
    this.rounds = rounds;
    this.answer = answer;
  }

  static String of(RoundsModel rounds, Answer answer) {
    return new AnswerPage(rounds, answer).text();
  }

  /** The answer in one line. */
  static String summary(Answer answer) {
    if (!answer.plan().feasible()) {
      return answer.proof() == Proof.INFEASIBLE
          ? "No plan keeps all required rules; this one is nearest at hand."
          : "This plan does not keep all required rules.";
    }
    String value = "The plan is worth " + Numbers.metres(answer.value());
    return answer.proof() == Proof.OPTIMAL
        ? value + ", and no plan is better: proved."
        : value + "; none is worth less than " + Numbers.metres(answer.bound()) + ".";
  }

  private String text() {
    Columns table = new Columns("lrl");
    if (answer.plan().feasible()) {
      table.row("value", Numbers.metres(answer.value()), parts());
      table.row("lower bound", Numbers.metres(answer.bound()), "no plan is worth less");
      table.row("gap", Numbers.metres(answer.gap()), "no plan is better by more than this");
    } else {
      table.row("value", "none", "no plan that keeps all required rules was found");
    }
    table.row("proof", proofName(), proofWords());
    table.row("end", endName(), stages());
    return Sheet.headed("6. How good it is").table(table).toString();
  }

  private String parts() {
    long distance = rounds.rounds(answer.plan()).stream().mapToLong(Round::metres).sum();
    double wishes = answer.plan().unmet().stream().mapToDouble(unmet -> unmet.cost()).sum();
    return "distances " + distance + " m, unmet wishes " + Numbers.metres(wishes);
  }

  private String proofName() {
    return switch (answer.proof()) {
      case NONE -> "none";
      case OPTIMAL -> "optimal";
      case INFEASIBLE -> "infeasible";
    };
  }

  private String proofWords() {
    return switch (answer.proof()) {
      case NONE -> answer.plan().feasible() ? "there may be a better plan" : "there may be one";
      case OPTIMAL -> "no plan that keeps all rules is better";
      case INFEASIBLE -> "no plan keeps all required rules";
    };
  }

  private String endName() {
    return switch (answer.end()) {
      case DONE -> "done";
      case TARGET -> "target";
      case DEADLINE -> "time up";
      case STOPPED -> "stopped";
    };
  }

  private String stages() {
    return answer.stages().stream()
        .map(stage -> stage.name() + ": " + stage.outcome())
        .collect(Collectors.joining("; "));
  }
}
