/**
 * Embedding by a known pattern: {@link dev.couplet.embed.template.TemplateEmbedder} lays a complete
 * graph on a lattice that has one, and with it any guest of that many vertices. At once, even for
 * guests where a search would take long; but it uses the same vertices for a sparse guest as for a
 * dense one.
 *
 * <p>Grid of cells with sides of t, m by m of them: t m branch sets, each an upright and a level
 * line that meet in a cell of the diagonal; t m + 1 when one of them is taken apart and the others
 * are made longer. King's lattice, L by L: L paths that cross each other pair by pair, and one line
 * across their ends.
 *
 * <p>A lattice's pattern is one package-private class that makes the sets for a place on it;
 * another lattice is another such class and one line in {@code Pattern}.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.embed.template;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
