package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;

/**
 * A fact that a plan makes true or false: a bit is set, a choice is one of its options, or the
 * negation of such a fact. As an expression it counts 1 where it holds and 0 where it does not.
 *
 * <p>Immutable; belongs to the model of its decision.
 */
@CheckReturnValue
public abstract sealed class Literal extends Expr permits Bit, Fact, Negation {
  Literal() {}

  /** The number of the positive fact among the literals of the model. */
  abstract int index();

  /** Whether the literal is the negation of the fact. */
  abstract boolean negated();

  @Override
  abstract Model owner();

  /** The literal that holds where this one does not. */
  public Literal not() {
    return new Negation(this);
  }

  /** The condition that this holds. */
  public final Condition isTrue() {
    return atLeast(1);
  }

  /** The condition that this does not hold. */
  public final Condition isFalse() {
    return atMost(0);
  }

  /** The condition that the other holds wherever this one does. */
  public final Condition implies(Literal other) {
    return atMost(other);
  }

  /** The condition that this holds exactly where the other does. */
  public final Condition equalTo(Literal other) {
    return exactly(other);
  }
}
