package dev.couplet.embed.template;

import dev.couplet.embed.Embedder;
import dev.couplet.embed.Embedding;
import dev.couplet.embed.Fit;
import dev.couplet.embed.Guest;
import dev.couplet.embed.Obstructions;
import dev.couplet.host.CompactGraph;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * Embeds a guest of n vertices as if it were complete, by the clique pattern of a lattice.
 *
 * <p>On a grid of R by C cells with sides of t, n goes up to {@code t min(R, C) + 1}, which no
 * graph of larger treewidth can pass; up to {@code t m}, m cells a side are used and every branch
 * set has m + 1 vertices. On a king's lattice n goes up to {@code min(R, C) + 1}. On a host with
 * faults the pattern is moved to a place where nothing that it uses is missing; if there is none,
 * on other hosts, and for larger guests nothing is found. The branch sets are left even, as the
 * pattern has them; {@link Embedding#trimmed()} takes away what a guest can do without.
 *
 * <p>It needs no effort and no seed: cost O(n^2 / t) without faults, times the number of places
 * with them. Immutable, thread-safe.
 *
 * <p>Sources: the ell-shaped sets are Choi's triangular pattern ("Minor-embedding in adiabatic
 * quantum computation: II. Minor-universal graph design", 2011, from memory); the paths on the
 * king's lattice follow from sorting by odd-even transposition.
 */
public final class TemplateEmbedder implements Embedder {
  private TemplateEmbedder() {}

  /** The embedder; it has no settings. */
  public static TemplateEmbedder standard() {
    return new TemplateEmbedder();
  }

  @Override
  public Fit embed(Guest guest, Host host, Effort effort, Watch watch) {
    Vigil vigil = Vigil.begin(effort, watch);
    if (vigil.over()) {
      return new Fit.NotFound(vigil.reason(), OptionalInt.empty());
    }
    Optional<String> obstruction = Obstructions.find(guest, host);
    if (obstruction.isPresent()) {
      return new Fit.Impossible(obstruction.get());
    }
    if (guest.vertices() == 0) {
      return new Fit.Fits(Embedding.of(guest, host, List.of()));
    }
    return Pattern.of(guest.vertices(), host)
        .flatMap(pattern -> place(pattern, host, vigil))
        .<Fit>map(sets -> new Fit.Fits(Embedding.of(guest, host, sets)))
        .orElseGet(() -> new Fit.NotFound(vigil.reason(), OptionalInt.empty()));
  }

  /** The sets at the first place where they are whole. */
  private static Optional<List<int[]>> place(Pattern pattern, Host host, Vigil vigil) {
    for (int down = 0; down <= pattern.spareRows(); down++) {
      for (int right = 0; right <= pattern.spareColumns(); right++) {
        if (vigil.over()) {
          return Optional.empty();
        }
        List<int[]> sets = pattern.sets(down, right);
        if (whole(sets, host)) {
          return Optional.of(sets);
        }
      }
    }
    return Optional.empty();
  }

  /** Whether no vertex of the sets and no edge between them is missing. */
  private static boolean whole(List<int[]> sets, Host host) {
    if (host.graph().equals(host.whole())) {
      return true;
    }
    boolean[] used = new boolean[host.vertices()];
    for (int[] set : sets) {
      for (int v : set) {
        used[v] = true;
      }
    }
    return sets.stream().flatMapToInt(Arrays::stream).allMatch(v -> whole(v, used, host));
  }

  private static boolean whole(int v, boolean[] used, Host host) {
    CompactGraph left = host.graph();
    return host.present(v)
        && Arrays.stream(host.whole().neighbours(v)).allMatch(w -> !used[w] || left.adjacent(v, w));
  }
}
