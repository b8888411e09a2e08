/**
 * Local search by single flips.
 *
 * <p>{@link dev.couplet.search.GreedyDescent} goes down from random states, {@link
 * dev.couplet.search.Tabu} goes on from a local minimum by the best flip that was not made lately,
 * and {@link dev.couplet.search.Relinking} searches again between the best states it has found. The
 * last two keep the gain of every flip and look at all of them in each iteration, so they are at
 * their best on dense forms.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.search;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
