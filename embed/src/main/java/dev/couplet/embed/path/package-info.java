/**
 * Embedding along cheapest paths: {@link dev.couplet.embed.path.PathEmbedder}, for guests and hosts
 * of any shape.
 *
 * <p>The idea is that of Cai, Macready and Roy (2014): lay one guest vertex after the other along
 * shortest paths to its neighbours, let branch sets overlap, and raise the price of what is shared.
 * What was found to matter here: with the plain scheme, where a whole path goes to the vertex being
 * laid, the search freezes. It moves when each path is shared out between the two sets it joins,
 * when a set is cut back as soon as a neighbour is lifted, and when vertices keep a history of
 * having been overused, as in the routing of circuits.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.embed.path;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
