package dev.couplet.bond;

import dev.couplet.embed.BranchSet;
import dev.couplet.host.CompactGraph;
import java.util.Arrays;

/**
 * A spanning tree of a branch set, breadth first from its first vertex.
 *
 * <p>Vertices are meant by their places in the set. {@code order} lists every place after its
 * parent.
 */
final class SetTree {
  private final int[] order;
  private final int[] parent;

  private SetTree(int[] order, int[] parent) {
    this.order = order;
    this.parent = parent;
  }

  static SetTree of(BranchSet set, CompactGraph graph) {
    int[] vertices = set.toArray();
    int[] order = new int[vertices.length];
    int[] parent = new int[vertices.length];
    Arrays.fill(parent, -1);
    parent[0] = 0;
    int reached = 1;
    for (int next = 0; next < reached; next++) {
      int from = order[next];
      for (int neighbour : graph.neighbours(vertices[from])) {
        int to = Arrays.binarySearch(vertices, neighbour);
        if (to >= 0 && parent[to] < 0) {
          parent[to] = from;
          order[reached++] = to;
        }
      }
    }
    return new SetTree(order, parent);
  }

  /** The places of the set, each after its parent. */
  int[] order() {
    return order;
  }

  /** The parent of a place; the root is its own. */
  int parent(int place) {
    return parent[place];
  }

  /** For each place but the root, the sum of the weights of the side that hangs below its bond. */
  double[] below(double[] weights) {
    double[] sums = weights.clone();
    for (int k = order.length - 1; k > 0; k--) {
      sums[parent[order[k]]] += sums[order[k]];
    }
    return sums;
  }
}
