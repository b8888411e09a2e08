package dev.couplet.embed;

import dev.couplet.host.CompactGraph;
import dev.couplet.host.GraphBuilder;
import dev.couplet.host.Square;
import java.util.SplittableRandom;

/** Guests of known shape, named as on the command line. */
public final class Guests {
  private Guests() {}

  /** Every vertex joined to every other. */
  public static Guest complete(int vertices) {
    GraphBuilder builder = CompactGraph.builder(vertices);
    for (int u = 0; u < vertices; u++) {
      for (int v = u + 1; v < vertices; v++) {
        builder.edge(u, v);
      }
    }
    return new Guest("complete:" + vertices, builder.build());
  }

  /** Two sides, every vertex of the one joined to every vertex of the other; left side first. */
  public static Guest bipartite(int left, int right) {
    GraphBuilder builder = CompactGraph.builder(Math.addExact(left, right));
    for (int u = 0; u < left; u++) {
      for (int v = 0; v < right; v++) {
        builder.edge(u, left + v);
      }
    }
    return new Guest("bipartite:" + left + "x" + right, builder.build());
  }

  /** A square lattice, numbered row by row. */
  public static Guest grid(int rows, int columns) {
    Square square = new Square(rows, columns);
    GraphBuilder builder = CompactGraph.builder(square.vertices());
    square.forEachEdge(builder::edge);
    return new Guest("grid:" + rows + "x" + columns, builder.build());
  }

  /**
   * A cycle.
   *
   * @throws IllegalArgumentException if it has fewer than 3 vertices
   */
  public static Guest cycle(int vertices) {
    if (vertices < 3) {
      throw new IllegalArgumentException(
          "a cycle has at least 3 vertices, " + vertices + " were asked for");
    }
    GraphBuilder builder = CompactGraph.builder(vertices);
    for (int v = 0; v < vertices; v++) {
      builder.edge(v, (v + 1) % vertices);
    }
    return new Guest("cycle:" + vertices, builder.build());
  }

  /** Each pair of vertices joined with a probability, independently of the others. */
  public static Guest random(int vertices, double probability, long seed) {
    if (!(probability >= 0 && probability <= 1)) {
      throw new IllegalArgumentException(
          "the probability of an edge is " + probability + ", it must be from 0 to 1");
    }
    SplittableRandom random = new SplittableRandom(seed);
    GraphBuilder builder = CompactGraph.builder(vertices);
    for (int u = 0; u < vertices; u++) {
      for (int v = u + 1; v < vertices; v++) {
        if (random.nextDouble() < probability) {
          builder.edge(u, v);
        }
      }
    }
    return new Guest("random:" + vertices + ":" + probability, builder.build());
  }

  /**
   * A random graph whose vertices all have the same degree; expected O(nd&sup2;) for a small degree
   * d.
   *
   * <p>Free ends are joined at random, never to a loop or a second edge, and from the start again
   * when none can be joined: Steger and Wormald, "Generating random regular graphs quickly" (1999),
   * from memory.
   *
   * @throws IllegalArgumentException if there is no such graph: the degree must be less than the
   *     number of vertices, and one of them even
   */
  public static Guest regular(int degree, int vertices, long seed) {
    if (degree < 0 || degree >= Math.max(1, vertices) || (long) degree * vertices % 2 != 0) {
      throw new IllegalArgumentException(
          "no graph has "
              + vertices
              + " vertices of degree "
              + degree
              + "; the degree must be below the number of vertices, and one of them even");
    }
    return new Guest(
        "regular:" + degree + ":" + vertices,
        RegularGraph.make(degree, vertices, new SplittableRandom(seed)));
  }
}
