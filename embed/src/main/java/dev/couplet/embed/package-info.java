/**
 * Embedding: fitting a guest graph onto a host that has fewer couplings a vertex.
 *
 * <p>Each vertex of the {@link dev.couplet.embed.Guest} is given a {@link
 * dev.couplet.embed.BranchSet} of connected vertices of the {@link dev.couplet.host.Host}; every
 * guest edge is carried by at least one host edge between the two sets. An {@link
 * dev.couplet.embed.Embedder} looks for such an {@link dev.couplet.embed.Embedding} and answers
 * with a {@link dev.couplet.embed.Fit}: it fits, it is impossible for a reason, or none was found.
 * {@link dev.couplet.embed.Guests} makes guests of known shape, {@link
 * dev.couplet.embed.Obstructions} the cheap proofs that nothing can fit, and {@link
 * dev.couplet.embed.EmbedderAudit} checks an embedder from a unit test. A {@link
 * dev.couplet.embed.Picture} shows a host and what is on it.
 *
 * <p>Methods live in packages below this one. Promises of every embedder: whatever it returns is
 * valid; the same seed gives the same fit as long as the effort is counted; it ends when told;
 * {@code Impossible} is a proof, never a guess; it is immutable and can be shared between threads.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.embed;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
