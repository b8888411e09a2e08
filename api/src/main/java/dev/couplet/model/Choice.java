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
  private final Model owner;
  private final String name;
  private final int firstLiteral;
  private final List<T> options;
  private final Map<T, Integer> positions;

  Choice(Model owner, String name, int firstLiteral, List<T> options) {
    this.owner = owner;
    this.name = name;
    this.firstLiteral = firstLiteral;
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
  public int values() {
    return options.size();
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
    return new ChoiceLiteral(this, positionOf(option));
  }

  int positionOf(T option) {
    Integer position = positions.get(option);
    if (position == null) {
      throw new IllegalArgumentException(
          "'" + option + "' is not an option of choice '" + name + "': " + Text.list(options));
    }
    return position;
  }

  int firstLiteral() {
    return firstLiteral;
  }

  Model owner() {
    return owner;
  }

  @Override
  public String toString() {
    return name;
  }
}
