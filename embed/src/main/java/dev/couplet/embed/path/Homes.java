package dev.couplet.embed.path;

import dev.couplet.host.CompactGraph;
import dev.couplet.host.Host;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/**
 * Which connected part of the host each connected part of the guest is to live in, chosen anew for
 * each attempt.
 *
 * <p>The guest's parts are taken largest first. Each goes to a part of the host that still has a
 * vertex for each of its own, with a probability in proportion to the room left; if there is none,
 * to the one with most room.
 */
final class Homes {
  private final int[] guestPart;
  private final int[] hostPart;
  private final int[] home;

  Homes(CompactGraph guest, Host host, SplittableRandom random) {
    guestPart = guest.parts();
    hostPart = host.graph().parts();
    for (int h = 0; h < hostPart.length; h++) {
      if (!host.present(h)) {
        hostPart[h] = -1;
      }
    }
    int[] wanted = sizes(guestPart);
    int[] room = sizes(hostPart);
    home = new int[wanted.length];
    for (int part : largestFirst(wanted)) {
      home[part] = choose(wanted[part], room, random);
      room[home[part]] -= wanted[part];
    }
  }

  /** Whether a guest vertex may live on a host vertex. */
  boolean allows(int guestVertex, int hostVertex) {
    return hostPart[hostVertex] == home[guestPart[guestVertex]];
  }

  private static int choose(int wanted, int[] room, SplittableRandom random) {
    long roomy = 0;
    int most = 0;
    for (int p = 0; p < room.length; p++) {
      roomy += room[p] >= wanted ? room[p] : 0;
      most = room[p] > room[most] ? p : most;
    }
    if (roomy == 0) {
      return most;
    }
    long ticket = random.nextLong(roomy);
    int part = -1;
    while (ticket >= 0) {
      part++;
      ticket -= room[part] >= wanted ? room[part] : 0;
    }
    return part;
  }

  private static List<Integer> largestFirst(int[] sizes) {
    return IntStream.range(0, sizes.length)
        .boxed()
        .sorted(Comparator.comparingInt(p -> -sizes[p]))
        .collect(Collectors.toList());
  }

  private static int[] sizes(int[] part) {
    int[] sizes = new int[Arrays.stream(part).max().orElse(-1) + 1];
    for (int p : part) {
      if (p >= 0) {
        sizes[p]++;
      }
    }
    return sizes;
  }
}
