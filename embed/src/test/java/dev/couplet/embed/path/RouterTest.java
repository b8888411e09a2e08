package dev.couplet.embed.path;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.embed.Guest;
import dev.couplet.embed.Guests;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.time.Duration;
import java.util.Arrays;
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;

class RouterTest {
  private static final Guest PATH = new Guest("path", Guests.grid(1, 3).graph());

  private final AtomicLong looks = new AtomicLong();

  /** A path of two interior vertices between single ones: each side takes its half. */
  @Test
  void pathsAreShared() {
    Setting setting = new Setting(Host.square(1, 6), watched(Duration.ofDays(1)));
    setting.trees.add(0, 0, Trees.NONE);
    setting.trees.add(2, 5, Trees.NONE);
    assertTrue(setting.router.lay(1));
    int[] sizes = {setting.trees.size[0], setting.trees.size[1], setting.trees.size[2]};
    assertEquals(6, Arrays.stream(sizes).sum());
    assertTrue(sizes[1] >= 2 && sizes[1] <= 3, Arrays.toString(sizes));
  }

  /** What a neighbour holds only to touch a lifted tree goes with it. */
  @Test
  void liftingPrunesTheNeighbours() {
    Setting setting = new Setting(Host.square(1, 6), watched(Duration.ofDays(1)));
    setting.trees.add(0, 0, Trees.NONE);
    setting.trees.add(2, 5, Trees.NONE);
    assertTrue(setting.router.lay(1));
    setting.router.lift(1);
    assertEquals(1, setting.trees.size[0]);
    assertEquals(0, setting.trees.size[1]);
    assertEquals(1, setting.trees.size[2]);
    assertEquals(0, setting.prices.overlap());
  }

  /**
   * Laying one vertex between the corners of a lattice of 360,000 takes millions of steps; with a
   * clock that goes on by a second a look, it must not look often after the limit of 3.
   */
  @Test
  void theDeadlineIsKeptWhileOneVertexIsLaid() {
    Host host = Host.square(600, 600);
    Setting setting = new Setting(host, watched(Duration.ofSeconds(3)));
    setting.trees.add(0, 0, Trees.NONE);
    setting.trees.add(2, host.vertices() - 1, Trees.NONE);
    assertFalse(setting.router.lay(1));
    assertEquals(End.DEADLINE, setting.vigil.reason());
    assertEquals(4, looks.get());
  }

  private Vigil watched(Duration limit) {
    Watch watch = Watch.none().clock(() -> looks.getAndIncrement() * 1_000_000_000L);
    return Vigil.begin(Effort.within(limit), watch);
  }

  private static final class Setting {
    final Vigil vigil;
    final Prices prices;
    final Trees trees;
    final Router router;

    Setting(Host host, Vigil vigil) {
      SplittableRandom random = new SplittableRandom(1);
      this.vigil = vigil;
      prices = new Prices(host);
      trees = new Trees(3, host.vertices(), prices);
      Homes homes = new Homes(PATH.graph(), host, random);
      router = new Router(PATH.graph(), host, trees, prices, homes, new Pace(vigil), random);
    }
  }
}
