package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.function.ToDoubleBiFunction;

/**
 * A decision in what order some items come: every place takes one item, no item takes two places.
 * There may be fewer places than items; some items are then left out.
 *
 * <p>Places are numbered from 0. The literal that an item is at a place is number {@code place *
 * items + item} of the decision.
 *
 * @param <T> the type of the items, told apart by {@code equals} and named by {@code toString}
 */
@CheckReturnValue
public final class Order<T> implements Decision {
  private final String name;
  private final Slot slot;
  private final Positions<T> items;
  private final int places;

  Order(Model owner, String name, int firstLiteral, Collection<T> items, int places) {
    this.name = name;
    this.items = new Positions<>("order '" + name + "'", "item", items);
    this.places = places;
    this.slot = new Slot(owner, firstLiteral, Math.multiplyExact(places, items.size()), places);
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public long values() {
    long values = 1;
    for (int place = 0; place < places; place++) {
      long left = (long) items.size() - place;
      values = values > Long.MAX_VALUE / left ? Long.MAX_VALUE : values * left;
    }
    return values;
  }

  @Override
  public String code() {
    return "one item a place of '" + name + "'";
  }

  /** The name of the rule, part of the decision, that no item takes two places. */
  String onceRule() {
    return "no item twice in '" + name + "'";
  }

  /** The items, in the order given. */
  public List<T> items() {
    return items.items();
  }

  /** The number of places. */
  public int places() {
    return places;
  }

  /**
   * The fact that an item is at a place, numbered from 0.
   *
   * @throws IllegalArgumentException if it is not among the items, or there is no such place
   */
  public Literal at(T item, int place) {
    if (place < 0 || place >= places) {
      throw new IllegalArgumentException(
          "order '" + name + "' has places 0 to " + (places - 1) + ", not " + place);
    }
    return new Fact(this, slot, place * items.size() + positionOf(item));
  }

  /** The fact that an item is at the first place. */
  public Literal first(T item) {
    return at(item, 0);
  }

  /** The fact that an item is at the last place. */
  public Literal last(T item) {
    return at(item, places - 1);
  }

  /** 1 where an item has a place, 0 where it is left out. */
  public Expr contains(T item) {
    List<Expr> sum = new ArrayList<>(places);
    for (int place = 0; place < places; place++) {
      sum.add(at(item, place));
    }
    return Expr.sum(sum);
  }

  /** The number of an item's place, 0 also where it has none. */
  public Expr placeOf(T item) {
    List<Expr> sum = new ArrayList<>(places);
    for (int place = 1; place < places; place++) {
      sum.add(at(item, place).times(place));
    }
    return Expr.sum(sum);
  }

  /** 1 where both items have places and the former comes before the latter, else 0. */
  public Expr before(T former, T latter) {
    List<Expr> sum = new ArrayList<>();
    for (int place = 0; place < places; place++) {
      for (int later = place + 1; later < places; later++) {
        sum.add(at(former, place).times(at(latter, later)));
      }
    }
    return Expr.sum(sum);
  }

  /**
   * The sum, over all places but the last, of what it costs to go from the item there to the next.
   */
  public Expr stepCost(ToDoubleBiFunction<? super T, ? super T> cost) {
    List<Expr> steps = new ArrayList<>();
    for (int place = 0; place + 1 < places; place++) {
      addSteps(place, place + 1, cost, steps);
    }
    return Expr.sum(steps);
  }

  /** The sum of all steps, with the one from the last place back to the first. */
  public Expr cycleCost(ToDoubleBiFunction<? super T, ? super T> cost) {
    List<Expr> steps = new ArrayList<>(List.of(stepCost(cost)));
    if (places > 1) {
      addSteps(places - 1, 0, cost, steps);
    }
    return Expr.sum(steps);
  }

  private void addSteps(
      int from, int to, ToDoubleBiFunction<? super T, ? super T> cost, List<Expr> steps) {
    for (T here : items()) {
      for (T there : items()) {
        if (!here.equals(there)) {
          double amount = cost.applyAsDouble(here, there);
          Check.finite("the cost of a step from " + here + " to " + there, amount);
          steps.add(at(here, from).times(at(there, to)).times(amount));
        }
      }
    }
  }

  /** Each item once if there is a place for all, else at most once. */
  Condition once() {
    List<Condition.Part> parts = new ArrayList<>();
    double lowest = places == items.size() ? 1 : Double.NEGATIVE_INFINITY;
    for (T item : items()) {
      parts.add(new Condition.Part(contains(item), lowest, 1));
    }
    return new Condition(parts);
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
