package dev.couplet.embed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.host.CompactGraph;
import dev.couplet.host.Faults;
import dev.couplet.host.GraphBuilder;
import dev.couplet.host.Host;
import java.util.Arrays;
import java.util.Optional;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

class ObstructionsProperties {
  /** A guest made by contracting random connected sets of its host fits by construction. */
  @Property(tries = 1000)
  void nothingThatFitsIsCalledImpossible(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Host host = host(random);
    int[] set = randomSets(host, random);
    int count = Arrays.stream(set).max().orElse(-1) + 1;
    GraphBuilder builder = CompactGraph.builder(count);
    double share = random.nextBoolean() ? 1 : random.nextDouble();
    host.graph()
        .forEachEdge(
            (u, v) -> {
              if (set[u] != set[v] && set[u] >= 0 && set[v] >= 0 && random.nextDouble() < share) {
                builder.edge(set[u], set[v]);
              }
            });
    Guest guest = new Guest("minor", builder.build());
    assertEquals(Optional.empty(), Obstructions.find(guest, host));
  }

  private static Host host(SplittableRandom random) {
    Host whole =
        switch (random.nextInt(4)) {
          case 0 -> Host.cells(2, 2, 3);
          case 1 -> Host.king(4, 3);
          case 2 -> Host.cubic(3, 2, 2);
          default -> Host.of("any", Guests.random(12, 0.2, random.nextLong()).graph());
        };
    return whole.without(Faults.seeded(whole, 0.1, 0.1, random.nextLong()));
  }

  /** Starts a set at every vertex that is still free, and lets it take free neighbours. */
  private static int[] randomSets(Host host, SplittableRandom random) {
    int[] set = new int[host.vertices()];
    Arrays.fill(set, -1);
    int count = 0;
    for (int v = 0; v < set.length; v++) {
      if (set[v] < 0 && host.present(v)) {
        int at = v;
        set[v] = count;
        for (int step = random.nextInt(4); step > 0; step--) {
          for (int w : host.graph().neighbours(at)) {
            if (set[w] < 0 && random.nextBoolean()) {
              set[w] = count;
              at = w;
              break;
            }
          }
        }
        count++;
      }
    }
    return set;
  }

  /** Against the exact treewidth of small graphs, by elimination of sets of vertices. */
  @Property(tries = 200)
  void theBoundIsBelowTheTreewidth(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    CompactGraph graph = Guests.random(1 + random.nextInt(9), random.nextDouble(), seed).graph();
    int exact = exactTreewidth(graph);
    int degeneracy = new Degeneracy(graph).value();
    assertTrue(TreewidthBound.atLeast(graph) <= exact);
    assertTrue(degeneracy <= TreewidthBound.atLeast(graph));
    assertEquals(plainDegeneracy(graph), degeneracy);
  }

  private static int plainDegeneracy(CompactGraph graph) {
    int largest = 0;
    for (int subset = 1; subset < 1 << graph.vertices(); subset++) {
      int least = Integer.MAX_VALUE;
      for (int v = 0; v < graph.vertices(); v++) {
        if ((subset >> v & 1) != 0) {
          int degree = 0;
          for (int w : graph.neighbours(v)) {
            degree += subset >> w & 1;
          }
          least = Math.min(least, degree);
        }
      }
      largest = Math.max(largest, least);
    }
    return largest;
  }

  /** Bodlaender, Fomin, Koster, Kratsch and Thilikos (2006): the recurrence over sets. */
  private static int exactTreewidth(CompactGraph graph) {
    int n = graph.vertices();
    int[] width = new int[1 << n];
    width[0] = -1;
    for (int set = 1; set < 1 << n; set++) {
      width[set] = Integer.MAX_VALUE;
      for (int v = 0; v < n; v++) {
        if ((set >> v & 1) != 0) {
          int before = set & ~(1 << v);
          int here = Math.max(width[before], degreeThrough(graph, before, v));
          width[set] = Math.min(width[set], here);
        }
      }
    }
    return width[(1 << n) - 1];
  }

  /** How many vertices outside a set v sees, directly or through the set. */
  private static int degreeThrough(CompactGraph graph, int set, int v) {
    int seen = 1 << v;
    int edge = seen;
    int outside = 0;
    while (edge != 0) {
      int at = Integer.numberOfTrailingZeros(edge);
      edge &= edge - 1;
      for (int w : graph.neighbours(at)) {
        if ((seen >> w & 1) == 0) {
          seen |= 1 << w;
          if ((set >> w & 1) != 0) {
            edge |= 1 << w;
          } else {
            outside++;
          }
        }
      }
    }
    return outside;
  }
}
