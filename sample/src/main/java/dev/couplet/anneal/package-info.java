/**
 * Simulated annealing and replica exchange.
 *
 * <p>{@link dev.couplet.anneal.Annealing} is the one sampler, {@link dev.couplet.anneal.Cooling}
 * the path of its temperature from hot to cold; {@link dev.couplet.anneal.Tempering} is the other,
 * with a ladder of temperatures. The ends follow from the form's own coefficients unless they are
 * set.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.anneal;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
