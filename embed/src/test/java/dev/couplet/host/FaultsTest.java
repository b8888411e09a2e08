package dev.couplet.host;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class FaultsTest {
  private final Host square = Host.square(3, 3);

  @Test
  void listedPartsAreMissingAndNumbersStay() {
    Host host = square.without(Faults.vertices(4).edge(0, 1));
    assertEquals(9, host.vertices());
    assertEquals(8, host.presentCount());
    assertFalse(host.present(4));
    assertTrue(host.present(8));
    assertEquals(12 - 4 - 1, host.edges());
    assertEquals(0, host.graph().degree(4));
    assertFalse(host.graph().adjacent(0, 1));
    assertTrue(host.graph().adjacent(0, 3));
    assertEquals(12, host.whole().edges());
    assertEquals("row 1, column 1", host.describe(4));
  }

  @Test
  void faultsAddUp() {
    Host once = square.without(Faults.vertices(0));
    Host twice = once.without(Faults.vertices(8).edge(3, 4));
    assertEquals(7, twice.presentCount());
    assertEquals(12 - 2 - 2 - 1, twice.edges());
    assertEquals(square.graph(), twice.whole());
  }

  @Test
  void anEdgeOfAMissingVertexMayBeNamedToo() {
    assertEquals(8, square.without(Faults.vertices(4).edge(4, 5)).edges());
  }

  @Test
  void whatIsNotThereCannotBeRemoved() {
    Host host = square.without(Faults.vertices(4));
    assertRefused(() -> host.without(Faults.vertices(4)), "vertex 4");
    assertRefused(() -> host.without(Faults.vertices(9)), "vertex 9");
    assertRefused(() -> host.without(Faults.none().edge(4, 5)), "edge (4, 5)");
    assertRefused(() -> host.without(Faults.none().edge(0, 8)), "edge (0, 8)");
    assertRefused(() -> host.without(Faults.none().edge(-1, 8)), "edge (-1, 8)");
    assertRefused(() -> Faults.vertices(-1), "vertex -1");
  }

  @Test
  void seededFaultsAreTheShareAskedFor() {
    Host host = Host.cells(4, 10, 10);
    Faults faults = Faults.seeded(host, 0.02, 0.01, 7);
    Host broken = host.without(faults);
    assertEquals(16, faults.missingVertices().cardinality());
    assertEquals(784, broken.presentCount());
    Host onlyVertices = host.without(Faults.seeded(host, 0.02, 0, 7));
    long expected = onlyVertices.edges() - Math.round(0.01 * onlyVertices.edges());
    assertEquals(expected, broken.edges());
  }

  @Test
  void seedsDecide() {
    Host host = Host.cells(4, 10, 10);
    Faults first = Faults.seeded(host, 0.05, 0.05, 1);
    Faults again = Faults.seeded(host, 0.05, 0.05, 1);
    Faults other = Faults.seeded(host, 0.05, 0.05, 2);
    assertEquals(host.without(first).graph(), host.without(again).graph());
    assertNotEquals(host.without(first).graph(), host.without(other).graph());
  }

  @Test
  void everythingMayBeMissing() {
    Host nothing = square.without(Faults.seeded(square, 1, 1, 1));
    assertEquals(0, nothing.presentCount());
    assertEquals(0, nothing.edges());
    assertEquals(square.graph(), square.without(Faults.seeded(square, 0, 0, 1)).graph());
    assertRefused(() -> Faults.seeded(square, 1.1, 0, 1), "1.1");
    assertRefused(() -> Faults.seeded(square, 0, Double.NaN, 1), "NaN");
  }

  @Test
  void placesCanBeGiven() {
    Host line = Host.of("line", CompactGraph.builder(2).edge(0, 1).build());
    Host placed = line.places(new double[] {0, 3}, new double[] {1, 1});
    assertEquals(3, placed.x(1));
    assertEquals(1, placed.y(0));
    assertRefused(() -> line.places(new double[1], new double[2]), "1 and 2");
    assertRefused(
        () -> line.places(new double[] {0, Double.NaN}, new double[2]), "the place of vertex 1");
  }

  private static void assertRefused(Runnable call, String part) {
    IllegalArgumentException refused = assertThrows(IllegalArgumentException.class, call::run);
    assertTrue(refused.getMessage().contains(part), refused.getMessage());
  }
}
