package dev.couplet.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.Deque;
import java.util.IdentityHashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * Multiplies an expression out: coefficients and, for each, the literals of its product. Terms with
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
  private static final int MOST_TERMS = 1 << 20;

  /** What is still to be walked: an expression, of a sum the parts from a position on. */
  private record Pending<N>(Expr expr, N factor, int from) {}

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

  /** Receives the terms, in the order of the expression. */
  @FunctionalInterface
  interface Sink<N> {
    void add(N coefficient, int[] product);
  }

  private final Arithmetic<N> arithmetic;
  private final Sink<N> sink;

  /** What large parts of products came to, where the expression is too large to be a tree. */
  private final IdentityHashMap<Expr, Terms<N>> known;

  private Expansion(Arithmetic<N> arithmetic, Sink<N> sink, IdentityHashMap<Expr, Terms<N>> known) {
    this.arithmetic = arithmetic;
    this.sink = sink;
    this.known = known;
  }

  static <N> void walk(Expr expr, Arithmetic<N> arithmetic, Sink<N> sink) {
    new Expansion<>(arithmetic, sink, new IdentityHashMap<>()).walk(expr);
  }

  private void walk(Expr root) {
    N factor = arithmetic.of(1);
    Expr inner = root;
    while (inner instanceof Node.Scaled scaled) {
      factor = arithmetic.times(factor, arithmetic.of(scaled.factor));
      inner = scaled.part;
    }
    if (inner instanceof Node.Sum sum && sum.size > Sharing.SMALL) {
      Sharing sharing = Sharing.of(sum, node -> node instanceof Node.Sum);
      if (!sharing.shared().isEmpty()) {
        addOnce(sharing, factor);
        return;
      }
    }
    walk(inner, factor);
  }

  /** Each large sum once, with all the factors that it has by the ways down to it. */
  private void addOnce(Sharing sharing, N factorOfRoot) {
    List<Node> parentsFirst = new ArrayList<>(sharing.childrenFirst());
    Collections.reverse(parentsFirst);
    IdentityHashMap<Expr, N> factors = new IdentityHashMap<>();
    parentsFirst.forEach(sum -> factors.put(sum, arithmetic.of(0)));
    factors.put(parentsFirst.get(0), factorOfRoot);
    for (Node sum : parentsFirst) {
      for (Expr part : sum.parts()) {
        N factor = Objects.requireNonNull(factors.get(sum));
        Expr inner = part;
        while (inner instanceof Node.Scaled scaled) {
          factor = arithmetic.times(factor, arithmetic.of(scaled.factor));
          inner = scaled.part;
        }
        N byOtherWays = factors.get(inner);
        if (byOtherWays != null) {
          factors.put(inner, arithmetic.plus(byOtherWays, factor));
        } else {
          walk(inner, factor);
        }
      }
    }
  }

  private void walk(Expr root, N factorOfRoot) {
    Deque<Pending<N>> pending = new ArrayDeque<>();
    pending.push(new Pending<>(root, factorOfRoot, 0));
    while (!pending.isEmpty()) {
      Pending<N> next = pending.pop();
      N factor = next.factor();
      if (next.expr() instanceof Compound compound) {
        addCompound(compound, factor);
      } else if (next.expr() instanceof Literal literal) {
        addLiteral(literal, factor);
      } else if (next.expr() instanceof Spin spin) {
        pending.push(new Pending<>(spin.inLiterals(), factor, 0));
      } else if (next.expr() instanceof Count count) {
        pending.push(new Pending<>(count.inLiterals(), factor, 0));
      } else if (next.expr() instanceof Node.Constant constant) {
        sink.add(arithmetic.times(factor, arithmetic.of(constant.value)), NONE);
      } else if (next.expr() instanceof Node.Scaled scaled) {
        N inner = arithmetic.times(factor, arithmetic.of(scaled.factor));
        pending.push(new Pending<>(scaled.part, inner, 0));
      } else if (next.expr() instanceof Node.Product product) {
        addProduct(product, factor);
      } else if (next.expr() instanceof Node.Sum sum && next.from() < sum.parts.size()) {
        pending.push(new Pending<>(sum, factor, next.from() + 1));
        pending.push(new Pending<>(sum.parts.get(next.from()), factor, 0));
      }
    }
  }

  private void addLiteral(Literal literal, N factor) {
    if (literal.negated()) {
      sink.add(factor, NONE);
      sink.add(arithmetic.times(factor, arithmetic.of(-1)), new int[] {literal.index()});
    } else {
      sink.add(factor, new int[] {literal.index()});
    }
  }

  /** Of a large product, those inside it that come up several times are multiplied out once. */
  private void addProduct(Node.Product product, N factor) {
    if (!Sharing.isLarge(product)) {
      addProduct(product.factors(), factor, null);
      return;
    }
    Terms<N> terms = known.get(product);
    if (terms == null) {
      Sharing sharing = Sharing.of(product, node -> node instanceof Node.Product);
      for (Node node : sharing.childrenFirst()) {
        if (node != product && sharing.shared().contains(node)) {
          Terms<N> own = new Terms<>(arithmetic);
          List<Expr> factors = ((Node.Product) node).factors(p -> p != node && isKnown(p));
          new Expansion<>(arithmetic, own, known).addProduct(factors, arithmetic.of(1), null);
          known.put(node, own.normal());
        }
      }
      addProduct(product.factors(this::isKnown), factor, null);
    } else {
      terms.forEach((n, literals) -> sink.add(arithmetic.times(factor, n), literals));
    }
  }

  private boolean isKnown(Node.Product product) {
    return known.containsKey(product);
  }

  private Terms<N> multipliedOut(Expr expr) {
    Terms<N> terms = known.get(expr);
    if (terms == null) {
      terms = new Terms<>(arithmetic);
      new Expansion<>(arithmetic, terms, known).walk(expr);
      if (Sharing.isLarge(expr)) {
        terms = terms.normal();
        known.put(expr, terms);
      }
    }
    return terms;
  }

  private void addCompound(Compound compound, N factor) {
    switch (compound.kind()) {
      case ALL -> addProduct(compound.parts(), factor, compound);
      case ANY -> {
        sink.add(factor, NONE);
        N negative = arithmetic.times(factor, arithmetic.of(-1));
        addProduct(compound.negatedParts(), negative, compound);
      }
      case ODD -> addOdd(compound, factor);
    }
  }

  /** Part by part, a and b become {@code a + b - 2 a b}. */
  private void addOdd(Compound compound, N factor) {
    Terms<N> odd = new Terms<>(arithmetic);
    for (Literal part : compound.parts()) {
      Terms<N> next = multipliedOut(part);
      requireFew(odd, next, compound);
      Terms<N> both = odd.times(next);
      next.forEach(odd);
      both.forEach((n, product) -> odd.add(arithmetic.times(n, arithmetic.of(-2)), product));
    }
    odd.merged().forEach((n, product) -> sink.add(arithmetic.times(factor, n), product));
  }

  private static <N> void requireFew(Terms<N> left, Terms<N> right, @Nullable Compound compound) {
    if (compound != null && (long) left.products.size() * right.products.size() > MOST_TERMS) {
      throw new IllegalArgumentException(
          "the literal "
              + compound
              + " has more than "
              + MOST_TERMS
              + " terms when it is multiplied out; state it as a condition (isTrue, implies), or"
              + " give it a bit of its own by require(name, bit.equalTo(literal))");
    }
  }

  /**
   * Numbers and plain literals make one term; only what else there is gets multiplied out. The
   * factors of a literal that is made of others may not come to too many terms.
   */
  private void addProduct(List<? extends Expr> factors, N factor, @Nullable Compound compound) {
    int[] plain = new int[factors.size()];
    int count = 0;
    N coefficient = factor;
    List<Expr> others = new ArrayList<>();
    for (Expr part : factors) {
      if (part instanceof Literal literal && literal.index() >= 0 && !literal.negated()) {
        plain[count++] = literal.index();
      } else if (part instanceof Node.Constant constant) {
        coefficient = arithmetic.times(coefficient, arithmetic.of(constant.value));
      } else {
        others.add(part);
      }
    }
    int[] product = count == plain.length ? plain : Arrays.copyOf(plain, count);
    if (others.isEmpty()) {
      sink.add(coefficient, product);
      return;
    }
    Terms<N> result = new Terms<>(arithmetic);
    result.add(coefficient, product);
    for (Expr part : others) {
      Terms<N> next = multipliedOut(part);
      requireFew(result, next, compound);
      result = result.times(next);
    }
    result.forEach(sink);
  }

  /** Terms on their way to a product. */
  private static final class Terms<N> implements Sink<N> {
    private final Arithmetic<N> arithmetic;
    private final List<N> coefficients = new ArrayList<>(2);
    private final List<int[]> products = new ArrayList<>(2);

    Terms(Arithmetic<N> arithmetic) {
      this.arithmetic = arithmetic;
    }

    @Override
    public void add(N coefficient, int[] product) {
      coefficients.add(coefficient);
      products.add(product);
    }

    void forEach(Sink<N> target) {
      for (int t = 0; t < products.size(); t++) {
        target.add(coefficients.get(t), products.get(t));
      }
    }

    Terms<N> times(Terms<N> other) {
      Terms<N> left = merged();
      Terms<N> right = other.merged();
      Terms<N> result = new Terms<>(arithmetic);
      for (int a = 0; a < left.products.size(); a++) {
        for (int b = 0; b < right.products.size(); b++) {
          N coefficient = arithmetic.times(left.coefficients.get(a), right.coefficients.get(b));
          result.add(coefficient, join(left.products.get(a), right.products.get(b)));
        }
      }
      return result;
    }

    private Terms<N> merged() {
      return products.size() <= MERGED_ABOVE ? this : normal();
    }

    /** Equal products added up, and each literal once in a product. */
    Terms<N> normal() {
      Map<Key, N> sums = new LinkedHashMap<>();
      for (int t = 0; t < products.size(); t++) {
        sums.merge(new Key(products.get(t)), coefficients.get(t), arithmetic::plus);
      }
      Terms<N> merged = new Terms<>(arithmetic);
      sums.forEach((key, sum) -> merged.add(sum, key.literals));
      return merged;
    }
  }

  private static int[] join(int[] left, int[] right) {
    int[] joined = Arrays.copyOf(left, left.length + right.length);
    System.arraycopy(right, 0, joined, left.length, right.length);
    return joined;
  }
}
