package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import java.util.Collection;
import java.util.List;

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
