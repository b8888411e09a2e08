package dev.couplet.embed;

import dev.couplet.host.CompactGraph;
import java.util.Arrays;

/**
 * The degeneracy of a graph: the largest least degree met while vertices of least degree are
 * removed one by one.
 *
 * <p>Vertices not removed yet hang in one doubly linked list for each degree; O(n + m). Source:
 * Matula and Beck, "Smallest-last ordering and clustering and graph coloring algorithms" (1983),
 * from memory.
 */
final class Degeneracy {
  private static final int NONE = -1;

  private final int[] start;
  private final int[] target;
  private final int[] degree;
  private final int[] firstOf;
  private final int[] next;
  private final int[] previous;
  private final boolean[] removed;

  Degeneracy(CompactGraph graph) {
    int n = graph.vertices();
    start = graph.offsets();
    target = graph.targets();
    degree = new int[n];
    next = new int[n];
    previous = new int[n];
    removed = new boolean[n];
    firstOf = new int[graph.maxDegree() + 1];
    Arrays.fill(firstOf, NONE);
    for (int v = 0; v < n; v++) {
      degree[v] = graph.degree(v);
      hang(v);
    }
  }

  int value() {
    int largest = 0;
    for (int d = 0; d < firstOf.length; ) {
      if (firstOf[d] == NONE) {
        d++;
      } else {
        largest = Math.max(largest, d);
        remove(firstOf[d]);
        d = Math.max(0, d - 1);
      }
    }
    return largest;
  }

  private void remove(int v) {
    take(v);
    removed[v] = true;
    for (int k = start[v]; k < start[v + 1]; k++) {
      int w = target[k];
      if (!removed[w]) {
        take(w);
        degree[w]--;
        hang(w);
      }
    }
  }

  private void hang(int v) {
    int d = degree[v];
    next[v] = firstOf[d];
    previous[v] = NONE;
    if (firstOf[d] != NONE) {
      previous[firstOf[d]] = v;
    }
    firstOf[d] = v;
  }

  private void take(int v) {
    if (previous[v] == NONE) {
      firstOf[degree[v]] = next[v];
    } else {
      next[previous[v]] = next[v];
    }
    if (next[v] != NONE) {
      previous[next[v]] = previous[v];
    }
  }
}
