package dev.couplet.embed.path;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.couplet.embed.Guests;
import dev.couplet.host.CompactGraph;
import dev.couplet.host.Faults;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

class RootFinderProperties {
  private static final long FAR = Long.MAX_VALUE / 100;

  /** The best root is as good as one found by looking at every vertex, whatever the limit. */
  @Property(tries = 300)
  void theRootIsBest(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Host host = host(random);
    Prices prices = new Prices(host);
    int guests = 1 + random.nextInt(6);
    Trees trees = new Trees(guests, host.vertices(), prices);
    int[] towards = new int[guests];
    for (int g = 0; g < guests; g++) {
      growTree(g, trees, host, random);
      towards[g] = g;
      prices.raise();
    }
    Spread spread = new Spread(host.graph().offsets(), host.graph().targets());
    Pace pace = new Pace(Vigil.begin(Effort.draws(1), Watch.none()));
    RootFinder finder = new RootFinder(1, trees, prices, spread, pace, random);
    long best = FAR;
    List<long[]> distances = new ArrayList<>();
    for (int g = 0; g < guests; g++) {
      distances.add(reach(g, trees, prices, host.graph()));
    }
    for (int h = 0; h < host.vertices(); h++) {
      best = Math.min(best, total(h, distances, prices));
    }
    for (int again = 0; again < 3; again++) {
      int root = finder.find(0, towards, guests);
      if (best >= FAR) {
        assertEquals(RootFinder.NONE, root);
      } else {
        assertEquals(best, total(root, distances, prices));
      }
    }
  }

  private static Host host(SplittableRandom random) {
    Host whole =
        random.nextBoolean()
            ? Host.cells(2, 3, 3)
            : Host.of("any", Guests.random(30, 0.1, random.nextLong()).graph());
    return whole.without(Faults.seeded(whole, 0.1, 0.1, random.nextLong()));
  }

  private static void growTree(int g, Trees trees, Host host, SplittableRandom random) {
    int[] present = host.presentVertices().stream().toArray();
    int vertex = present[random.nextInt(present.length)];
    int node = trees.add(g, vertex, Trees.NONE);
    for (int step = random.nextInt(3); step > 0; step--) {
      int[] around = host.graph().neighbours(trees.host[node]);
      if (around.length > 0) {
        int next = around[random.nextInt(around.length)];
        boolean free = true;
        for (int v : trees.vertices(g)) {
          free &= v != next;
        }
        node = free ? trees.add(g, next, node) : node;
      }
    }
  }

  /** What it costs to come from a tree to beside each vertex: 0 on the tree itself. */
  private static long[] reach(int g, Trees trees, Prices prices, CompactGraph graph) {
    int n = graph.vertices();
    long[] arrive = new long[n];
    Arrays.fill(arrive, FAR);
    for (int v : trees.vertices(g)) {
      arrive[v] = 0;
    }
    long[] beside = arrive.clone();
    for (int round = 0; round < n; round++) {
      for (int v = 0; v < n; v++) {
        for (int w : graph.neighbours(v)) {
          beside[w] = Math.min(beside[w], arrive[v]);
          arrive[w] = Math.min(arrive[w], beside[w] + prices.cost[w]);
        }
      }
    }
    return beside;
  }

  private static long total(int h, List<long[]> distances, Prices prices) {
    long sum = prices.cost[h];
    for (long[] distance : distances) {
      sum = Math.min(FAR, sum + distance[h]);
    }
    return sum;
  }
}
