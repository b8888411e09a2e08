package dev.couplet.model;

import java.util.Collection;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** The things that a decision is about, in the order given, each once; found by {@code equals}. */
final class Positions<T> {
  private final String what;
  private final List<T> items;
  private final Map<T, Integer> positions = new HashMap<>();

  /** {@code what} names the decision, as in "choice 'van'". */
  Positions(String what, String one, Collection<T> items) {
    this.what = what;
    this.items = List.copyOf(items);
    for (T item : this.items) {
      if (positions.putIfAbsent(item, positions.size()) != null) {
        throw new IllegalArgumentException(what + " lists " + one + " " + item + " twice");
      }
    }
  }

  List<T> items() {
    return items;
  }

  int size() {
    return items.size();
  }

  int of(T item, String one) {
    Integer position = positions.get(item);
    if (position == null) {
      throw new IllegalArgumentException(
          "'" + item + "' is not " + one + " of " + what + ": " + Text.list(items));
    }
    return position;
  }
}
