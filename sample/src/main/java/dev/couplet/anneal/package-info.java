/**
 * Simulated annealing.
 *
 * <p>{@link dev.couplet.anneal.Annealing} is the sampler, {@link dev.couplet.anneal.Cooling} the
 * path of its temperature from hot to cold. Both ends follow from the form's own coefficients
 * unless they are set.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.anneal;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
