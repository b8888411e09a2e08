package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.function.ToDoubleBiFunction;
import java.util.function.ToDoubleFunction;

/**
 * A decision for exactly one of several options.
 *
 * <p>Options are told apart by {@code equals} and named by {@code toString}.
 *
 * @param <T> the type of the options
 */
@CheckReturnValue
public final class Choice<T> implements Decision {
  private final String name;
  private final Slot slot;
  private final Positions<T> options;

  Choice(Model owner, String name, int firstLiteral, Collection<T> options) {
    this.name = name;
    this.options = new Positions<>("choice '" + name + "'", "option", options);
    this.slot = new Slot(owner, firstLiteral, options.size(), 1);
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public long values() {
    return options.size();
  }

  @Override
  public String code() {
    return "one option of '" + name + "'";
  }

  /** The options, in the order given. */
  public List<T> options() {
    return options.items();
  }

  /**
   * The fact that the choice is this option.
   *
   * @throws IllegalArgumentException if it is not among the options
   */
  public Literal is(T option) {
    return new Fact(this, slot, positionOf(option));
  }

  /**
   * The number that a table has for the option that the choice is.
   *
   * @throws IllegalArgumentException naming the option, if its number is not finite
   */
  public Expr lookUp(ToDoubleFunction<? super T> table) {
    return Expr.sum(
        options(), option -> is(option).times(entry(table.applyAsDouble(option), option)));
  }

  /**
   * The number that a table has for the options that this and another choice are, say a distance.
   *
   * @throws IllegalArgumentException naming the options, if their number is not finite, or if the
   *     other choice is of another model
   */
  public <U> Expr lookUp(Choice<U> other, ToDoubleBiFunction<? super T, ? super U> table) {
    List<Expr> entries = new ArrayList<>();
    for (T row : options()) {
      for (U column : other.options()) {
        double number = entry(table.applyAsDouble(row, column), row + ", " + column);
        entries.add(is(row).times(other.is(column)).times(number));
      }
    }
    return Expr.sum(entries);
  }

  private double entry(double number, Object options) {
    return Check.finite("what the table of choice '" + name + "' has for " + options, number);
  }

  int positionOf(T option) {
    return options.of(option, "an option");
  }

  Slot slot() {
    return slot;
  }

  @Override
  public String toString() {
    return name;
  }
}
