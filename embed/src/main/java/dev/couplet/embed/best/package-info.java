/**
 * Embedding by the method that suits: {@link dev.couplet.embed.best.BestEmbedder}.
 *
 * <p>This room imports the rooms of all methods, and none imports it.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.embed.best;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
