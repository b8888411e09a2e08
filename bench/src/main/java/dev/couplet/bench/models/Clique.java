package dev.couplet.bench.models;

import static dev.couplet.model.Expr.sum;

import dev.couplet.host.CompactGraph;
import dev.couplet.model.Bit;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import java.util.Set;

/**
 * The largest clique of a graph: a bit a vertex, and of each two that are not adjacent at most one.
 * The value is the size of the clique, to be maximised. Lowered it has n bits and a pair for each
 * pair of vertices without an edge. Immutable.
 *
 * <p>Source: Lucas, "Ising formulations of many NP problems" (2014), section 2.3, by the
 * complement: a clique is an independent set of the graph of missing edges (section 4.2).
 */
public final class Clique {
  private final Statement statement;
  private final Family<Integer, Bit> chosen;

  private Clique(Statement statement, Family<Integer, Bit> chosen) {
    this.statement = statement;
    this.chosen = chosen;
  }

  /** States the search for the largest clique, in time O(n^2). */
  public static Clique of(String name, CompactGraph graph) {
    int n = graph.vertices();
    Places.requireFew("clique " + name, 0.5 * n * (n - 1.0) - graph.edges());
    Model model = Model.named(name);
    Family<Integer, Bit> chosen = model.bits("vertex", Places.upTo(n));
    for (int u = 0; u < n; u++) {
      for (int v = u + 1; v < n; v++) {
        if (!graph.adjacent(u, v)) {
          apart(model, chosen, u + 1, v + 1);
        }
      }
    }
    model.maximize("size", sum(chosen.decisions()));
    return new Clique(model.snapshot(), chosen);
  }

  private static void apart(Model model, Family<Integer, Bit> chosen, int u, int v) {
    model.require(
        "not both " + u + " and " + v + ", which are not adjacent",
        sum(chosen.of(u), chosen.of(v)).atMost(1));
  }

  /** The statement; its vertices are counted from 1. */
  public Statement statement() {
    return statement;
  }

  /** The plan of these vertices, counted from 1. */
  public Plan plan(Set<Integer> vertices) {
    Places.requireKnown("vertex", vertices, chosen.keys());
    Plan.Draft draft = statement.plan();
    chosen.keys().forEach(v -> draft.set(chosen.of(v), vertices.contains(v)));
    return draft.evaluate();
  }
}
