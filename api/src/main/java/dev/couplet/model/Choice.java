package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

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
  private final List<T> options;
  private final Map<T, Integer> positions;

  Choice(Model owner, String name, int firstLiteral, List<T> options) {
    this.name = name;
    this.slot = new Slot(owner, firstLiteral, options.size(), 1);
    this.options = options;
    this.positions = new HashMap<>();
    for (T option : options) {
      if (positions.putIfAbsent(option, positions.size()) != null) {
        throw new IllegalArgumentException(
            "choice '" + name + "' lists option " + option + " twice");
      }
    }
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
    return options;
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
    Integer position = positions.get(option);
    if (position == null) {
      throw new IllegalArgumentException(
          "'" + option + "' is not an option of choice '" + name + "': " + Text.list(options));
    }
    return position;
  }

  Slot slot() {
    return slot;
  }

  @Override
  public String toString() {
    return name;
  }
}
