package dev.couplet.bench.models;

import static dev.couplet.model.Expr.sum;

import dev.couplet.host.CompactGraph;
import dev.couplet.model.Choice;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;

/**
 * Colouring a graph with a given number of colours, so that adjacent vertices differ: a choice of
 * one colour a vertex, and for each edge and colour at most one of the two ends.
 *
 * <p>There is nothing to minimise: every plan is worth 0, the number of edges whose ends are alike.
 * Lowered it has n K bits and (n K (K - 1) / 2 + m K) pairs. Immutable.
 *
 * <p>Source: Lucas, "Ising formulations of many NP problems" (2014), section 6.1.
 */
public final class Colouring {
  private final Statement statement;
  private final Family<Integer, Choice<Integer>> colourOf;

  private Colouring(Statement statement, Family<Integer, Choice<Integer>> colourOf) {
    this.statement = statement;
    this.colourOf = colourOf;
  }

  /**
   * States the colouring of a graph, in time O((n + m) K).
   *
   * @throws IllegalArgumentException if there is no colour, or one colour and an edge
   */
  public static Colouring of(String name, CompactGraph graph, int colours) {
    if (colours < 1) {
      throw new IllegalArgumentException(
          "the number of colours is " + colours + ", it must be 1 or more");
    }
    Places.requireFew(
        "colouring " + name, ((double) graph.vertices() * colours + graph.edges()) * colours);
    Model model = Model.named(name);
    Family<Integer, Choice<Integer>> colourOf =
        model.choices("colour of", Places.upTo(graph.vertices()), Places.upTo(colours));
    graph.forEachEdge((u, v) -> differ(model, colourOf, u + 1, v + 1, colours));
    return new Colouring(model.snapshot(), colourOf);
  }

  private static void differ(
      Model model, Family<Integer, Choice<Integer>> colourOf, int u, int v, int colours) {
    for (int k = 1; k <= colours; k++) {
      model.require(
          u + " and " + v + " are not both " + k,
          sum(colourOf.of(u).is(k), colourOf.of(v).is(k)).atMost(1));
    }
  }

  /** The statement; its vertices and colours are counted from 1. */
  public Statement statement() {
    return statement;
  }

  /** The plan of these colours, counted from 1, for vertices 1, 2, ... */
  public Plan plan(int... colours) {
    Places.requireLength("colours", colours.length, colourOf.keys().size());
    Plan.Draft draft = statement.plan();
    colourOf.keys().forEach(v -> draft.set(colourOf.of(v), colours[v - 1]));
    return draft.evaluate();
  }

  /** The colours of a feasible plan, for vertices 1, 2, ... */
  public int[] colours(Plan plan) {
    return colourOf.decisions().stream().mapToInt(plan::value).toArray();
  }
}
