package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import java.util.Collection;
import java.util.Collections;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Set;
import java.util.function.Consumer;
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

  /** Makes no decision before all keys and names are known to be good. */
  static <K, D extends Decision> Family<K, D> of(
      String name, Collection<K> keys, Consumer<String> check, Function<String, D> maker) {
    Check.name("a family", name);
    Map<K, String> names = new LinkedHashMap<>();
    Map<String, K> keyOf = new HashMap<>();
    for (K key : keys) {
      String member = name + " " + key;
      check.accept(member);
      if (names.put(key, member) != null) {
        throw new IllegalArgumentException("family '" + name + "' has the key " + key + " twice");
      }
      if (keyOf.put(member, key) != null) {
        throw new IllegalArgumentException(
            "family '"
                + name
                + "' has two keys that are written "
                + key
                + "; give them a toString that tells them apart");
      }
    }
    Map<K, D> members = new LinkedHashMap<>();
    names.forEach((key, member) -> members.put(key, maker.apply(member)));
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
