package dev.couplet.embed;

import dev.couplet.host.CompactGraph;
import java.util.BitSet;

/**
 * A lower bound on the treewidth of a graph: the least degree of a graph is one, and no minor of it
 * has a larger treewidth.
 *
 * <p>Small graphs are contracted, again and again a vertex of least degree into the neighbour with
 * which it has the fewest neighbours in common; in large ones that vertex is only removed. Source:
 * Bodlaender, Koster and Wolle, "Contraction and treewidth lower bounds" (2004), from memory.
 */
final class TreewidthBound {
  private static final int SMALL = 512;

  private TreewidthBound() {}

  /** O(n + m), or O(n^3 / 64 + nm) for a graph of at most 512 vertices. */
  static int atLeast(CompactGraph graph) {
    int byRemoval = new Degeneracy(graph).value();
    return graph.vertices() > SMALL ? byRemoval : Math.max(byRemoval, byContraction(graph));
  }

  private static int byContraction(CompactGraph graph) {
    int n = graph.vertices();
    BitSet[] row = new BitSet[n];
    for (int v = 0; v < n; v++) {
      row[v] = new BitSet(n);
      for (int w : graph.neighbours(v)) {
        row[v].set(w);
      }
    }
    BitSet alive = new BitSet(n);
    alive.set(0, n);
    int largest = 0;
    while (!alive.isEmpty()) {
      int v = leastDegree(row, alive);
      largest = Math.max(largest, row[v].cardinality());
      contract(v, row);
      alive.clear(v);
    }
    return largest;
  }

  private static int leastDegree(BitSet[] row, BitSet alive) {
    int best = alive.nextSetBit(0);
    int least = row[best].cardinality();
    for (int v = best; v >= 0; v = alive.nextSetBit(v + 1)) {
      int degree = row[v].cardinality();
      if (degree < least) {
        best = v;
        least = degree;
      }
    }
    return best;
  }

  private static void contract(int v, BitSet[] row) {
    int into = fewestInCommon(v, row);
    for (int w = row[v].nextSetBit(0); w >= 0; w = row[v].nextSetBit(w + 1)) {
      row[w].clear(v);
      if (w != into) {
        row[w].set(into);
        row[into].set(w);
      }
    }
  }

  /** The neighbour of v that shares the fewest neighbours with it; -1 if v has none. */
  private static int fewestInCommon(int v, BitSet[] row) {
    int best = -1;
    int fewest = Integer.MAX_VALUE;
    for (int w = row[v].nextSetBit(0); w >= 0; w = row[v].nextSetBit(w + 1)) {
      BitSet common = (BitSet) row[v].clone();
      common.and(row[w]);
      if (common.cardinality() < fewest) {
        fewest = common.cardinality();
        best = w;
      }
    }
    return best;
  }
}
