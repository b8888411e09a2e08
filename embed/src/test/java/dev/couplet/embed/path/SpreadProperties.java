package dev.couplet.embed.path;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.embed.Guests;
import dev.couplet.host.CompactGraph;
import java.util.Arrays;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class SpreadProperties {
  private static final long FAR = Long.MAX_VALUE;

  /** Costs from three ranges, so that distances collide, spread out, and wrap the ring. */
  @Property(tries = 500)
  void distancesAreThoseOfBellmanAndFord(
      @ForAll long seed, @ForAll @IntRange(min = 1, max = 40) int vertices) {
    SplittableRandom random = new SplittableRandom(seed);
    CompactGraph graph = Guests.random(vertices, 0.1, random.nextLong()).graph();
    int[] cost = costs(vertices, random);
    Spread spread = new Spread(graph.offsets(), graph.targets());
    for (int round = 0; round < 3; round++) {
      boolean[] source = new boolean[vertices];
      source[random.nextInt(vertices)] = true;
      source[random.nextInt(vertices)] = true;
      long limit = random.nextBoolean() ? FAR : random.nextInt(3 * Spread.LARGEST);
      checkRound(graph, cost, spread, source, limit);
    }
  }

  private static int[] costs(int vertices, SplittableRandom random) {
    int range = new int[] {3, 100, Spread.LARGEST}[random.nextInt(3)];
    int[] cost = new int[vertices];
    for (int v = 0; v < vertices; v++) {
      cost[v] = random.nextInt(8) == 0 ? Spread.BLOCKED : 1 + random.nextInt(range);
    }
    return cost;
  }

  private static void checkRound(
      CompactGraph graph, int[] cost, Spread spread, boolean[] source, long limit) {
    long[] expected = bellmanFord(graph, cost, source);
    spread.begin();
    for (int v = 0; v < source.length; v++) {
      if (source[v]) {
        spread.source(v);
      }
    }
    boolean[] settled = new boolean[source.length];
    long last = 0;
    for (int v = spread.settle(cost, limit); v >= 0; v = spread.settle(cost, limit)) {
      assertFalse(settled[v]);
      settled[v] = true;
      assertEquals(expected[v], spread.distance[v]);
      assertTrue(spread.distance[v] >= last && spread.distance[v] <= limit);
      last = spread.distance[v];
      checkOrigin(graph, cost, spread, v);
    }
    for (int v = 0; v < source.length; v++) {
      assertEquals(expected[v] <= limit && expected[v] != FAR, settled[v]);
    }
  }

  private static void checkOrigin(CompactGraph graph, int[] cost, Spread spread, int v) {
    int from = spread.from[v];
    if (from == v) {
      assertEquals(0, spread.distance[v]);
    } else {
      assertTrue(graph.adjacent(from, v));
      assertEquals(spread.distance[from] + cost[v], spread.distance[v]);
    }
  }

  private static long[] bellmanFord(CompactGraph graph, int[] cost, boolean[] source) {
    long[] distance = new long[source.length];
    Arrays.setAll(distance, v -> source[v] ? 0 : FAR);
    for (int round = 0; round < distance.length; round++) {
      for (int v = 0; v < distance.length; v++) {
        for (int w : graph.neighbours(v)) {
          if (distance[v] != FAR && cost[w] != Spread.BLOCKED) {
            distance[w] = Math.min(distance[w], distance[v] + cost[w]);
          }
        }
      }
    }
    return distance;
  }
}
