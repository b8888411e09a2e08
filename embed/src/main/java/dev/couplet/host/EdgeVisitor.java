package dev.couplet.host;

/** Receives the edges of a graph, one at a time. */
@FunctionalInterface
public interface EdgeVisitor {
  /**
   * Receives one edge.
   *
   * @param u one end
   * @param v the other end
   */
  void visit(int u, int v);
}
