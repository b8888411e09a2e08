/**
 * Methods that prove what they find: the lowest energy of a form, and more.
 *
 * <p>{@link dev.couplet.exact.Enumeration} looks at every state: all minima, the lowest {@link
 * dev.couplet.exact.Levels} with their numbers of states, and the exact {@link
 * dev.couplet.exact.Boltzmann} distribution, for forms of some thirty bits. {@link
 * dev.couplet.exact.Elimination} takes the bits of a sparse form one by one, over tables, and
 * counts its {@link dev.couplet.exact.Ground} states. {@link dev.couplet.exact.BranchAndBound}
 * reduces, splits, bounds and branches. On models rather than forms, {@link
 * dev.couplet.exact.PlanEnumeration} looks at every plan, {@link dev.couplet.exact.PlanSensitivity}
 * tells how far numbers may move until another plan is better, and the package {@code plans}
 * branches over decisions.
 *
 * <p>Methods are samplers too; their draws carry a bound, and {@code draws.proved()} holds when the
 * run was not cut short.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.exact;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
