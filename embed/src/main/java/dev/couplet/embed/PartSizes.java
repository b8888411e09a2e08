package dev.couplet.embed;

import dev.couplet.host.CompactGraph;
import java.util.Arrays;

/** How many vertices, edges and independent cycles each connected part of a graph has. */
final class PartSizes {
  final int[] vertices;
  final int[] edges;
  final int[] cycles;

  private PartSizes(int count) {
    vertices = new int[count];
    edges = new int[count];
    cycles = new int[count];
  }

  static PartSizes of(CompactGraph graph) {
    int[] part = graph.parts();
    PartSizes sizes = new PartSizes(Arrays.stream(part).max().orElse(-1) + 1);
    for (int p : part) {
      sizes.vertices[p]++;
    }
    graph.forEachEdge((u, v) -> sizes.edges[part[u]]++);
    Arrays.setAll(sizes.cycles, p -> sizes.edges[p] - sizes.vertices[p] + 1);
    return sizes;
  }
}
