package dev.couplet.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.function.Predicate;
import org.jspecify.annotations.Nullable;

/** The inner nodes of an expression's tree. */
abstract sealed class Node extends Expr {
  private final @Nullable Model owner;

  /** How many nodes there are, this one and those below it, each way down counted. */
  final int size;

  private Node(@Nullable Model owner, long size) {
    this.owner = owner;
    this.size = (int) Math.min(Integer.MAX_VALUE, size);
  }

  private static long size(Expr expr) {
    return expr instanceof Node node ? node.size : 1;
  }

  /** The nodes below, in order. */
  abstract List<Expr> parts();

  @Override
  @Nullable Model owner() {
    return owner;
  }

  static final class Constant extends Node {
    final double value;

    Constant(double value) {
      super(null, 1);
      this.value = value;
    }

    @Override
    List<Expr> parts() {
      return List.of();
    }

    @Override
    public String toString() {
      return Text.number(value);
    }
  }

  static final class Sum extends Node {
    final List<Expr> parts;

    Sum(List<Expr> parts) {
      super(ownerOf(parts), sizeOf(parts));
      this.parts = parts;
    }

    private static long sizeOf(List<Expr> parts) {
      long size = 1;
      for (Expr part : parts) {
        size += Node.size(part);
      }
      return size;
    }

    @Override
    List<Expr> parts() {
      return parts;
    }

    private static @Nullable Model ownerOf(List<Expr> parts) {
      Model owner = null;
      for (Expr part : parts) {
        owner = commonOwner(owner, part.owner());
      }
      return owner;
    }

    @Override
    public String toString() {
      return Text.of(this);
    }
  }

  static final class Scaled extends Node {
    final Expr part;
    final double factor;

    Scaled(Expr part, double factor) {
      super(part.owner(), 1 + Node.size(part));
      this.part = part;
      this.factor = factor;
    }

    @Override
    List<Expr> parts() {
      return List.of(part);
    }

    @Override
    public String toString() {
      return Text.of(this);
    }
  }

  static final class Product extends Node {
    final Expr left;
    final Expr right;

    Product(Expr left, Expr right) {
      super(commonOwner(left.owner(), right.owner()), 1 + Node.size(left) + Node.size(right));
      this.left = left;
      this.right = right;
    }

    @Override
    List<Expr> parts() {
      return List.of(left, right);
    }

    /** The factors, left to right, with those of products among them and numbers told apart. */
    List<Expr> factors() {
      return factors(product -> false);
    }

    /** The factors, but some products are left whole. */
    List<Expr> factors(Predicate<Product> whole) {
      if (left instanceof Literal && right instanceof Literal) {
        return List.of(left, right);
      }
      List<Expr> factors = new ArrayList<>();
      Deque<Expr> pending = new ArrayDeque<>(List.of(left, right));
      while (!pending.isEmpty()) {
        Expr next = pending.pop();
        if (next instanceof Product product && !whole.test(product)) {
          pending.push(product.right);
          pending.push(product.left);
        } else if (next instanceof Scaled scaled) {
          factors.add(new Constant(scaled.factor));
          pending.push(scaled.part);
        } else {
          factors.add(next);
        }
      }
      return factors;
    }

    @Override
    public String toString() {
      return Text.of(this);
    }
  }
}
