package dev.couplet.embed;

import dev.couplet.host.Host;
import dev.couplet.host.Lattice;
import java.util.Arrays;
import java.util.Optional;

/**
 * Cheap proofs that a guest cannot be embedded in a host.
 *
 * <p>They count: vertices, edges, what a vertex of high degree takes, independent cycles of
 * connected parts; and they compare treewidths, since a graph that carries another has at least its
 * treewidth. If none is found, the guest may fit or not. Cost: O(n + m) of both graphs, and O(n^3)
 * for guests of at most 512 vertices on a lattice.
 */
public final class Obstructions {
  private final Guest guest;
  private final Host host;

  private Obstructions(Guest guest, Host host) {
    this.guest = guest;
    this.host = host;
  }

  /** A proof in a sentence that no embedding exists, if one of the cheap ones holds. */
  public static Optional<String> find(Guest guest, Host host) {
    Obstructions here = new Obstructions(guest, host);
    return here.vertices().or(here::edges).or(here::degrees).or(here::parts).or(here::treewidth);
  }

  private Optional<String> vertices() {
    return tooMany("vertices", guest.vertices(), "the host", host.presentCount());
  }

  /** Each guest edge needs a host edge of its own. */
  private Optional<String> edges() {
    return tooMany("edges", guest.edges(), "the host", host.edges());
  }

  private static Optional<String> tooMany(String what, long guest, String where, long host) {
    return guest <= host
        ? Optional.empty()
        : Optional.of("the guest has " + guest + " " + what + ", " + where + " has " + host);
  }

  private Optional<String> degrees() {
    int most = host.graph().maxDegree();
    long sum = 0;
    for (int g = 0; g < guest.vertices(); g++) {
      int degree = guest.graph().degree(g);
      if (degree > most && most <= 2) {
        return Optional.of(
            "guest vertex "
                + g
                + " has "
                + degree
                + " neighbours, and in a host of degree "
                + most
                + " no connected set has more than "
                + most);
      }
      sum += needed(degree, most);
    }
    if (sum > host.presentCount()) {
      return Optional.of(
          "by the degrees of the guest its branch sets hold at least "
              + sum
              + " vertices, the host has "
              + host.presentCount());
    }
    return Optional.empty();
  }

  /**
   * The least size of a branch set: s connected vertices of degree at most d have at most {@code
   * s(d - 2) + 2} edges that leave the set.
   */
  private static long needed(int degree, int most) {
    return degree <= most ? 1 : (degree - 2 + most - 3) / (most - 2);
  }

  /** A connected part is carried by one part of the host, which has at least its cycles. */
  private Optional<String> parts() {
    PartSizes ofGuest = PartSizes.of(guest.graph());
    PartSizes ofHost = PartSizes.of(host.graph());
    String where = "no part of the host has more than";
    return largest("vertices", ofGuest.vertices, where, ofHost.vertices)
        .or(() -> largest("edges", ofGuest.edges, where, ofHost.edges))
        .or(() -> largest("independent cycles", ofGuest.cycles, where, ofHost.cycles));
  }

  private static Optional<String> largest(String what, int[] guest, String where, int[] host) {
    int wanted = Arrays.stream(guest).max().orElse(0);
    int there = Arrays.stream(host).max().orElse(0);
    return wanted <= there
        ? Optional.empty()
        : Optional.of(
            "a connected part of the guest has "
                + wanted
                + " "
                + what
                + ", "
                + where
                + " "
                + there);
  }

  private Optional<String> treewidth() {
    int bound = host.lattice().stream().mapToInt(Obstructions::width).findFirst().orElse(-1);
    if (bound < 0) {
      return Optional.empty();
    }
    int least = TreewidthBound.atLeast(guest.graph());
    return least <= bound
        ? Optional.empty()
        : Optional.of(
            "the treewidth of the guest is at least "
                + least
                + ", that of the host at most "
                + bound);
  }

  private static int width(Lattice lattice) {
    return lattice.treewidthBound().orElse(-1);
  }
}
