package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.model.Compound.Kind;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.List;

/**
 * A fact that a plan makes true or false: a bit is set, a choice is one of its options, the
 * negation of such a fact, or what {@code and}, {@code or} and {@code xor} make of several. As an
 * expression it counts 1 where it holds and 0 where it does not.
 *
 * <p>Facts that are combined stay as they are written; they are multiplied out only where they
 * count in an expression, which takes up to {@code 2^n} terms for n facts and is refused beyond
 * {@code 2^20}. Conditions on them ({@link #isTrue}, {@link #implies}, {@link #equalTo}) avoid
 * that: they come to sums of the facts wherever the shape allows.
 *
 * <p>Immutable; belongs to the model of its decision.
 */
@CheckReturnValue
public abstract sealed class Literal extends Expr permits Bit, Fact, Negation, Compound {
  Literal() {}

  /** The number of the positive fact among the literals of the model; -1 if it is no single one. */
  abstract int index();

  /** Whether the literal is the negation of the fact. */
  abstract boolean negated();

  @Override
  abstract Model owner();

  /** The literal that holds where all of the given ones do. */
  public static Literal allOf(Collection<? extends Literal> literals) {
    return Compound.of(Kind.ALL, literals);
  }

  /** The literal that holds where at least one of the given ones does. */
  public static Literal anyOf(Collection<? extends Literal> literals) {
    return Compound.of(Kind.ANY, literals);
  }

  /** The literal that holds where an odd number of the given ones does. */
  public static Literal oddOf(Collection<? extends Literal> literals) {
    return Compound.of(Kind.ODD, literals);
  }

  /** The literal that holds where this and all of the others do. */
  public final Literal and(Literal... others) {
    return allOf(withThis(others));
  }

  /** The literal that holds where this or one of the others does. */
  public final Literal or(Literal... others) {
    return anyOf(withThis(others));
  }

  /** The literal that holds where an odd number of this and the others does. */
  public final Literal xor(Literal... others) {
    return oddOf(withThis(others));
  }

  private List<Literal> withThis(Literal... others) {
    List<Literal> all = new ArrayList<>(others.length + 1);
    all.add(this);
    all.addAll(Arrays.asList(others));
    return all;
  }

  /** The literal that holds where this one does not. */
  public Literal not() {
    return new Negation(this);
  }

  /**
   * The condition that this holds. It is missed by 1 where it does not; but where all of several
   * literals are to hold, by the number of those that do not. {@code atLeast(1)} is missed by 1 in
   * any case.
   */
  public final Condition isTrue() {
    return Logic.holds(this);
  }

  /** The condition that this does not hold. */
  public final Condition isFalse() {
    return this instanceof Compound ? Logic.holds(not()) : atMost(0);
  }

  /**
   * The condition that the other holds wherever this one does. An {@code or} that implies an {@code
   * and} is one implication for each pair of their parts, and missed by as many as fail.
   */
  public final Condition implies(Literal other) {
    return Logic.implies(this, other);
  }

  /** The condition that this holds exactly where the other does. */
  public final Condition equalTo(Literal other) {
    return Logic.equal(this, other);
  }
}
