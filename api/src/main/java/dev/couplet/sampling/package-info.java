/**
 * The interface between a caller and a method that looks for low states of a form.
 *
 * <p>A {@link dev.couplet.sampling.Sampler} is given a {@link dev.couplet.form.Qubo} and a {@link
 * dev.couplet.sampling.Run}: how much work ({@link dev.couplet.sampling.Effort}), how it is watched
 * ({@link dev.couplet.sampling.Watch}), states to begin from, and what is known of the form's
 * {@link dev.couplet.sampling.Structure}. It returns {@link dev.couplet.sampling.Draws}. While it
 * works it asks the run's {@link dev.couplet.sampling.Vigil} whether to go on.
 *
 * <p>Promises of every sampler: the same seed gives the same draws on every platform and thread
 * count as long as the effort is counted; energies are those of the form that was passed in; draws
 * are independent of each other; a run that is stopped or out of time returns what it has, valid;
 * samplers are immutable and can be shared between threads. {@code SamplerAudit} checks them.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.sampling;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
