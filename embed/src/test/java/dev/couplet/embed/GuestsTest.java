package dev.couplet.embed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class GuestsTest {
  @Test
  void haveTheEdgesOfTheirFormulas() {
    assertEquals(66, Guests.complete(12).edges());
    assertEquals(0, Guests.complete(0).vertices());
    assertEquals(15, Guests.bipartite(3, 5).edges());
    assertEquals(3 * 3 + 2 * 4, Guests.grid(3, 4).edges());
    assertEquals(7, Guests.cycle(7).edges());
    assertEquals(2, Guests.cycle(7).graph().maxDegree());
    assertThrows(IllegalArgumentException.class, () -> Guests.cycle(2));
  }

  @ParameterizedTest
  @CsvSource({"3,100", "3,4", "0,5", "0,0", "4,5", "2,3", "5,40"})
  void regularGraphsAreRegular(int degree, int vertices) {
    for (int seed = 0; seed < 5; seed++) {
      Guest guest = Guests.regular(degree, vertices, seed);
      for (int v = 0; v < vertices; v++) {
        assertEquals(degree, guest.graph().degree(v));
      }
    }
  }

  @Test
  void regularGraphsThatDoNotExistAreRefused() {
    assertThrows(IllegalArgumentException.class, () -> Guests.regular(3, 5, 1));
    assertThrows(IllegalArgumentException.class, () -> Guests.regular(4, 4, 1));
    assertThrows(IllegalArgumentException.class, () -> Guests.regular(-1, 4, 1));
  }

  /** 4950 pairs at 0.1: mean 495, deviation 21.1; five deviations either way. */
  @Test
  void randomGraphsHaveAboutTheirShareOfPairs() {
    int edges = Guests.random(100, 0.1, 3).edges();
    assertTrue(edges > 389 && edges < 601, "edges: " + edges);
    assertEquals(4950, Guests.random(100, 1, 3).edges());
    assertEquals(0, Guests.random(100, 0, 3).edges());
    assertThrows(IllegalArgumentException.class, () -> Guests.random(5, 1.5, 1));
  }

  @Test
  void seedsDecide() {
    assertEquals(Guests.regular(3, 50, 7), Guests.regular(3, 50, 7));
    assertNotEquals(Guests.regular(3, 50, 7), Guests.regular(3, 50, 8));
    assertEquals(Guests.random(50, 0.2, 7), Guests.random(50, 0.2, 7));
    assertNotEquals(Guests.random(50, 0.2, 7), Guests.random(50, 0.2, 8));
  }
}
