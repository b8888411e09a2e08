/**
 * Methods that prove what they find: the lowest energy of a form, and more.
 *
 * <p>{@link dev.couplet.exact.Enumeration} looks at every state: all minima, the lowest {@link
 * dev.couplet.exact.Levels} with their numbers of states, and the exact {@link
 * dev.couplet.exact.Boltzmann} distribution, for forms of some thirty bits.
 *
 * <p>Methods are samplers too; their draws carry a bound, and {@code draws.proved()} holds when the
 * run was not cut short.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.exact;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
