package dev.couplet.host;

import dev.couplet.form.CheckReturnValue;
import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import org.jgrapht.Graph;
import org.jgrapht.Graphs;
import org.jgrapht.graph.DefaultEdge;
import org.jgrapht.graph.SimpleGraph;

/**
 * A simple undirected graph on the vertices {@code 0 .. vertices() - 1}, in compressed rows.
 *
 * <p>No loops, no parallel edges; the neighbours of a vertex are ascending. Memory: 4 bytes a
 * vertex and 8 an edge. Immutable; two graphs are equal if they have the same edges.
 */
@CheckReturnValue
public final class CompactGraph {
  /** The neighbours of v are {@code target[k]} for {@code start[v] <= k < start[v + 1]}. */
  private final int[] start;

  private final int[] target;

  CompactGraph(int[] start, int[] target) {
    this.start = start;
    this.target = target;
  }

  /** A builder of graphs with so many vertices. */
  public static GraphBuilder builder(int vertices) {
    return new GraphBuilder(vertices);
  }

  /**
   * A graph of JGraphT: its vertices are numbered in the order of its vertex set. Directions and
   * weights are not kept, parallel edges become one; O(n + m log m).
   *
   * @throws IllegalArgumentException if it has a loop, naming the vertex
   */
  public static <V, E> CompactGraph of(Graph<V, E> graph) {
    Map<V, Integer> number = new HashMap<>();
    for (V vertex : graph.vertexSet()) {
      number.put(vertex, number.size());
    }
    GraphBuilder builder = builder(number.size());
    for (E edge : graph.edgeSet()) {
      V source = graph.getEdgeSource(edge);
      V end = Graphs.getOppositeVertex(graph, edge, source);
      if (source.equals(end)) {
        throw new IllegalArgumentException(
            "vertex " + source + " has a loop; remove it, a pair joins two vertices");
      }
      builder.edge(number(number, source), number(number, end));
    }
    return builder.build();
  }

  private static <V> int number(Map<V, Integer> numbers, V vertex) {
    Integer number = numbers.get(vertex);
    if (number == null) {
      throw new IllegalArgumentException(
          "vertex " + vertex + " ends an edge but is not in the graph's vertex set");
    }
    return number;
  }

  /** This graph as a new, mutable graph of JGraphT. */
  public Graph<Integer, DefaultEdge> toJGraphT() {
    Graph<Integer, DefaultEdge> graph = new SimpleGraph<>(DefaultEdge.class);
    for (int v = 0; v < vertices(); v++) {
      graph.addVertex(v);
    }
    forEachEdge((u, v) -> graph.addEdge(u, v));
    return graph;
  }

  /** The number of vertices n. */
  public int vertices() {
    return start.length - 1;
  }

  /** The number of edges m. */
  public int edges() {
    return target.length / 2;
  }

  /** The number of neighbours of a vertex. */
  public int degree(int vertex) {
    Check.vertex(vertex, vertices());
    return start[vertex + 1] - start[vertex];
  }

  /** The largest degree; 0 for a graph without edges. */
  public int maxDegree() {
    int most = 0;
    for (int v = 0; v < vertices(); v++) {
      most = Math.max(most, start[v + 1] - start[v]);
    }
    return most;
  }

  /** The neighbours of a vertex, ascending; a new array. */
  public int[] neighbours(int vertex) {
    Check.vertex(vertex, vertices());
    return Arrays.copyOfRange(target, start[vertex], start[vertex + 1]);
  }

  /** Whether two vertices are neighbours; O(log n). */
  public boolean adjacent(int u, int v) {
    Check.vertex(u, vertices());
    Check.vertex(v, vertices());
    return Arrays.binarySearch(target, start[u], start[u + 1], v) >= 0;
  }

  /** Passes every edge once to the visitor: the lower end first, both ascending. */
  public void forEachEdge(EdgeVisitor visitor) {
    for (int u = 0; u < vertices(); u++) {
      for (int k = start[u]; k < start[u + 1]; k++) {
        if (u < target[k]) {
          visitor.visit(u, target[k]);
        }
      }
    }
  }

  /**
   * The connected part of every vertex: parts are numbered from 0 in the order of their lowest
   * vertices; a new array, O(n + m).
   */
  public int[] parts() {
    int[] part = new int[vertices()];
    int[] queue = new int[vertices()];
    Arrays.fill(part, -1);
    int count = 0;
    for (int v = 0; v < part.length; v++) {
      if (part[v] < 0) {
        flood(v, count++, part, queue);
      }
    }
    return part;
  }

  private void flood(int first, int number, int[] part, int[] queue) {
    int tail = 0;
    queue[tail++] = first;
    part[first] = number;
    for (int head = 0; head < tail; head++) {
      int v = queue[head];
      for (int k = start[v]; k < start[v + 1]; k++) {
        if (part[target[k]] < 0) {
          part[target[k]] = number;
          queue[tail++] = target[k];
        }
      }
    }
  }

  /**
   * Where the rows of {@link #targets()} begin, one entry a vertex and one for the end; a new
   * array, for kernels that walk the graph.
   */
  public int[] offsets() {
    return start.clone();
  }

  /** The neighbours of all vertices, row by row, each edge in both rows; a new array. */
  public int[] targets() {
    return target.clone();
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof CompactGraph other
        && Arrays.equals(start, other.start)
        && Arrays.equals(target, other.target);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(start) + Arrays.hashCode(target);
  }

  @Override
  public String toString() {
    return "CompactGraph(" + vertices() + " vertices, " + edges() + " edges)";
  }
}
