package dev.couplet.model;

import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;

/** What decided decisions are under a pattern of literals, and the patterns of their values. */
final class Values {
  private final State literals;

  Values(State literals) {
    this.literals = literals;
  }

  /** The position of the only literal that holds among some from a first one on. */
  private int only(int first) {
    int position = 0;
    while (!literals.get(first + position)) {
      position++;
    }
    return position;
  }

  <T> T of(Choice<T> choice) {
    return choice.options().get(only(choice.slot().first()));
  }

  int of(Spin spin) {
    return literals.spin(spin.slot().first());
  }

  long of(Count count) {
    long value = count.lowest();
    for (int k = 0; k < count.digits().length; k++) {
      value += literals.get(count.slot().first() + k) ? count.digits()[k] : 0;
    }
    return value;
  }

  <T> List<T> of(Order<T> order) {
    List<T> items = new ArrayList<>();
    for (int place = 0; place < order.places(); place++) {
      items.add(order.items().get(only(order.slot().first() + place * order.items().size())));
    }
    return List.copyOf(items);
  }

  <T> Set<T> of(Subset<T> subset) {
    Set<T> taken = new LinkedHashSet<>();
    for (int k = 0; k < subset.items().size(); k++) {
      if (literals.get(subset.slot().first() + k)) {
        taken.add(subset.items().get(k));
      }
    }
    return taken;
  }

  static <T> boolean[] pattern(Choice<T> choice, T option) {
    boolean[] pattern = new boolean[choice.options().size()];
    pattern[choice.positionOf(option)] = true;
    return pattern;
  }

  static boolean[] pattern(Spin spin, int value) {
    if (value != 1 && value != -1) {
      throw new IllegalArgumentException(
          "spin '" + spin.name() + "' cannot be " + value + ", it is 1 or -1");
    }
    return new boolean[] {value < 0};
  }

  static boolean[] pattern(Count count, long value) {
    long above = count.requireWithin(value) - count.lowest();
    return Digits.pattern(above, count.digits());
  }

  static <T> boolean[] pattern(Order<T> order, List<? extends T> value) {
    if (value.size() != order.places()) {
      throw new IllegalArgumentException(
          "order '"
              + order.name()
              + "' has "
              + order.places()
              + " places, "
              + value.size()
              + " items are given");
    }
    boolean[] pattern = new boolean[order.places() * order.items().size()];
    for (int place = 0; place < value.size(); place++) {
      pattern[place * order.items().size() + order.positionOf(value.get(place))] = true;
    }
    return pattern;
  }

  static <T> boolean[] pattern(Subset<T> subset, Collection<? extends T> taken) {
    boolean[] pattern = new boolean[subset.items().size()];
    for (T item : taken) {
      pattern[subset.positionOf(item)] = true;
    }
    return pattern;
  }

  /** Any of them, for a text. */
  Object shown(Decision decision) {
    if (decision instanceof Bit bit) {
      return literals.get(bit.index());
    } else if (decision instanceof Choice<?> choice) {
      return of(choice);
    } else if (decision instanceof Spin spin) {
      return of(spin) > 0 ? "up" : "down";
    } else if (decision instanceof Count count) {
      return of(count);
    } else if (decision instanceof Order<?> order) {
      return of(order);
    }
    return of((Subset<?>) decision);
  }

  /** The same values, each count in the pattern that is its value's own. */
  State normal(Statement statement) {
    State normal = literals;
    for (Decision decision : statement.decisions()) {
      if (decision instanceof Count count) {
        boolean[] own = Digits.pattern(of(count) - count.lowest(), count.digits());
        for (int k = 0; k < own.length; k++) {
          int literal = count.slot().first() + k;
          normal = normal.get(literal) == own[k] ? normal : normal.flipped(literal);
        }
      }
    }
    return normal;
  }
}
