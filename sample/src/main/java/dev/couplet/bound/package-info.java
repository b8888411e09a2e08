/**
 * Numbers that no energy of a form lies below.
 *
 * <p>A {@link dev.couplet.bound.Bound} gives one such number for a form. {@link
 * dev.couplet.bound.SplitBound} is the cheap one: each pair's coefficient is shared out between its
 * two ends, and the shares are improved in rounds. {@link dev.couplet.bound.RoofDual} is the best
 * one of that kind, by a maximum flow, and tells with its {@link dev.couplet.bound.Roof} which bits
 * have the same value in every minimum. {@link dev.couplet.bound.SemidefiniteBound} is the one for
 * dense forms, where those are weak. {@link dev.couplet.bound.Rounding} says how far the computed
 * energies of a form can be from the true ones.
 *
 * <p>A bound is a proof, so rounding never raises it: for forms whose energies are exact all
 * arithmetic is exact, for others a margin is taken off that covers every rounding error, those of
 * the energies included.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.bound;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
