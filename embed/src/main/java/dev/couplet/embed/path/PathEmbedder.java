package dev.couplet.embed.path;

import dev.couplet.embed.Embedder;
import dev.couplet.embed.Embedding;
import dev.couplet.embed.Fit;
import dev.couplet.embed.Guest;
import dev.couplet.embed.Obstructions;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.SplittableRandom;

/**
 * Embeds any guest in any host: branch sets are laid along cheapest paths to their neighbours, may
 * overlap at first, and negotiate until none does.
 *
 * <p>An attempt (a draw of the effort) lays all guest vertices anew in every sweep, 256 if the
 * effort leaves it open; an effort with a limit only makes as many attempts as the time allows. The
 * first attempt to succeed is the last: it spends the rest of its sweeps on making the embedding
 * smaller, fewest host vertices first, then the shorter longest set, until that no longer helps.
 * Before all this, {@link Obstructions} are looked for.
 *
 * <p>Cost: a sweep takes at most one shortest-path search a guest edge and direction, so O(mM) for
 * m guest and M host edges; in large hosts the searches stay local, and it takes far less. Memory:
 * some 60 bytes a host vertex. It runs on the caller's thread. Immutable, thread-safe.
 *
 * <p>Source: Cai, Macready and Roy, "A practical heuristic for finding graph minors" (2014); the
 * prices after McMurchie and Ebeling, "PathFinder: a negotiation-based performance-driven router
 * for FPGAs" (1995).
 */
public final class PathEmbedder implements Embedder {
  private static final int SWEEPS = 256;

  private PathEmbedder() {}

  /** The embedder with its usual settings. */
  public static PathEmbedder standard() {
    return new PathEmbedder();
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
    return search(guest, host, effort, vigil);
  }

  private static Fit search(Guest guest, Host host, Effort effort, Vigil vigil) {
    SplittableRandom random = new SplittableRandom(effort.seed());
    int draws = effort.draws().orElse(Integer.MAX_VALUE);
    OptionalInt overlap = OptionalInt.empty();
    for (int draw = 0; draw < draws && !vigil.over(); draw++) {
      Attempt attempt =
          new Attempt(
              guest,
              host,
              effort.sweeps().orElse(SWEEPS),
              effort.target().orElse(Double.NEGATIVE_INFINITY),
              vigil,
              random.split());
      attempt.run();
      if (attempt.best().isPresent()) {
        return new Fit.Fits(attempt.best().get());
      }
      overlap = least(overlap, attempt.leastOverlap());
    }
    return new Fit.NotFound(vigil.reason(), overlap);
  }

  private static OptionalInt least(OptionalInt one, OptionalInt other) {
    if (one.isEmpty() || other.isEmpty()) {
      return one.isEmpty() ? other : one;
    }
    return one.getAsInt() < other.getAsInt() ? one : other;
  }
}
