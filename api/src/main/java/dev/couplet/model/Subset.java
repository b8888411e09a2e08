package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import java.util.Collection;
import java.util.List;

/**
 * A decision which of some items to take: any number of them, none and all too.
 *
 * @param <T> the type of the items, told apart by {@code equals} and named by {@code toString}
 */
@CheckReturnValue
public final class Subset<T> implements Decision {
  private final String name;
  private final Slot slot;
  private final Positions<T> items;

  Subset(Model owner, String name, int firstLiteral, Collection<T> items) {
    this.name = name;
    this.items = new Positions<>("subset '" + name + "'", "item", items);
    this.slot = new Slot(owner, firstLiteral, items.size(), 0);
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public long values() {
    return items.size() < Long.SIZE - 1 ? 1L << items.size() : Long.MAX_VALUE;
  }

  /** The items to take from, in the order given. */
  public List<T> items() {
    return items.items();
  }

  /**
   * The fact that an item is taken.
   *
   * @throws IllegalArgumentException if it is not among the items
   */
  public Literal contains(T item) {
    return new Fact(this, slot, positionOf(item));
  }

  /** How many items are taken. */
  public Expr size() {
    return Expr.sum(items(), this::contains);
  }

  int positionOf(T item) {
    return items.of(item, "an item");
  }

  Slot slot() {
    return slot;
  }

  @Override
  public String toString() {
    return name;
  }
}
