package dev.couplet.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Deque;
import java.util.List;

/**
 * An expression multiplied out: coefficients and, for each, the literals of its product. Terms with
 * the same product are not merged here.
 *
 * <p>The walk keeps its own stack, so that an expression built by a million calls of {@code plus}
 * is no deeper for it than a flat sum; only products of products recurse.
 */
final class Expansion<N> {
  private static final int[] NONE = {};

  private record Pending<N>(Expr expr, N factor) {}

  private final Arithmetic<N> arithmetic;
  final List<N> coefficients = new ArrayList<>();
  final List<int[]> products = new ArrayList<>();

  private Expansion(Arithmetic<N> arithmetic) {
    this.arithmetic = arithmetic;
  }

  static <N> Expansion<N> of(Expr expr, Arithmetic<N> arithmetic) {
    Expansion<N> expansion = new Expansion<>(arithmetic);
    expansion.walk(expr);
    return expansion;
  }

  private void walk(Expr root) {
    Deque<Pending<N>> pending = new ArrayDeque<>();
    pending.push(new Pending<>(root, arithmetic.of(1)));
    while (!pending.isEmpty()) {
      Pending<N> next = pending.pop();
      N factor = next.factor();
      if (next.expr() instanceof Literal literal) {
        addLiteral(literal, factor);
      } else if (next.expr() instanceof Node.Constant constant) {
        add(arithmetic.times(factor, arithmetic.of(constant.value)), NONE);
      } else if (next.expr() instanceof Node.Scaled scaled) {
        N inner = arithmetic.times(factor, arithmetic.of(scaled.factor));
        pending.push(new Pending<>(scaled.part, inner));
      } else if (next.expr() instanceof Node.Product product) {
        multiply(product, factor);
      } else if (next.expr() instanceof Node.Sum sum) {
        for (int i = sum.parts.size() - 1; i >= 0; i--) {
          pending.push(new Pending<>(sum.parts.get(i), factor));
        }
      }
    }
  }

  private void addLiteral(Literal literal, N factor) {
    if (literal.negated()) {
      add(factor, NONE);
      add(arithmetic.times(factor, arithmetic.of(-1)), new int[] {literal.index()});
    } else {
      add(factor, new int[] {literal.index()});
    }
  }

  private void multiply(Node.Product product, N factor) {
    Expansion<N> left = of(product.left, arithmetic);
    Expansion<N> right = of(product.right, arithmetic);
    for (int a = 0; a < left.products.size(); a++) {
      N scaled = arithmetic.times(factor, left.coefficients.get(a));
      for (int b = 0; b < right.products.size(); b++) {
        N coefficient = arithmetic.times(scaled, right.coefficients.get(b));
        add(coefficient, join(left.products.get(a), right.products.get(b)));
      }
    }
  }

  private static int[] join(int[] left, int[] right) {
    int[] joined = Arrays.copyOf(left, left.length + right.length);
    System.arraycopy(right, 0, joined, left.length, right.length);
    return joined;
  }

  private void add(N coefficient, int[] product) {
    coefficients.add(coefficient);
    products.add(product);
  }
}
