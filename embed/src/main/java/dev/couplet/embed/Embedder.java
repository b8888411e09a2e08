package dev.couplet.embed;

import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Watch;

/**
 * A method that looks for embeddings.
 *
 * <p>Implementations are immutable and thread-safe: one instance serves many threads. They keep the
 * promises listed in the package's documentation, which {@link EmbedderAudit} checks.
 *
 * <p>How an effort is read: a draw is one attempt from scratch, a sweep one pass over all guest
 * vertices in it; the first attempt that succeeds is the last. A target ends the search as soon as
 * an embedding of at most so many host vertices is found. What is left open is the method's choice.
 */
@FunctionalInterface
public interface Embedder {
  /** Looks for an embedding of the guest in the host. */
  Fit embed(Guest guest, Host host, Effort effort, Watch watch);

  /** Looks for an embedding of the guest in the host, unwatched. */
  default Fit embed(Guest guest, Host host, Effort effort) {
    return embed(guest, host, effort, Watch.none());
  }
}
