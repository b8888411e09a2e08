package dev.couplet.embed.path;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.embed.Guest;
import dev.couplet.embed.Guests;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.util.HashSet;
import java.util.Set;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

class TreesProperties {
  /** After any laying and lifting: trees connected, neighbours in touch, counts right. */
  @Property(tries = 100)
  void treesStayTreesThatTouch(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Guest guest = Guests.random(2 + random.nextInt(9), 0.5, random.nextLong());
    Host host = random.nextBoolean() ? Host.cells(3, 3, 3) : Host.square(5, 5);
    Prices prices = new Prices(host);
    Trees trees = new Trees(guest.vertices(), host.vertices(), prices);
    Homes homes = new Homes(guest.graph(), host, random);
    Pace pace = new Pace(Vigil.begin(Effort.draws(1), Watch.none()));
    Router router = new Router(guest.graph(), host, trees, prices, homes, pace, random);
    for (int step = 0; step < 40; step++) {
      int v = random.nextInt(guest.vertices());
      router.lift(v);
      assertEquals(0, trees.size[v]);
      if (random.nextInt(4) > 0) {
        assertTrue(router.lay(v));
      }
      if (random.nextInt(3) == 0) {
        prices.raise();
      }
      check(guest, host, trees, prices);
    }
  }

  private static void check(Guest guest, Host host, Trees trees, Prices prices) {
    int[] use = new int[host.vertices()];
    for (int g = 0; g < guest.vertices(); g++) {
      Set<Integer> set = new HashSet<>();
      for (int v : trees.vertices(g)) {
        assertTrue(set.add(v), "vertex twice in a tree");
        use[v]++;
      }
      assertTrue(connected(set, host));
      for (int other : guest.graph().neighbours(g)) {
        if (trees.size[g] > 0 && trees.size[other] > 0) {
          assertTrue(meet(set, trees.vertices(other), host));
        }
      }
    }
    int overlap = 0;
    for (int h = 0; h < use.length; h++) {
      assertEquals(use[h], prices.use[h]);
      overlap += Math.max(0, use[h] - 1);
    }
    assertEquals(overlap, prices.overlap());
  }

  private static boolean connected(Set<Integer> set, Host host) {
    Set<Integer> left = new HashSet<>(set);
    Set<Integer> edge = new HashSet<>();
    set.stream().findFirst().ifPresent(edge::add);
    while (!edge.isEmpty()) {
      left.removeAll(edge);
      Set<Integer> next = new HashSet<>();
      for (int v : edge) {
        for (int w : host.graph().neighbours(v)) {
          if (left.contains(w)) {
            next.add(w);
          }
        }
      }
      edge = next;
    }
    return left.isEmpty();
  }

  private static boolean meet(Set<Integer> set, int[] other, Host host) {
    for (int v : other) {
      if (set.contains(v)) {
        return true;
      }
      for (int w : host.graph().neighbours(v)) {
        if (set.contains(w)) {
          return true;
        }
      }
    }
    return false;
  }
}
