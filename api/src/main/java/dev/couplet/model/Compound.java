package dev.couplet.model;

import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Predicate;
import org.jspecify.annotations.Nullable;

/**
 * A literal that holds where all of its parts do, where any does, or where an odd number does.
 *
 * <p>Parts of the same kind are taken apart, and what is said twice is said once, so that {@code
 * a.and(b).and(c)} is one literal of three parts. There are two parts at the least.
 */
final class Compound extends Literal {
  /** When the literal holds. */
  enum Kind {
    ALL("and"),
    ANY("or"),
    ODD("xor");

    /** The word between two parts. */
    final String word;

    Kind(String word) {
      this.word = word;
    }
  }

  private static final int MOST_LITERALS = 1 << 24;

  private final Kind kind;
  private final List<Literal> parts;
  private final Model owner;
  private final int size;

  private Compound(Kind kind, List<Literal> parts) {
    this.kind = kind;
    this.parts = List.copyOf(parts);
    this.owner = ownerOf(parts);
    this.size = size(parts);
  }

  /** The literal of so many; a plain one if they come to one. */
  static Literal of(Kind kind, Collection<? extends Literal> literals) {
    if (literals.isEmpty()) {
      throw new IllegalArgumentException(
          "a literal is made of no literals by '" + kind.word + "'; give it at least one");
    }
    Map<Object, Literal> parts = new LinkedHashMap<>();
    for (Literal literal : literals) {
      if (literal instanceof Compound compound && compound.kind == kind) {
        compound.parts.forEach(part -> add(kind, part, parts));
      } else {
        add(kind, literal, parts);
      }
    }
    if (parts.isEmpty()) {
      Literal any = literals.iterator().next();
      return new Compound(kind, List.of(any, any));
    }
    List<Literal> left = List.copyOf(parts.values());
    ownerOf(List.copyOf(literals));
    return left.size() == 1 ? left.get(0) : new Compound(kind, left);
  }

  /** Two equal parts are as good as one; of an odd number, as good as none. */
  private static void add(Kind kind, Literal part, Map<Object, Literal> parts) {
    Object key = part;
    if (!(part instanceof Compound)) {
      key = part.negated() ? ~part.index() : part.index();
    }
    if (kind == Kind.ODD && parts.containsKey(key)) {
      parts.remove(key);
    } else {
      parts.putIfAbsent(key, part);
    }
  }

  private static Model ownerOf(List<? extends Literal> parts) {
    @Nullable Model owner = null;
    for (Literal part : parts) {
      owner = commonOwner(owner, part.owner());
    }
    return owner == null ? parts.get(0).owner() : owner;
  }

  private static int size(List<Literal> parts) {
    long size = 0;
    for (Literal part : parts) {
      size += part instanceof Compound compound ? compound.size : 1;
    }
    if (size > MOST_LITERALS) {
      throw new IllegalArgumentException(
          "a literal would be made of "
              + size
              + " others, beyond "
              + MOST_LITERALS
              + "; give a part that comes up often a bit of its own, by"
              + " require(name, bit.equalTo(part))");
    }
    return (int) size;
  }

  Kind kind() {
    return kind;
  }

  List<Literal> parts() {
    return parts;
  }

  /** The negations of the parts. */
  List<Literal> negatedParts() {
    return parts.stream().map(Literal::not).toList();
  }

  /** Whether it holds, when it is known which plain literals do. */
  boolean holds(Predicate<Literal> literals) {
    return switch (kind) {
      case ALL -> parts.stream().allMatch(part -> holds(part, literals));
      case ANY -> parts.stream().anyMatch(part -> holds(part, literals));
      case ODD -> (parts.stream().filter(part -> holds(part, literals)).count() & 1) == 1;
    };
  }

  private static boolean holds(Literal part, Predicate<Literal> literals) {
    return part instanceof Compound compound ? compound.holds(literals) : literals.test(part);
  }

  /** None: it is no single fact. */
  @Override
  int index() {
    return -1;
  }

  @Override
  boolean negated() {
    return false;
  }

  @Override
  Model owner() {
    return owner;
  }

  /** By the laws of De Morgan; of an odd number, with one part negated. */
  @Override
  public Literal not() {
    if (kind == Kind.ODD) {
      List<Literal> turned = new ArrayList<>(parts);
      turned.set(0, parts.get(0).not());
      return new Compound(kind, turned);
    }
    return new Compound(kind == Kind.ALL ? Kind.ANY : Kind.ALL, negatedParts());
  }

  @Override
  public String toString() {
    return Text.of(this);
  }
}
