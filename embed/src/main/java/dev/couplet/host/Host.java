package dev.couplet.host;

import dev.couplet.form.CheckReturnValue;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;
import org.jgrapht.Graph;

/**
 * A graph that carries a guest: a name, vertices and edges, a place to draw each vertex, and what
 * is missing of it.
 *
 * <p>Vertices keep their numbers when some are missing: a missing vertex has no edges and is not
 * {@link #present(int)}. Immutable. Memory: about 20 bytes a vertex and 8 an edge.
 */
@CheckReturnValue
public final class Host {
  private final String name;
  private final Optional<Lattice> lattice;
  private final CompactGraph whole;
  private final CompactGraph graph;
  private final BitSet missing;
  private final double[] x;
  private final double[] y;
  private final IntFunction<String> words;

  private Host(
      String name,
      Optional<Lattice> lattice,
      CompactGraph whole,
      CompactGraph graph,
      BitSet missing,
      double[] x,
      double[] y,
      IntFunction<String> words) {
    this.name = name;
    this.lattice = lattice;
    this.whole = whole;
    this.graph = graph;
    this.missing = missing;
    this.x = x;
    this.y = y;
    this.words = words;
  }

  /** A lattice as a host; O(n + m log m). */
  public static Host of(Lattice lattice) {
    GraphBuilder builder = CompactGraph.builder(lattice.vertices());
    lattice.forEachEdge(builder::edge);
    CompactGraph graph = builder.build();
    double[] x = new double[graph.vertices()];
    double[] y = new double[graph.vertices()];
    for (int v = 0; v < x.length; v++) {
      x[v] = lattice.x(v);
      y[v] = lattice.y(v);
    }
    Optional<Lattice> kept = Optional.of(lattice);
    return new Host(lattice.name(), kept, graph, graph, new BitSet(), x, y, lattice::describe);
  }

  /** Any graph as a host, drawn on a circle. */
  public static Host of(String name, CompactGraph graph) {
    return drawnOnCircle(name, graph, v -> "vertex " + v);
  }

  /**
   * Any graph of JGraphT as a host, drawn on a circle. Its vertices are numbered in the order of
   * its vertex set and described by their own text.
   *
   * @throws IllegalArgumentException if the graph has a loop, naming the vertex
   */
  public static <V, E> Host of(String name, Graph<V, E> graph) {
    List<String> words = new ArrayList<>();
    graph.vertexSet().forEach(v -> words.add(String.valueOf(v)));
    return drawnOnCircle(name, CompactGraph.of(graph), List.copyOf(words)::get);
  }

  private static Host drawnOnCircle(String name, CompactGraph graph, IntFunction<String> words) {
    int n = graph.vertices();
    double radius = n / (2 * Math.PI);
    double[] x = new double[n];
    double[] y = new double[n];
    for (int v = 0; v < n; v++) {
      x[v] = radius * StrictMath.cos(2 * Math.PI * v / n);
      y[v] = radius * StrictMath.sin(2 * Math.PI * v / n);
    }
    return new Host(name, Optional.empty(), graph, graph, new BitSet(), x, y, words);
  }

  /** A grid of cells; see {@link Cells}. */
  public static Host cells(int side, int rows, int columns) {
    return of(new Cells(side, rows, columns));
  }

  /** A king's lattice; see {@link King}. */
  public static Host king(int rows, int columns) {
    return of(new King(rows, columns));
  }

  /** A square lattice; see {@link Square}. */
  public static Host square(int rows, int columns) {
    return of(new Square(rows, columns));
  }

  /** A cubic lattice; see {@link Cubic}. */
  public static Host cubic(int width, int height, int depth) {
    return of(new Cubic(width, height, depth));
  }

  /**
   * This host with more of it missing; O(n + m log m).
   *
   * @throws IllegalArgumentException naming a vertex or edge that this host does not have
   */
  public Host without(Faults faults) {
    BitSet gone = faults.missingVertices();
    gone.stream().forEach(this::checkPresent);
    GraphBuilder named = CompactGraph.builder(vertices());
    faults.forEachMissingEdge(
        (u, v) -> {
          checkEdge(u, v);
          named.edge(u, v);
        });
    CompactGraph removed = named.build();
    gone.or(missing);
    GraphBuilder left = CompactGraph.builder(vertices());
    graph.forEachEdge(
        (u, v) -> {
          if (!gone.get(u) && !gone.get(v) && !removed.adjacent(u, v)) {
            left.edge(u, v);
          }
        });
    return new Host(name, lattice, whole, left.build(), gone, x, y, words);
  }

  private void checkPresent(int vertex) {
    if (vertex >= vertices() || missing.get(vertex)) {
      throw new IllegalArgumentException(
          "vertex " + vertex + " is not in host " + name + ", so it cannot be removed");
    }
  }

  private void checkEdge(int u, int v) {
    boolean vertices = Math.min(u, v) >= 0 && Math.max(u, v) < vertices();
    if (!vertices || !graph.adjacent(u, v)) {
      throw new IllegalArgumentException(
          "edge (" + u + ", " + v + ") is not in host " + name + ", so it cannot be removed");
    }
  }

  /**
   * This host drawn at other places: one coordinate a vertex, y downwards.
   *
   * @throws IllegalArgumentException if their number is not that of the vertices, or one is not
   *     finite
   */
  public Host places(double[] newX, double[] newY) {
    if (newX.length != vertices() || newY.length != vertices()) {
      throw new IllegalArgumentException(
          newX.length
              + " and "
              + newY.length
              + " coordinates given for "
              + vertices()
              + " vertices; give one of each for every vertex");
    }
    for (int v = 0; v < vertices(); v++) {
      if (!Double.isFinite(newX[v]) || !Double.isFinite(newY[v])) {
        throw new IllegalArgumentException(
            "the place of vertex "
                + v
                + " is ("
                + newX[v]
                + ", "
                + newY[v]
                + "), it must be finite");
      }
    }
    return new Host(name, lattice, whole, graph, missing, newX.clone(), newY.clone(), words);
  }

  /** The name, such as {@code cells:4@8x8}. */
  public String name() {
    return name;
  }

  /** The lattice this host is, whole or with faults, if it is one. */
  public Optional<Lattice> lattice() {
    return lattice;
  }

  /** What is there: the graph without the missing parts; missing vertices have no edges. */
  public CompactGraph graph() {
    return graph;
  }

  /** What was there before anything was missing. */
  public CompactGraph whole() {
    return whole;
  }

  /** The number of vertex numbers n: present and missing vertices. */
  public int vertices() {
    return graph.vertices();
  }

  /** The number of edges present. */
  public int edges() {
    return graph.edges();
  }

  /** Whether a vertex is there. */
  public boolean present(int vertex) {
    return !missing.get(Check.vertex(vertex, vertices()));
  }

  /** How many vertices are there. */
  public int presentCount() {
    return vertices() - missing.cardinality();
  }

  /** The vertices that are there, a new set. */
  public BitSet presentVertices() {
    BitSet present = new BitSet(vertices());
    present.set(0, vertices());
    present.andNot(missing);
    return present;
  }

  /** Where to draw a vertex, to the right. */
  public double x(int vertex) {
    return x[Check.vertex(vertex, vertices())];
  }

  /** Where to draw a vertex, downwards. */
  public double y(int vertex) {
    return y[Check.vertex(vertex, vertices())];
  }

  /** Where a vertex stands or what it is called, in words. */
  public String describe(int vertex) {
    return words.apply(Check.vertex(vertex, vertices()));
  }

  @Override
  public String toString() {
    return "Host("
        + name
        + ", "
        + presentCount()
        + " of "
        + vertices()
        + " vertices, "
        + edges()
        + " edges)";
  }
}
