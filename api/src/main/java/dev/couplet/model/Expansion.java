package dev.couplet.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Deque;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * An expression multiplied out: coefficients and, for each, the literals of its product. Terms with
 * the same product are not merged in the end, but they are before they are multiplied on, so that a
 * power of a sum has no more terms than it must.
 *
 * <p>The walk keeps its own stack, so that an expression built by a million calls of {@code plus},
 * or a long chain of {@code times}, is no deeper for it than a flat one; only sums inside products
 * recurse.
 */
final class Expansion<N> {
  private static final int[] NONE = {};
  private static final int MERGED_ABOVE = 2;

  private record Pending<N>(Expr expr, N factor) {}

  /** A product's literals, ascending, each once. */
  private static final class Key {
    final int[] literals;

    Key(int[] product) {
      literals = Arrays.stream(product).sorted().distinct().toArray();
    }

    @Override
    public boolean equals(Object object) {
      return object instanceof Key other && Arrays.equals(literals, other.literals);
    }

    @Override
    public int hashCode() {
      return Arrays.hashCode(literals);
    }
  }

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
        addProduct(product, factor);
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

  private void addProduct(Node.Product product, N factor) {
    Expansion<N> result = new Expansion<>(arithmetic);
    result.add(factor, NONE);
    for (Expr part : product.factors()) {
      result = result.times(of(part, arithmetic));
    }
    coefficients.addAll(result.coefficients);
    products.addAll(result.products);
  }

  private Expansion<N> times(Expansion<N> other) {
    Expansion<N> left = merged();
    Expansion<N> right = other.merged();
    Expansion<N> result = new Expansion<>(arithmetic);
    for (int a = 0; a < left.products.size(); a++) {
      for (int b = 0; b < right.products.size(); b++) {
        N coefficient = arithmetic.times(left.coefficients.get(a), right.coefficients.get(b));
        result.add(coefficient, join(left.products.get(a), right.products.get(b)));
      }
    }
    return result;
  }

  private Expansion<N> merged() {
    if (products.size() <= MERGED_ABOVE) {
      return this;
    }
    Map<Key, N> sums = new LinkedHashMap<>();
    for (int t = 0; t < products.size(); t++) {
      sums.merge(new Key(products.get(t)), coefficients.get(t), arithmetic::plus);
    }
    Expansion<N> merged = new Expansion<>(arithmetic);
    sums.forEach((key, sum) -> merged.add(sum, key.literals));
    return merged;
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
