package dev.couplet.model;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Collections;
import java.util.Deque;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Set;
import java.util.function.Predicate;

/**
 * The large sums or products inside an expression, each once, though there may be many ways down to
 * it: {@code e.plus(e)}, forty times over, is forty sums, and a tree of {@code 2^40}.
 *
 * <p>Keeps its own stack; linear in the different nodes that are passed through.
 */
final class Sharing {
  /** Expressions of so many nodes, counted as a tree, are walked as a tree. */
  static final int SMALL = 1 << 14;

  /** Inside larger ones, nodes of more than these are looked at once each. */
  private static final int LARGE = 64;

  private record Frame(Node node, int next) {}

  private final Predicate<Node> kind;
  private final List<Node> childrenFirst = new ArrayList<>();
  private final Set<Node> seen = Collections.newSetFromMap(new IdentityHashMap<>());
  private final Set<Node> shared = Collections.newSetFromMap(new IdentityHashMap<>());

  private Sharing(Predicate<Node> kind) {
    this.kind = kind;
  }

  /** The large nodes of a kind, from the root down through nodes of that kind alone. */
  static Sharing of(Node root, Predicate<Node> kind) {
    Sharing sharing = new Sharing(kind);
    sharing.search(root);
    return sharing;
  }

  static boolean isLarge(Expr expr) {
    return expr instanceof Node node && node.size > LARGE;
  }

  private void search(Node root) {
    Deque<Frame> pending = new ArrayDeque<>();
    seen.add(root);
    pending.push(new Frame(root, 0));
    while (!pending.isEmpty()) {
      Frame frame = pending.pop();
      List<Expr> parts = frame.node().parts();
      if (frame.next() == parts.size()) {
        childrenFirst.add(frame.node());
        continue;
      }
      pending.push(new Frame(frame.node(), frame.next() + 1));
      Expr part = unscaled(parts.get(frame.next()));
      if (isLarge(part) && kind.test((Node) part)) {
        if (seen.add((Node) part)) {
          pending.push(new Frame((Node) part, 0));
        } else {
          shared.add((Node) part);
        }
      }
    }
  }

  private static Expr unscaled(Expr expr) {
    Expr inner = expr;
    while (inner instanceof Node.Scaled scaled) {
      inner = scaled.part;
    }
    return inner;
  }

  /** All of them, each after those inside it; the root is the last. */
  List<Node> childrenFirst() {
    return childrenFirst;
  }

  /** Those that more than one way leads down to. */
  Set<Node> shared() {
    return shared;
  }
}
