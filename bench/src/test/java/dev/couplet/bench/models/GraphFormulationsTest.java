package dev.couplet.bench.models;

import static dev.couplet.bench.models.Formulation.assertInfeasible;
import static dev.couplet.bench.models.Formulation.assertOptimum;
import static dev.couplet.bench.models.Formulation.in;
import static dev.couplet.bench.models.Formulation.least;
import static dev.couplet.bench.models.Formulation.orders;
import static dev.couplet.bench.models.Formulation.productBits;
import static dev.couplet.bench.models.Formulation.words;
import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.host.CompactGraph;
import dev.couplet.host.GraphBuilder;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/**
 * Partitions, cliques, covers, colourings, matchings, tours and isomorphisms of graphs, with the
 * published number of spins, against brute force.
 *
 * <p>Source: Lucas, "Ising formulations of many NP problems" (2014), sections 2, 4, 6, 7 and 9;
 * section numbers and counts from memory.
 */
class GraphFormulationsTest {
  private static final double NONE = Double.POSITIVE_INFINITY;

  /** Two triangles, joined at two edges. */
  private static final int[][] PRISM = {
    {0, 1}, {0, 2}, {1, 2}, {3, 4}, {3, 5}, {4, 5}, {0, 3}, {1, 4}
  };

  private static List<Integer> upTo(int n) {
    return IntStream.range(0, n).boxed().toList();
  }

  private static CompactGraph graph(int vertices, int[][] edges) {
    GraphBuilder graph = CompactGraph.builder(vertices);
    for (int[] edge : edges) {
      graph.edge(edge[0], edge[1]);
    }
    return graph.build();
  }

  private static Stream<int[]> prism() {
    return Stream.of(PRISM);
  }

  /** Section 2.2: N spins; two halves with the fewest edges between them. */
  @Test
  void graphPartitioning() {
    Model model = Model.named("graph partitioning");
    Family<Integer, Bit> x = model.bits("x", upTo(6));
    model.require("halves", sum(x.decisions()).exactly(3));
    model.minimize(
        "edges between",
        sum(
            List.of(PRISM),
            e -> x.of(e[0]).plus(x.of(e[1])).minus(x.of(e[0]).times(x.of(e[1])).times(2))));
    double least =
        least(
            6,
            s ->
                Integer.bitCount(s) == 3
                    ? prism().filter(e -> in(s, e[0]) != in(s, e[1])).count()
                    : NONE);
    assertEquals(2, least);
    assertOptimum(least, 6, model.snapshot());
  }

  /** Section 2.3: N spins to tell whether there is a clique of K: K (K - 1) / 2 edges inside. */
  @Test
  void cliquesOfOneSize() {
    for (int size = 2; size <= 4; size++) {
      int wanted = size;
      Model model = Model.named("clique of " + size);
      Family<Integer, Bit> x = model.bits("x", upTo(6));
      model.require("size", sum(x.decisions()).exactly(size));
      model.maximize("edges inside", sum(List.of(PRISM), e -> x.of(e[0]).times(x.of(e[1]))));
      double least =
          least(
              6,
              s ->
                  Integer.bitCount(s) == wanted
                      ? -prism().filter(e -> in(s, e[0]) && in(s, e[1])).count()
                      : NONE);
      assertEquals(size <= 3, -least == size * (size - 1) / 2.0);
      assertOptimum(-least, 6, model.snapshot());
    }
  }

  @Test
  void theLargestClique() {
    assertOptimum(3, 6, Clique.of("prism", graph(6, PRISM)).statement());
  }

  /** Section 4.3: N spins. */
  @Test
  void vertexCover() {
    Model model = Model.named("vertex cover");
    Family<Integer, Bit> x = model.bits("x", upTo(6));
    for (int[] e : PRISM) {
      model.require(e[0] + " or " + e[1], sum(x.of(e[0]), x.of(e[1])).atLeast(1));
    }
    model.minimize("vertices", sum(x.decisions()));
    double least =
        least(
            6, s -> prism().allMatch(e -> in(s, e[0]) || in(s, e[1])) ? Integer.bitCount(s) : NONE);
    assertOptimum(least, 6, model.snapshot());
  }

  /**
   * Section 4.5: a spin an edge, where the penalty of an edge that could be added is a product of
   * sums. As a rule, "one edge at least of those that touch this one", it takes bits besides.
   */
  @Test
  void smallestMaximalMatching() {
    Model model = Model.named("maximal matching");
    Family<Integer, Bit> x = model.bits("edge", upTo(PRISM.length));
    for (int v = 0; v < 6; v++) {
      int vertex = v;
      List<Integer> at = upTo(8).stream().filter(e -> touches(e, vertex)).toList();
      model.require("at most one edge at " + v, sum(at, x::of).atMost(1));
    }
    int extra = 0;
    for (int e = 0; e < PRISM.length; e++) {
      int edge = e;
      List<Integer> near =
          upTo(8).stream()
              .filter(f -> touches(f, PRISM[edge][0]) || touches(f, PRISM[edge][1]))
              .toList();
      model.require("edge " + e + " cannot be added", sum(near, x::of).atLeast(1));
      extra += productBits(near.size());
    }
    model.minimize("edges", sum(x.decisions()));
    double least = least(8, s -> maximalMatching(s) ? Integer.bitCount(s) : NONE);
    assertEquals(2, least);
    assertOptimum(least, PRISM.length + extra, model.snapshot());
  }

  private static boolean touches(int edge, int vertex) {
    return PRISM[edge][0] == vertex || PRISM[edge][1] == vertex;
  }

  private static boolean maximalMatching(int chosen) {
    int[] degree = new int[6];
    for (int e = 0; e < PRISM.length; e++) {
      degree[PRISM[e][0]] += chosen >> e & 1;
      degree[PRISM[e][1]] += chosen >> e & 1;
    }
    return IntStream.of(degree).allMatch(d -> d <= 1)
        && prism().allMatch(e -> degree[e[0]] + degree[e[1]] > 0);
  }

  /** Section 6.1: n N spins; a five-cycle takes three colours. */
  @Test
  void colouring() {
    int[][] ring = {{0, 1}, {1, 2}, {2, 3}, {3, 4}, {4, 0}};
    assertEquals(0, words(5, 2).filter(c -> proper(c, ring)).count());
    assertInfeasible(10, Colouring.of("ring", graph(5, ring), 2).statement());
    assertTrue(words(5, 3).anyMatch(c -> proper(c, ring)));
    assertOptimum(0, 15, Colouring.of("ring", graph(5, ring), 3).statement());
  }

  private static boolean proper(int[] colours, int[][] edges) {
    return Stream.of(edges).allMatch(e -> colours[e[0]] != colours[e[1]]);
  }

  /** Section 6.2: n N spins; each colour a clique. A pentagon is no two cliques. */
  @Test
  void cliqueCover() {
    CompactGraph prism = graph(6, PRISM);
    assertTrue(words(6, 2).anyMatch(c -> proper(c, missing(prism))));
    assertOptimum(0, 12, cliqueCover(prism, 2).snapshot());
    CompactGraph pentagon = graph(5, new int[][] {{0, 1}, {1, 2}, {2, 3}, {3, 4}, {4, 0}});
    assertFalse(words(5, 2).anyMatch(c -> proper(c, missing(pentagon))));
    assertInfeasible(10, cliqueCover(pentagon, 2).snapshot());
    assertTrue(words(5, 3).anyMatch(c -> proper(c, missing(pentagon))));
    assertOptimum(0, 15, cliqueCover(pentagon, 3).snapshot());
  }

  private static int[][] missing(CompactGraph graph) {
    return words(2, graph.vertices())
        .filter(p -> p[0] < p[1] && !graph.adjacent(p[0], p[1]))
        .toArray(int[][]::new);
  }

  private static Model cliqueCover(CompactGraph graph, int cliques) {
    Model model = Model.named("clique cover");
    Family<Integer, Choice<Integer>> in =
        model.choices("clique of", upTo(graph.vertices()), upTo(cliques));
    for (int[] pair : missing(graph)) {
      for (int k : upTo(cliques)) {
        model.require(
            pair[0] + " and " + pair[1] + " not both in " + k,
            sum(in.of(pair[0]).is(k), in.of(pair[1]).is(k)).atMost(1));
      }
    }
    return model;
  }

  /** Section 7.1: (N - 1)^2 spins, the first place being fixed. */
  @Test
  void hamiltonianCycles() {
    int[][] withCycle = {{0, 1}, {1, 2}, {2, 3}, {3, 4}, {4, 0}, {0, 2}};
    int[][] bowTie = {{0, 1}, {1, 2}, {2, 0}, {0, 3}, {3, 4}, {4, 0}};
    assertTrue(orders(5).anyMatch(o -> cycle(o, graph(5, withCycle))));
    assertOptimum(0, 16, hamiltonian(graph(5, withCycle)).snapshot());
    assertFalse(orders(5).anyMatch(o -> cycle(o, graph(5, bowTie))));
    assertInfeasible(16, hamiltonian(graph(5, bowTie)).snapshot());
  }

  private static boolean cycle(int[] order, CompactGraph graph) {
    return IntStream.range(0, 5).allMatch(k -> graph.adjacent(order[k], order[(k + 1) % 5]));
  }

  private static Model hamiltonian(CompactGraph graph) {
    int n = graph.vertices();
    List<Integer> rest = upTo(n).subList(1, n);
    Model model = Model.named("hamiltonian cycle");
    Family<Integer, Choice<Integer>> at = model.choices("vertex at", rest, rest);
    for (int v : rest) {
      model.require("vertex " + v, sum(rest, place -> at.of(place).is(v)).exactly(1));
      if (!graph.adjacent(0, v)) {
        model.require("not first: " + v, at.of(1).is(v).isFalse());
        model.require("not last: " + v, at.of(n - 1).is(v).isFalse());
      }
      for (int w : rest) {
        for (int place = 1; place < n - 1; place++) {
          if (v != w && !graph.adjacent(v, w)) {
            model.require(
                "no step from " + v + " to " + w + " at " + place,
                sum(at.of(place).is(v), at.of(place + 1).is(w)).atMost(1));
          }
        }
      }
    }
    return model;
  }

  /** Section 7.2: (N - 1)^2 spins. */
  @Test
  void shortestTours() {
    NumberTable distances =
        NumberTable.of(
            5, 5, 0, 3, 4, 2, 7, 3, 0, 4, 6, 3, 4, 4, 0, 5, 8, 2, 6, 5, 0, 6, 7, 3, 8, 6, 0);
    double least =
        orders(5)
            .mapToDouble(
                o ->
                    IntStream.range(0, 5)
                        .mapToDouble(k -> distances.at(o[k], o[(k + 1) % 5]))
                        .sum())
            .min()
            .orElseThrow();
    assertOptimum(least, 16, Tour.of("five", distances).statement());
  }

  /** Section 9: N^2 spins. */
  @Test
  void graphIsomorphism() {
    CompactGraph path = graph(4, new int[][] {{0, 1}, {1, 2}, {2, 3}});
    CompactGraph crossed = graph(4, new int[][] {{2, 0}, {0, 3}, {3, 1}});
    CompactGraph star = graph(4, new int[][] {{0, 1}, {0, 2}, {0, 3}});
    assertTrue(orders(4).anyMatch(o -> maps(path, crossed, o)));
    assertOptimum(0, 16, isomorphism(path, crossed).snapshot());
    assertFalse(orders(4).anyMatch(o -> maps(path, star, o)));
    assertInfeasible(16, isomorphism(path, star).snapshot());
  }

  private static boolean maps(CompactGraph from, CompactGraph to, int[] order) {
    return words(2, 4)
        .filter(p -> p[0] < p[1])
        .allMatch(p -> from.adjacent(p[0], p[1]) == to.adjacent(order[p[0]], order[p[1]]));
  }

  private static Model isomorphism(CompactGraph from, CompactGraph to) {
    Model model = Model.named("isomorphism");
    Family<Integer, Choice<Integer>> image = model.choices("image of", upTo(4), upTo(4));
    for (int v : upTo(4)) {
      model.require("one onto " + v, sum(upTo(4), u -> image.of(u).is(v)).exactly(1));
    }
    List<Expr> wrong = new ArrayList<>();
    words(4, 4)
        .filter(w -> w[0] < w[1] && w[2] != w[3])
        .filter(w -> from.adjacent(w[0], w[1]) != to.adjacent(w[2], w[3]))
        .forEach(
            w -> {
              Expr both = sum(image.of(w[0]).is(w[2]), image.of(w[1]).is(w[3]));
              wrong.add(both);
              model.require("pair " + wrong.size(), both.atMost(1));
            });
    return model;
  }
}
