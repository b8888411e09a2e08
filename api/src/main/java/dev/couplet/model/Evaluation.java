package dev.couplet.model;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.IdentityHashMap;
import java.util.function.Predicate;

/**
 * The number that an expression is when it is known which literals hold; linear in the expression,
 * which is not multiplied out. Keeps its own stack, as {@link Expansion} does.
 */
final class Evaluation {
  private record Pending(Expr expr, double factor) {}

  private Evaluation() {}

  static double of(Expr root, Predicate<Literal> holds) {
    IdentityHashMap<Expr, Double> known = new IdentityHashMap<>();
    if (root instanceof Node node && node.size > Sharing.SMALL) {
      Sharing sharing = Sharing.of(node, any -> true);
      if (!sharing.shared().isEmpty()) {
        sharing.childrenFirst().forEach(part -> known.put(part, of(part, holds, known)));
      }
    }
    return of(root, holds, known);
  }

  /** Of the nodes below, some are known already. */
  private static double of(
      Expr root, Predicate<Literal> holds, IdentityHashMap<Expr, Double> known) {
    Deque<Pending> pending = new ArrayDeque<>();
    pending.push(new Pending(root, 1));
    double sum = 0;
    while (!pending.isEmpty()) {
      Pending next = pending.pop();
      double factor = next.factor();
      Double value = known.isEmpty() ? null : known.get(next.expr());
      if (value != null) {
        sum += factor * value;
      } else if (next.expr() instanceof Compound compound) {
        sum += compound.holds(holds) ? factor : 0;
      } else if (next.expr() instanceof Literal literal) {
        sum += holds.test(literal) ? factor : 0;
      } else if (next.expr() instanceof Spin spin) {
        pending.push(new Pending(spin.inLiterals(), factor));
      } else if (next.expr() instanceof Count count) {
        pending.push(new Pending(count.inLiterals(), factor));
      } else if (next.expr() instanceof Node.Constant constant) {
        sum += factor * constant.value;
      } else if (next.expr() instanceof Node.Scaled scaled) {
        pending.push(new Pending(scaled.part, factor * scaled.factor));
      } else if (next.expr() instanceof Node.Product product) {
        for (Expr part : product.factors(known::containsKey)) {
          factor *= of(part, holds, known);
        }
        sum += factor;
      } else if (next.expr() instanceof Node.Sum parts) {
        for (int i = parts.parts.size() - 1; i >= 0; i--) {
          pending.push(new Pending(parts.parts.get(i), factor));
        }
      }
    }
    return sum;
  }
}
