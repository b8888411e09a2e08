package dev.couplet.bench.models;

import static dev.couplet.bench.models.Formulation.assertOptimum;
import static dev.couplet.bench.models.Formulation.in;
import static dev.couplet.bench.models.Formulation.least;
import static dev.couplet.bench.models.Formulation.orders;
import static dev.couplet.bench.models.Formulation.productBits;
import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Literal;
import dev.couplet.model.Model;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/**
 * Trees and feedback sets, against brute force.
 *
 * <p>Source: Lucas, "Ising formulations of many NP problems" (2014), section 8 (from memory). There
 * a vertex has a spin a depth and an edge a spin a direction and depth; here each vertex has one
 * choice among "parent u, at depth d", "root" and "out", so that the depths need no spins of their
 * own.
 */
class TreeFormulationsTest {
  private static final double NONE = Double.POSITIVE_INFINITY;

  /** What a vertex is in a tree: below a parent at a depth; parent -1 stands for the root. */
  private record Role(int parent, int depth) {
    static final Role OUT = new Role(-2, 0);
    static final Role ROOT = new Role(-1, 0);
  }

  private static List<Integer> upTo(int n) {
    return IntStream.range(0, n).boxed().toList();
  }

  /** Vertices 0 .. n - 1 of a complete graph, 0 the root of a tree of depth n - 1. */
  private static List<Choice<Role>> tree(Model model, int n, List<Integer> mayBeOut) {
    List<Choice<Role>> roles = new ArrayList<>();
    for (int v = 0; v < n; v++) {
      List<Role> options = new ArrayList<>(v == 0 ? List.of(Role.ROOT) : List.of(new Role(0, 1)));
      for (int parent = 1; parent < n && v > 0; parent++) {
        for (int depth = 2; depth < n && parent != v; depth++) {
          options.add(new Role(parent, depth));
        }
      }
      if (mayBeOut.contains(v)) {
        options.add(Role.OUT);
      }
      roles.add(model.choice("role of " + v, options));
    }
    hang(model, roles);
    return roles;
  }

  /** A vertex at depth d hangs on one at depth d - 1. */
  private static void hang(Model model, List<Choice<Role>> roles) {
    for (int v = 0; v < roles.size(); v++) {
      for (Role role : roles.get(v).options()) {
        if (role.depth() > 0) {
          List<Literal> above = at(roles.get(role.parent()), role.depth() - 1, v);
          model.require(v + " hangs as " + role, roles.get(v).is(role).atMost(sum(above)));
        }
      }
    }
  }

  private static List<Literal> at(Choice<Role> vertex, int depth, int notBelow) {
    return vertex.options().stream()
        .filter(r -> r != Role.OUT && r.depth() == depth && r.parent() != notBelow)
        .map(vertex::is)
        .toList();
  }

  private static Expr cost(List<Choice<Role>> roles, int[][] costs) {
    List<Expr> edges = new ArrayList<>();
    for (int v = 0; v < roles.size(); v++) {
      for (Role role : roles.get(v).options()) {
        if (role.depth() > 0) {
          edges.add(roles.get(v).is(role).times(costs[v][role.parent()]));
        }
      }
    }
    return sum(edges);
  }

  /** A cheap star: its centre has degree 3, which is one too many. */
  private static final int[][] STAR = {{0, 1, 6, 5}, {1, 0, 1, 1}, {6, 1, 0, 4}, {5, 1, 4, 0}};

  /** Section 8.1: the cheapest spanning tree with at most two edges at a vertex. */
  @Test
  void spanningTreeOfSmallDegree() {
    Model model = Model.named("spanning tree");
    List<Choice<Role>> roles = tree(model, 4, List.of());
    for (int v = 0; v < 4; v++) {
      model.require("degree of " + v, sum(children(roles, v)).atMost(v == 0 ? 2 : 1));
    }
    model.minimize("cost", cost(roles, STAR));
    double least = cheapest(STAR, 0b1111, 2);
    assertEquals(6, least);
    // The root's choice of 1, three of 5 options, and the rule "not all of three literals".
    assertOptimum(least, 1 + 3 * 5 + productBits(3), model.snapshot());
  }

  private static List<Literal> children(List<Choice<Role>> roles, int parent) {
    return roles.stream()
        .flatMap(
            c -> c.options().stream().filter(r -> r.depth() > 0 && r.parent() == parent).map(c::is))
        .toList();
  }

  /** The cheapest set of edges that joins the terminals and has no vertex of a higher degree. */
  private static double cheapest(int[][] costs, int terminals, int degree) {
    int[][] edges = {{0, 1}, {0, 2}, {0, 3}, {1, 2}, {1, 3}, {2, 3}};
    return least(
        6,
        s -> {
          int[] degrees = new int[4];
          int joined = terminals & -terminals;
          double cost = 0;
          for (int round = 0; round < 4; round++) {
            for (int e = 0; e < 6; e++) {
              boolean touches = in(joined, edges[e][0]) || in(joined, edges[e][1]);
              joined |= in(s, e) && touches ? 1 << edges[e][0] | 1 << edges[e][1] : 0;
            }
          }
          for (int e = 0; e < 6; e++) {
            degrees[edges[e][0]] += s >> e & 1;
            degrees[edges[e][1]] += s >> e & 1;
            cost += in(s, e) ? costs[edges[e][0]][edges[e][1]] : 0;
          }
          boolean spans = (joined & terminals) == terminals;
          return spans && IntStream.of(degrees).allMatch(d -> d <= degree) ? cost : NONE;
        });
  }

  /** Section 8.2: terminals 0, 2 and 3; vertex 1 joins them for less than any two edges do. */
  @Test
  void steinerTree() {
    Model model = Model.named("steiner tree");
    List<Choice<Role>> roles = tree(model, 4, List.of(1));
    model.minimize("cost", cost(roles, STAR));
    double least = cheapest(STAR, 0b1101, 3);
    assertEquals(3, least);
    assertOptimum(least, 1 + 3 * 5 + 1, model.snapshot());
  }

  /** Section 8.3: N (N + 1) spins; what is kept has heights that rise along every arc. */
  @Test
  void directedFeedbackVertexSet() {
    int[][] arcs = {{0, 1}, {1, 0}, {1, 2}, {2, 3}, {3, 1}};
    Model model = Model.named("feedback vertices");
    Family<Integer, Choice<Integer>> height =
        model.choices("height of", upTo(4), List.of(0, 1, 2, 3, 4));
    for (int[] arc : arcs) {
      for (int from = 1; from <= 4; from++) {
        for (int to = 1; to <= from; to++) {
          model.require(
              arc[0] + " at " + from + ", " + arc[1] + " at " + to,
              sum(height.of(arc[0]).is(from), height.of(arc[1]).is(to)).atMost(1));
        }
      }
    }
    model.minimize("removed", sum(upTo(4), v -> height.of(v).is(0)));
    double least =
        least(
            4,
            s ->
                acyclic(4, Stream.of(arcs).filter(a -> !in(s, a[0]) && !in(s, a[1])))
                    ? Integer.bitCount(s)
                    : NONE);
    assertEquals(1, least, "vertex 1 lies on both cycles");
    assertOptimum(least, 4 * 5, model.snapshot());
  }

  private static boolean acyclic(int n, Stream<int[]> arcs) {
    List<int[]> all = arcs.toList();
    return orders(n).anyMatch(o -> all.stream().allMatch(a -> o[a[0]] < o[a[1]]));
  }

  /** Section 8.4: what is kept is a forest, each edge in it that of a parent and a child. */
  @Test
  void undirectedFeedbackVertexSet() {
    int[][] triangle = {{0, 1}, {0, 2}, {1, 2}};
    Model model = Model.named("feedback vertices of a triangle");
    List<Choice<Role>> roles = new ArrayList<>();
    for (int v : upTo(3)) {
      List<Role> options = new ArrayList<>(List.of(Role.OUT, Role.ROOT));
      for (int parent : upTo(3)) {
        for (int depth = 1; depth <= 2 && parent != v; depth++) {
          options.add(new Role(parent, depth));
        }
      }
      roles.add(model.choice("role of " + v, options));
    }
    hang(model, roles);
    for (int[] edge : triangle) {
      List<Literal> reasons = new ArrayList<>();
      for (int end = 0; end < 2; end++) {
        int parent = edge[1 - end];
        Choice<Role> child = roles.get(edge[end]);
        child.options().stream()
            .filter(r -> r.parent() == parent)
            .map(child::is)
            .forEach(reasons::add);
        reasons.add(child.is(Role.OUT));
      }
      model.require("edge " + edge[0] + edge[1], sum(reasons).atLeast(1));
    }
    model.minimize("removed", sum(roles, role -> role.is(Role.OUT)));
    // Three choices of 6; an edge has two reasons at each depth, and two ends that may be out.
    assertOptimum(1, 3 * 6 + 3 * productBits(6), model.snapshot());
  }

  /** Section 8.5: heights that rise along every arc that is kept. */
  @Test
  void feedbackEdgeSet() {
    int[][] arcs = {{0, 1}, {1, 0}, {1, 2}, {2, 0}};
    Model model = Model.named("feedback edges");
    Family<Integer, Bit> removed = model.bits("removed", upTo(4));
    Family<Integer, Choice<Integer>> height = model.choices("height of", upTo(3), upTo(3));
    for (int e : upTo(4)) {
      Choice<Integer> from = height.of(arcs[e][0]);
      Choice<Integer> to = height.of(arcs[e][1]);
      model.require("arc " + e + " from the top", from.is(2).implies(removed.of(e)));
      for (int h : upTo(2)) {
        Expr notAbove = sum(upTo(h + 1), to::is);
        model.require(
            "arc " + e + " from " + h, from.is(h).plus(notAbove).minus(removed.of(e)).atMost(1));
      }
    }
    model.minimize("arcs removed", sum(removed.decisions()));
    double least =
        least(
            4,
            s ->
                acyclic(3, IntStream.range(0, 4).filter(e -> !in(s, e)).mapToObj(e -> arcs[e]))
                    ? Integer.bitCount(s)
                    : NONE);
    assertEquals(1, least, "the arc from 0 to 1 lies on both cycles");
    // Four arcs, three heights of three vertices; from the lowest height a rule says one at least
    // of three literals, from the middle one it takes a slack up to 2.
    assertOptimum(least, 4 + 3 * 3 + 4 * (productBits(3) + 2), model.snapshot());
  }
}
