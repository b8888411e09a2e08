package dev.couplet.host;

import dev.couplet.form.CheckReturnValue;
import java.util.Arrays;

/** Collects the edges of a {@link CompactGraph}; belongs to one thread. */
public final class GraphBuilder {
  private final int vertices;
  private long[] edges = new long[16];
  private int count;

  GraphBuilder(int vertices) {
    Check.size(vertices);
    this.vertices = vertices;
  }

  /**
   * Adds an edge; one that is named twice, in either direction, stands once.
   *
   * @throws IllegalArgumentException if an end is not a vertex, or both are the same
   */
  public GraphBuilder edge(int u, int v) {
    Check.vertex(u, vertices);
    Check.vertex(v, vertices);
    if (u == v) {
      throw new IllegalArgumentException(
          "edge (" + u + ", " + v + ") is a loop; an edge joins two vertices");
    }
    if (count == edges.length) {
      edges = Arrays.copyOf(edges, Math.addExact(count, count));
    }
    edges[count++] = (long) Math.min(u, v) << 32 | Math.max(u, v);
    return this;
  }

  /** The graph; the builder can go on and build again. */
  @CheckReturnValue
  public CompactGraph build() {
    int distinct = sortAndMerge();
    int[] start = new int[vertices + 1];
    for (int e = 0; e < distinct; e++) {
      start[(int) (edges[e] >>> 32) + 1]++;
      start[(int) edges[e] + 1]++;
    }
    for (int v = 0; v < vertices; v++) {
      start[v + 1] += start[v];
    }
    return new CompactGraph(start, fill(start, distinct));
  }

  private int sortAndMerge() {
    Arrays.sort(edges, 0, count);
    int distinct = 0;
    for (int e = 0; e < count; e++) {
      if (distinct == 0 || edges[e] != edges[distinct - 1]) {
        edges[distinct++] = edges[e];
      }
    }
    count = distinct;
    return distinct;
  }

  /** Edges come sorted by lower, then higher end, so every row is filled in ascending order. */
  private int[] fill(int[] start, int distinct) {
    int[] target = new int[Math.multiplyExact(2, distinct)];
    int[] next = Arrays.copyOf(start, vertices);
    for (int e = 0; e < distinct; e++) {
      int low = (int) (edges[e] >>> 32);
      int high = (int) edges[e];
      target[next[high]++] = low;
    }
    for (int e = 0; e < distinct; e++) {
      int low = (int) (edges[e] >>> 32);
      int high = (int) edges[e];
      target[next[low]++] = high;
    }
    return target;
  }
}
