package dev.couplet.embed.best;

import dev.couplet.embed.Embedder;
import dev.couplet.embed.Embedding;
import dev.couplet.embed.Fit;
import dev.couplet.embed.Guest;
import dev.couplet.embed.path.PathEmbedder;
import dev.couplet.embed.template.TemplateEmbedder;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import java.time.Duration;
import java.util.Comparator;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.Stream;

/**
 * Tries what suits the guest's density: the embedder to begin with.
 *
 * <p>A template takes no time, so it comes first. If the guest has at least half of all pairs as
 * edges and the template fits, that is the answer, trimmed. Otherwise paths are sought with the
 * whole effort, and the answer is what takes fewer host vertices, or the shorter longest branch set
 * if it is the same number. Immutable, thread-safe.
 */
public final class BestEmbedder implements Embedder {
  private static final double DENSE = 0.5;
  private static final Duration INSTANT = Duration.ofNanos(1);
  private static final Comparator<Embedding> FEWEST_VERTICES =
      Comparator.comparingInt(Embedding::total).thenComparingInt(Embedding::longest);

  private final Embedder templates = TemplateEmbedder.standard();
  private final Embedder paths = PathEmbedder.standard();

  private BestEmbedder() {}

  /** The embedder with its usual settings. */
  public static BestEmbedder standard() {
    return new BestEmbedder();
  }

  @Override
  public Fit embed(Guest guest, Host host, Effort effort, Watch watch) {
    Vigil vigil = Vigil.begin(effort, watch);
    Fit template = templates.embed(guest, host, effort, watch);
    Optional<Embedding> pattern = template.embedding().map(Embedding::trimmed);
    boolean settled = template instanceof Fit.Impossible || (pattern.isPresent() && dense(guest));
    if (settled || vigil.over()) {
      Fit otherwise = settled ? template : new Fit.NotFound(vigil.reason(), OptionalInt.empty());
      return pattern.<Fit>map(Fit.Fits::new).orElse(otherwise);
    }
    Fit path = paths.embed(guest, host, left(effort, vigil), watch);
    return Stream.of(path.embedding(), pattern)
        .flatMap(Optional::stream)
        .min(FEWEST_VERTICES)
        .<Fit>map(Fit.Fits::new)
        .orElse(path);
  }

  private static boolean dense(Guest guest) {
    long pairs = (long) guest.vertices() * (guest.vertices() - 1) / 2;
    return guest.edges() >= DENSE * pairs;
  }

  /** The effort without the time that has gone. */
  private static Effort left(Effort effort, Vigil vigil) {
    return effort
        .limit()
        .map(limit -> limit.minus(vigil.elapsed()))
        .map(time -> effort.limit(time.compareTo(INSTANT) < 0 ? INSTANT : time))
        .orElse(effort);
  }
}
