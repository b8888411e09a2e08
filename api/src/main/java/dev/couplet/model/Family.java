package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import java.util.Collection;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.Map;
import java.util.Set;
import java.util.function.Function;

/**
 * Decisions of one kind, one for each key. Immutable, in the order of the keys.
 *
 * @param <K> the type of the keys, told apart by {@code equals}
 * @param <D> the kind of decision
 */
@CheckReturnValue
public final class Family<K, D extends Decision> {
  private final String name;
  private final Map<K, D> members;

  private Family(String name, Map<K, D> members) {
    this.name = name;
    this.members = members;
  }

  static <K, D extends Decision> Family<K, D> of(
      String name, Collection<K> keys, Function<K, D> maker) {
    Check.name("a family", name);
    Set<K> distinct = new LinkedHashSet<>();
    for (K key : keys) {
      if (!distinct.add(key)) {
        throw new IllegalArgumentException("family '" + name + "' has the key " + key + " twice");
      }
    }
    Map<K, D> members = new LinkedHashMap<>();
    for (K key : distinct) {
      members.put(key, maker.apply(key));
    }
    return new Family<>(name, Collections.unmodifiableMap(members));
  }

  /** The name that the names of the members begin with. */
  public String name() {
    return name;
  }

  /**
   * The decision for a key.
   *
   * @throws IllegalArgumentException naming the key if there is none
   */
  public D of(K key) {
    D member = members.get(key);
    if (member == null) {
      throw new IllegalArgumentException(
          "family '" + name + "' has no decision for " + key + ": " + Text.list(members.keySet()));
    }
    return member;
  }

  /** The keys, in the order given. */
  public Set<K> keys() {
    return members.keySet();
  }

  /** The decisions, in the order of their keys. */
  public Collection<D> decisions() {
    return members.values();
  }

  @Override
  public String toString() {
    return name + Text.list(members.keySet());
  }
}
