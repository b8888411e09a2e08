package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.List;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;

/**
 * A number that depends on a plan: sums and products, of any degree, of literals, counts, spins and
 * constants.
 *
 * <p>Immutable. Building one takes constant time a call, {@code sum} and {@code product} time
 * linear in their arguments; nothing is multiplied out before the expression is used in a rule or
 * an objective. Mixing decisions of two models is refused at once.
 */
@CheckReturnValue
public abstract sealed class Expr permits Literal, Node, Spin, Count {
  Expr() {}

  /** The model whose decisions the expression speaks of; null if it is a constant. */
  abstract @Nullable Model owner();

  /** The expression that is the same number under every plan. */
  public static Expr constant(double value) {
    return new Node.Constant(Check.finite("a constant", value));
  }

  /** The sum of the given expressions; 0 if there are none. */
  public static Expr sum(Collection<? extends Expr> parts) {
    return new Node.Sum(List.copyOf(parts));
  }

  /** The sum of the given expressions; 0 if there are none. */
  public static Expr sum(Expr... parts) {
    return sum(Arrays.asList(parts));
  }

  /** The sum over all keys of what the function makes of each; 0 if there are none. */
  public static <K> Expr sum(Collection<K> keys, Function<? super K, ? extends Expr> part) {
    return sum(each(keys, part));
  }

  /** The product of the given expressions; 1 if there are none. */
  public static Expr product(Collection<? extends Expr> factors) {
    Expr product = constant(1);
    for (Expr factor : factors) {
      product = product.times(factor);
    }
    return product;
  }

  /** The product of the given expressions; 1 if there are none. */
  public static Expr product(Expr... factors) {
    return product(Arrays.asList(factors));
  }

  /** The product over all keys of what the function makes of each; 1 if there are none. */
  public static <K> Expr product(Collection<K> keys, Function<? super K, ? extends Expr> factor) {
    return product(each(keys, factor));
  }

  private static <K> List<Expr> each(
      Collection<K> keys, Function<? super K, ? extends Expr> function) {
    List<Expr> made = new ArrayList<>(keys.size());
    for (K key : keys) {
      made.add(function.apply(key));
    }
    return made;
  }

  /** This plus another. */
  public final Expr plus(Expr other) {
    return new Node.Sum(List.of(this, other));
  }

  /** This plus a number. */
  public final Expr plus(double number) {
    return plus(constant(number));
  }

  /** This minus another. */
  public final Expr minus(Expr other) {
    return plus(other.times(-1));
  }

  /** This minus a number. */
  public final Expr minus(double number) {
    return plus(constant(-number));
  }

  /** This times a number. */
  public final Expr times(double number) {
    return new Node.Scaled(this, Check.finite("a factor", number));
  }

  /** This times another. */
  public final Expr times(Expr other) {
    return new Node.Product(this, other);
  }

  /** The condition that this is at most a number. */
  public final Condition atMost(double highest) {
    Check.finite("the upper limit", highest);
    return Condition.between(this, Double.NEGATIVE_INFINITY, highest);
  }

  /** The condition that this is at most another expression. */
  public final Condition atMost(Expr other) {
    return minus(other).atMost(0);
  }

  /** The condition that this is at least a number. */
  public final Condition atLeast(double lowest) {
    Check.finite("the lower limit", lowest);
    return Condition.between(this, lowest, Double.POSITIVE_INFINITY);
  }

  /** The condition that this is at least another expression. */
  public final Condition atLeast(Expr other) {
    return minus(other).atLeast(0);
  }

  /** The condition that this equals a number. */
  public final Condition exactly(double value) {
    Check.finite("the value", value);
    return Condition.between(this, value, value);
  }

  /** The condition that this equals another expression. */
  public final Condition exactly(Expr other) {
    return minus(other).exactly(0);
  }

  /**
   * The condition that this lies between two numbers, both included.
   *
   * @throws IllegalArgumentException if the lower one is above the higher one
   */
  public final Condition between(double lowest, double highest) {
    Check.finite("the lower limit", lowest);
    Check.finite("the upper limit", highest);
    if (lowest > highest) {
      throw new IllegalArgumentException(
          "the lower limit " + lowest + " is above the upper limit " + highest);
    }
    return Condition.between(this, lowest, highest);
  }

  /** The owner of two expressions that meet, refused if they belong to two models. */
  static @Nullable Model commonOwner(@Nullable Model left, @Nullable Model right) {
    if (left == null || right == null || left == right) {
      return left == null ? right : left;
    }
    throw new IllegalArgumentException(
        "an expression mixes decisions of model '"
            + left.name()
            + "' with decisions of model '"
            + right.name()
            + "'; use decisions of one model");
  }
}
