package dev.couplet.embed;

import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.host.CompactGraph;
import dev.couplet.host.GraphBuilder;
import org.jgrapht.Graph;

/**
 * A graph to embed: one vertex a variable, one edge a pair that must meet.
 *
 * <p>Isolated vertices count too: each needs a host vertex of its own. Immutable.
 *
 * @param name what to call it, such as {@code complete:12}
 * @param graph its vertices and edges
 */
public record Guest(String name, CompactGraph graph) {
  /** The variables of a form, joined where the form has a pair; O(n + m log m). */
  public static Guest of(Ising form) {
    GraphBuilder builder = CompactGraph.builder(form.size());
    form.forEachPair((i, j, value) -> builder.edge(i, j));
    return new Guest("ising:" + form.size(), builder.build());
  }

  /** The variables of a form, joined where the form has a pair; O(n + m log m). */
  public static Guest of(Qubo form) {
    GraphBuilder builder = CompactGraph.builder(form.size());
    form.forEachPair((i, j, value) -> builder.edge(i, j));
    return new Guest("qubo:" + form.size(), builder.build());
  }

  /**
   * A graph of JGraphT, its vertices numbered in the order of its vertex set.
   *
   * @throws IllegalArgumentException if it has a loop, naming the vertex
   */
  public static <V, E> Guest of(String name, Graph<V, E> graph) {
    return new Guest(name, CompactGraph.of(graph));
  }

  /** The number of vertices n. */
  public int vertices() {
    return graph.vertices();
  }

  /** The number of edges m. */
  public int edges() {
    return graph.edges();
  }

  @Override
  public String toString() {
    return "Guest(" + name + ", " + vertices() + " vertices, " + edges() + " edges)";
  }
}
