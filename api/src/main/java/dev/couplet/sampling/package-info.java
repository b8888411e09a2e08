/**
 * The interface between a caller and a method that looks for low states of a form.
 *
 * <p>A {@link dev.couplet.sampling.Sampler} is given a {@link dev.couplet.form.Qubo} and a {@link
 * dev.couplet.sampling.Run}: how much work ({@link dev.couplet.sampling.Effort}), how it is watched
 * ({@link dev.couplet.sampling.Watch}), states to begin from, and what is known of the form's
 * {@link dev.couplet.sampling.Structure}. It returns {@link dev.couplet.sampling.Draws}. While it
 * works it asks the run's {@link dev.couplet.sampling.Vigil} whether to go on.
 *
 * <p>Promises of every sampler:
 *
 * <ul>
 *   <li>The same seed gives the same draws on every platform and thread count as long as the effort
 *       is counted; energies are those of the form that was passed in; draws are independent of
 *       each other.
 *   <li>A run that ends {@link dev.couplet.sampling.End#DONE} has made the draws asked for, no
 *       fewer and no more, unless it proved its best to be the lowest.
 *   <li>A run that is stopped or out of time returns what it has, valid, at least one draw. A stop
 *       asked for before the start counts; then the result is no worse than the first start given.
 *       An interrupt of the calling thread is a stop, and its flag stays set.
 *   <li>A target ends the run at the lowest-numbered draw that reaches it; later draws are dropped.
 *   <li>Starts of another size are refused, as is a structure of bits that the form does not have.
 *       A listener hears of every run at least once, and what it throws reaches the caller as it
 *       is.
 *   <li>Samplers are immutable and can be shared between threads; the threads of a run end with it.
 * </ul>
 *
 * <p>{@code SamplerAudit} of the package {@code dev.couplet.audit} checks them.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.sampling;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
