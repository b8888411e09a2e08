package dev.couplet.model;

import dev.couplet.form.State;
import java.util.HashSet;
import java.util.Set;

/**
 * A plan being written by hand: set every decision, then evaluate. Belongs to one thread.
 *
 * <p>Use it to score what is done today, or as a start for a sampler.
 */
public final class PlanDraft {
  private final Statement statement;
  private final boolean[] literals;
  private final Set<Decision> decided = new HashSet<>();

  PlanDraft(Statement statement) {
    this.statement = statement;
    this.literals = new boolean[statement.literals()];
  }

  /**
   * Sets a choice, also a second time.
   *
   * @throws IllegalArgumentException if it is of another model, or has no such option
   */
  public <T> PlanDraft set(Choice<T> choice, T option) {
    statement.require(choice);
    int position = choice.positionOf(option);
    for (int k = 0; k < choice.values(); k++) {
      literals[choice.firstLiteral() + k] = k == position;
    }
    decided.add(choice);
    return this;
  }

  /**
   * Sets a bit, also a second time.
   *
   * @throws IllegalArgumentException if it is of another model
   */
  public PlanDraft set(Bit bit, boolean value) {
    statement.require(bit);
    literals[bit.index()] = value;
    decided.add(bit);
    return this;
  }

  /**
   * The plan with these values, checked against the model.
   *
   * @throws IllegalStateException naming the first decision that was not set
   */
  public Plan evaluate() {
    for (Decision decision : statement.decisions()) {
      if (!decided.contains(decision)) {
        throw new IllegalStateException(
            "decision '" + decision.name() + "' is not set; set every decision of the plan");
      }
    }
    return statement.plan(State.of(literals));
  }
}
