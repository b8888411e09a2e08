package dev.couplet.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** The inner nodes of an expression's tree. */
abstract sealed class Node extends Expr {
  private final @Nullable Model owner;

  private Node(@Nullable Model owner) {
    this.owner = owner;
  }

  @Override
  @Nullable Model owner() {
    return owner;
  }

  static final class Constant extends Node {
    final double value;

    Constant(double value) {
      super(null);
      this.value = value;
    }

    @Override
    public String toString() {
      return Text.number(value);
    }
  }

  static final class Sum extends Node {
    final List<Expr> parts;

    Sum(List<Expr> parts) {
      super(ownerOf(parts));
      this.parts = parts;
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
      super(part.owner());
      this.part = part;
      this.factor = factor;
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
      super(commonOwner(left.owner(), right.owner()));
      this.left = left;
      this.right = right;
    }

    /** The factors, left to right, with those of products among them and numbers told apart. */
    List<Expr> factors() {
      if (left instanceof Literal && right instanceof Literal) {
        return List.of(left, right);
      }
      List<Expr> factors = new ArrayList<>();
      Deque<Expr> pending = new ArrayDeque<>(List.of(left, right));
      while (!pending.isEmpty()) {
        Expr next = pending.pop();
        if (next instanceof Product product) {
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
