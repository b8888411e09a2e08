package dev.couplet.embed;

import dev.couplet.host.CompactGraph;
import dev.couplet.host.GraphBuilder;
import java.util.HashSet;
import java.util.Set;
import java.util.SplittableRandom;

/** Makes random regular graphs by joining free ends. */
final class RegularGraph {
  private final int vertices;
  private final int[] ends;
  private final SplittableRandom random;
  private final Set<Long> joined = new HashSet<>();
  private int free;

  private RegularGraph(int degree, int vertices, SplittableRandom random) {
    this.vertices = vertices;
    this.random = random;
    this.ends = new int[Math.multiplyExact(degree, vertices)];
    for (int e = 0; e < ends.length; e++) {
      ends[e] = e / degree;
    }
    this.free = ends.length;
  }

  static CompactGraph make(int degree, int vertices, SplittableRandom random) {
    while (true) {
      RegularGraph attempt = new RegularGraph(degree, vertices, random);
      GraphBuilder builder = CompactGraph.builder(vertices);
      if (attempt.join(builder)) {
        return builder.build();
      }
    }
  }

  private boolean join(GraphBuilder builder) {
    while (free > 0) {
      if (!joinTwo(builder)) {
        return false;
      }
    }
    return true;
  }

  /** Tries random pairs of free ends; false once some number of tries, large enough, has failed. */
  private boolean joinTwo(GraphBuilder builder) {
    long tries = 16L * free * free + 64;
    for (long t = 0; t < tries; t++) {
      int a = random.nextInt(free);
      int b = random.nextInt(free);
      int u = ends[a];
      int v = ends[b];
      if (u != v && joined.add((long) Math.min(u, v) * vertices + Math.max(u, v))) {
        builder.edge(u, v);
        take(Math.max(a, b));
        take(Math.min(a, b));
        return true;
      }
    }
    return false;
  }

  private void take(int end) {
    ends[end] = ends[--free];
  }
}
