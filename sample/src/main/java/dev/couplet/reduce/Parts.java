package dev.couplet.reduce;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** The connected parts of what is left of a form. */
final class Parts {
  private Parts() {}

  /** The bits of each part, ascending; parts in the order of their first bits. */
  static List<int[]> of(Graph graph) {
    List<int[]> parts = new ArrayList<>();
    boolean[] seen = graph.gone.clone();
    int[] queue = new int[graph.size];
    for (int i = 0; i < graph.size; i++) {
      if (!seen[i]) {
        parts.add(reach(graph, i, seen, queue));
      }
    }
    return parts;
  }

  private static int[] reach(Graph graph, int from, boolean[] seen, int[] queue) {
    seen[from] = true;
    queue[0] = from;
    int end = 1;
    for (int q = 0; q < end; q++) {
      int i = queue[q];
      for (int k = 0; k < graph.degree[i]; k++) {
        int j = graph.neighbour[i][k];
        if (!seen[j]) {
          seen[j] = true;
          queue[end++] = j;
        }
      }
    }
    int[] part = Arrays.copyOf(queue, end);
    Arrays.sort(part);
    return part;
  }
}
