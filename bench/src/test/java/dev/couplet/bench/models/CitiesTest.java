package dev.couplet.bench.models;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.Cities;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Watch;
import dev.couplet.solve.Answer;
import dev.couplet.solve.Proof;
import dev.couplet.solve.Solver;
import java.time.Duration;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Tours of invented cities, against dynamic programming. */
class CitiesTest {
  /** All orders, one after another, are the slow twin. */
  @Test
  void theDynamicProgrammeEqualsEveryOrder() {
    for (long seed = 1; seed <= 5; seed++) {
      NumberTable distances = new Cities(7, seed).distances();
      double least =
          Formulation.orders(7)
              .mapToDouble(
                  o ->
                      IntStream.range(0, 7)
                          .mapToDouble(k -> distances.at(o[k], o[(k + 1) % 7]))
                          .sum())
              .min()
              .orElseThrow();
      assertEquals(least, HeldKarp.length(distances));
    }
  }

  @ParameterizedTest
  @CsvSource({"8, 1", "8, 2", "10, 1", "10, 2"})
  void shortestToursAreProvedThroughTheLanguage(int count, long seed) {
    Cities cities = new Cities(count, seed);
    Answer answer =
        Solver.standard()
            .solve(
                cities.generate().statement(),
                Effort.within(Duration.ofSeconds(60)).seed(1),
                Watch.none());
    double shortest = HeldKarp.length(cities.distances());
    assertTrue(answer.plan().feasible());
    assertEquals(shortest, answer.value());
    assertEquals(Proof.OPTIMAL, answer.proof());
  }

  @Test
  void theSeedMakesTheCities() {
    assertEquals(new Cities(8, 1).distances(), new Cities(8, 1).distances());
    assertNotEquals(new Cities(8, 1).distances(), new Cities(8, 2).distances());
    assertTrue(new Cities(8, 1).distances().symmetric());
    assertEquals(new Cities(10, 3), Cities.parse("10:3"));
    assertEquals("cities:10:3", new Cities(10, 3).generate().name());
    assertThrows(IllegalArgumentException.class, () -> new Cities(2, 1));
    assertThrows(IllegalArgumentException.class, () -> Cities.parse("10"));
    assertThrows(IllegalArgumentException.class, () -> Cities.parse("x:1"));
  }
}
