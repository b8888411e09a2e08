package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/**
 * A statement about a plan that may hold or not: an expression lies between two limits, or several
 * do; perhaps only where a literal holds.
 *
 * <p>It has no name, and no effect until a {@link Model} requires or prefers it. Immutable.
 */
@CheckReturnValue
public final class Condition {
  /**
   * One expression between its limits.
   *
   * @param expr the expression
   * @param lowest the lower limit, or minus infinity
   * @param highest the upper limit, or infinity
   * @param step above 0, the values that count lie on {@code lowest + k step}; 0 if all do
   * @param inFull what the part says as a literal, where there are steps
   * @param guards the limits matter only where all of these hold
   */
  record Part(
      Expr expr,
      double lowest,
      double highest,
      double step,
      Optional<Literal> inFull,
      List<Literal> guards) {
    Part(Expr expr, double lowest, double highest) {
      this(expr, lowest, highest, 0, Optional.empty(), List.of());
    }

    @Override
    public String toString() {
      String text = Text.between(expr.toString(), lowest, highest);
      String stepped = step == 0 ? text : text + " in steps of " + Text.number(step);
      return guards.isEmpty() ? stepped : stepped + " when " + Literal.allOf(guards);
    }

    Part when(Literal guard) {
      List<Literal> more = Stream.concat(guards.stream(), Stream.of(guard)).toList();
      @Nullable Model owner = expr.owner();
      for (Literal one : more) {
        owner = Expr.commonOwner(owner, one.owner());
      }
      return new Part(expr, lowest, highest, step, inFull, more);
    }

    /** Without steps; a literal in their stead, which is missed by as much. */
    Part withoutSteps() {
      return inFull
          .map(literal -> new Part(literal, 1, Double.POSITIVE_INFINITY, 0, inFull, guards))
          .orElse(this);
    }
  }

  private static final int SHOWN = 4;

  private final List<Part> parts;

  Condition(List<Part> parts) {
    this.parts = List.copyOf(parts);
  }

  static Condition between(Expr expr, double lowest, double highest) {
    return new Condition(List.of(new Part(expr, lowest, highest)));
  }

  /** An expression is one of 1, 3, .., highest; as a literal it is the given one. */
  static Condition odd(Expr expr, int highest, Literal inFull) {
    return new Condition(List.of(new Part(expr, 1, highest, 2, Optional.of(inFull), List.of())));
  }

  /** The condition that all of the given ones hold; amounts by which they are missed add up. */
  public static Condition all(Collection<Condition> conditions) {
    return new Condition(conditions.stream().flatMap(one -> one.parts.stream()).toList());
  }

  /** The condition that at most so many of the literals hold. */
  public static Condition atMost(int count, Collection<? extends Literal> literals) {
    return Expr.sum(literals).atMost(count);
  }

  /** The condition that at least so many of the literals hold. */
  public static Condition atLeast(int count, Collection<? extends Literal> literals) {
    return Expr.sum(literals).atLeast(count);
  }

  /** The condition that so many of the literals hold, no more and no fewer. */
  public static Condition exactly(int count, Collection<? extends Literal> literals) {
    return Expr.sum(literals).exactly(count);
  }

  /** The condition that none of the literals holds. */
  public static Condition none(Collection<? extends Literal> literals) {
    return atMost(0, literals);
  }

  /**
   * The condition that no two of the choices are the same option: for each option, at most one of
   * the choices that have it is that option. An option that several more take is missed by as many.
   *
   * @throws IllegalArgumentException if a choice is given twice, two are of different models, or
   *     there are more choices than options among all of them
   */
  public static <T> Condition allDifferent(Collection<? extends Choice<T>> choices) {
    Map<T, List<Literal>> takers = new LinkedHashMap<>();
    Set<Choice<T>> seen = new HashSet<>();
    @Nullable Model owner = null;
    for (Choice<T> choice : choices) {
      owner = Expr.commonOwner(owner, choice.slot().owner());
      if (!seen.add(choice)) {
        throw new IllegalArgumentException(
            "choice '" + choice.name() + "' is given twice; it cannot differ from itself");
      }
      for (T option : choice.options()) {
        takers.computeIfAbsent(option, o -> new ArrayList<>()).add(choice.is(option));
      }
    }
    if (seen.size() > takers.size()) {
      throw new IllegalArgumentException(
          seen.size()
              + " choices cannot all differ among "
              + takers.size()
              + " options; give them more options");
    }
    return all(
        takers.values().stream()
            .filter(literals -> literals.size() > 1)
            .map(literals -> atMost(1, literals))
            .toList());
  }

  /** The condition that this and another hold; amounts by which they are missed add up. */
  public Condition and(Condition other) {
    return all(List.of(this, other));
  }

  /**
   * The same condition, but only where a literal holds: elsewhere it is not missed at all. May be
   * called again: then all the literals must hold for the condition to matter.
   *
   * <p>Limits on a sum are made wider by what they need for every plan to keep them, less that much
   * where the literal holds; no auxiliary bit is spent on the literal itself. Literals that are
   * made of others by {@code or} and {@code xor} are multiplied out for that, as is the condition
   * that an odd number of literals holds.
   *
   * @throws IllegalArgumentException if the literal is of another model
   */
  public Condition when(Literal guard) {
    return new Condition(parts.stream().map(part -> part.when(guard)).toList());
  }

  List<Part> parts() {
    return parts;
  }

  @Override
  public String toString() {
    String text = parts.stream().limit(SHOWN).map(Part::toString).collect(Collectors.joining(", "));
    return parts.size() > SHOWN ? text + ", ... " + (parts.size() - SHOWN) + " more" : text;
  }
}
