package dev.couplet.host;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.StringReader;
import java.util.ArrayList;
import java.util.List;
import org.jgrapht.Graph;
import org.jgrapht.graph.DefaultEdge;
import org.jgrapht.graph.Pseudograph;
import org.jgrapht.graph.SimpleGraph;
import org.junit.jupiter.api.Test;

class CompactGraphTest {
  private static final CompactGraph HOUSE =
      CompactGraph.builder(6).edge(2, 0).edge(0, 1).edge(1, 2).edge(4, 1).edge(0, 1).build();

  @Test
  void keepsEachEdgeOnceInOrder() {
    List<String> edges = new ArrayList<>();
    HOUSE.forEachEdge((u, v) -> edges.add(u + "-" + v));
    assertEquals(List.of("0-1", "0-2", "1-2", "1-4"), edges);
    assertEquals(6, HOUSE.vertices());
    assertEquals(4, HOUSE.edges());
    assertArrayEquals(new int[] {0, 2, 4}, HOUSE.neighbours(1));
    assertEquals(0, HOUSE.degree(3));
    assertEquals(3, HOUSE.maxDegree());
    assertTrue(HOUSE.adjacent(4, 1));
    assertFalse(HOUSE.adjacent(4, 0));
    assertArrayEquals(new int[] {0, 2, 5, 7, 7, 8, 8}, HOUSE.offsets());
    assertArrayEquals(new int[] {1, 2, 0, 2, 4, 0, 1, 1}, HOUSE.targets());
  }

  @Test
  void theCallerCannotReachInside() {
    HOUSE.targets()[0] = 5;
    HOUSE.offsets()[1] = 5;
    HOUSE.neighbours(1)[0] = 5;
    assertTrue(HOUSE.adjacent(0, 1));
  }

  @Test
  void refusesWhatIsNoEdge() {
    GraphBuilder builder = CompactGraph.builder(3);
    assertThrows(IllegalArgumentException.class, () -> builder.edge(1, 1));
    assertThrows(IllegalArgumentException.class, () -> builder.edge(1, 3));
    assertThrows(IllegalArgumentException.class, () -> builder.edge(-1, 0));
    assertThrows(IllegalArgumentException.class, () -> CompactGraph.builder(-1));
  }

  @Test
  void goesToJGraphTAndBack() {
    Graph<Integer, DefaultEdge> graph = HOUSE.toJGraphT();
    assertEquals(6, graph.vertexSet().size());
    assertEquals(4, graph.edgeSet().size());
    assertEquals(HOUSE, CompactGraph.of(graph));
  }

  @Test
  void takesAnyGraphOfJGraphT() {
    Graph<String, DefaultEdge> graph = new SimpleGraph<>(DefaultEdge.class);
    for (String name : List.of("mill", "quay", "yard")) {
      graph.addVertex(name);
    }
    graph.addEdge("yard", "mill");
    Host host = Host.of("works", graph);
    assertTrue(host.graph().adjacent(0, 2));
    assertEquals(1, host.edges());
    assertEquals("quay", host.describe(1));
  }

  @Test
  void refusesALoopOfJGraphT() {
    Graph<String, DefaultEdge> graph = new Pseudograph<>(DefaultEdge.class);
    graph.addVertex("mill");
    graph.addEdge("mill", "mill");
    IllegalArgumentException loop =
        assertThrows(IllegalArgumentException.class, () -> CompactGraph.of(graph));
    assertTrue(loop.getMessage().contains("mill"), loop.getMessage());
  }

  @Test
  void goesToTextAndBack() throws IOException {
    StringBuilder text = new StringBuilder();
    EdgeList.write(HOUSE, text);
    assertEquals("6 4\n1 2\n1 3\n2 3\n2 5\n", text.toString());
    assertEquals(HOUSE, read(text.toString()));
  }

  @Test
  void textMayHoldWeightsAndRemarks() throws IOException {
    assertEquals(HOUSE, read("# house\n6 4\n\n1 2 -3\n3 1 0.5\n2 3\n 5 2 1\n# end\n"));
    assertEquals(CompactGraph.builder(0).build(), read("0 0"));
  }

  @Test
  void faultsOfTheTextAreNamedWithTheirPlace() {
    assertFault("", "house:1:1:");
    assertFault("3 4\n", "house:1:3:");
    assertFault("3 1\n1 1\n", "house:2:3:", "itself");
    assertFault("3 1\n1 4\n", "house:2:3:", "'4'");
    assertFault("3 1\n0 1\n", "house:2:1:", "'0'");
    assertFault("3 2\n1 2\n2 1\n", "house:3:3:", "twice");
    assertFault("3 2\n1 2\n", "house:3:1:", "edge 2 of 2");
    assertFault("3 1\n1 2 x\n", "house:2:5:", "'x'");
    assertFault("3 1\n1 2 5 5\n", "house:2:7:");
    assertFault("3 1\n1 2\n2 3\n", "house:3:1:", "goes on");
  }

  private static void assertFault(String text, String... parts) {
    IllegalArgumentException fault =
        assertThrows(IllegalArgumentException.class, () -> read(text), text);
    for (String part : parts) {
      assertTrue(fault.getMessage().contains(part), fault.getMessage());
    }
  }

  private static CompactGraph read(String text) throws IOException {
    return EdgeList.read("house", new StringReader(text));
  }
}
