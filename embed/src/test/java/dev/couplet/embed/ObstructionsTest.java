package dev.couplet.embed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.host.CompactGraph;
import dev.couplet.host.Faults;
import dev.couplet.host.Host;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ObstructionsTest {
  @Test
  void tooManyVertices() {
    proved(Guests.random(10, 0, 1), Host.square(3, 3), "10 vertices", "has 9");
    Host broken = Host.square(3, 3).without(Faults.vertices(4));
    proved(Guests.random(9, 0, 1), broken, "9 vertices", "has 8");
  }

  @Test
  void tooManyEdges() {
    proved(Guests.complete(9), Host.square(4, 4), "36 edges", "has 24");
  }

  @Test
  void tooManyNeighbours() {
    Guest star = Guests.bipartite(1, 3);
    proved(star, ring(10), "guest vertex 0", "3 neighbours");
    // Two hubs of 12 neighbours need (12 - 2) / (4 - 2) = 5 vertices each: 10 + 12 > 20.
    proved(Guests.bipartite(2, 12), Host.square(4, 5), "at least 22 vertices", "has 20");
  }

  @Test
  void tooLargeParts() {
    Host apart = Host.square(3, 5).without(Faults.vertices(2, 7, 12));
    proved(Guests.grid(1, 7), apart, "7 vertices", "more than 6");
    proved(Guests.complete(4), ring(12), "3 neighbours");
    proved(Guests.cycle(4), Host.square(1, 12), "independent cycles", "more than 0");
  }

  @Test
  void tooWide() {
    proved(Guests.complete(10), Host.cells(2, 4, 9), "at least 9", "at most 8");
    none(Guests.complete(9), Host.cells(2, 4, 9));
    proved(Guests.complete(5), Host.square(3, 50), "at least 4", "at most 3");
  }

  /** Exact treewidths: textbook values; a bound by contraction reaches them here. */
  @Test
  void treewidthsOfKnownGraphs() {
    assertEquals(6, TreewidthBound.atLeast(Guests.complete(7).graph()));
    assertEquals(2, TreewidthBound.atLeast(Guests.cycle(9).graph()));
    assertEquals(1, TreewidthBound.atLeast(Guests.bipartite(1, 5).graph()));
    assertEquals(3, TreewidthBound.atLeast(Guests.bipartite(3, 8).graph()));
    assertEquals(0, TreewidthBound.atLeast(CompactGraph.builder(3).build()));
    assertEquals(0, TreewidthBound.atLeast(CompactGraph.builder(0).build()));
  }

  @ParameterizedTest
  @CsvSource({"4,4", "3,9", "30,30"})
  void neverAboveTheTreewidthOfASquareLattice(int rows, int columns) {
    int bound = TreewidthBound.atLeast(Guests.grid(rows, columns).graph());
    assertTrue(bound >= 2 && bound <= Math.min(rows, columns), "bound " + bound);
  }

  private static Host ring(int vertices) {
    return Host.of("ring", Guests.cycle(vertices).graph());
  }

  private static void proved(Guest guest, Host host, String... parts) {
    String because = Obstructions.find(guest, host).orElseThrow();
    for (String part : parts) {
      assertTrue(because.contains(part), because);
    }
  }

  private static void none(Guest guest, Host host) {
    assertEquals(Optional.empty(), Obstructions.find(guest, host));
  }
}
