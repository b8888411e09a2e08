/**
 * The one-call way in: {@link dev.couplet.solve.Solver} takes a model and returns an {@link
 * dev.couplet.solve.Answer}, a plan with its value, a proved bound, and how the two compare.
 *
 * <p>What it does, one stage a file: {@code PlanStage} looks at every plan where they are few
 * enough; else {@code BoundStage} bounds the value, and {@code DrawStage} lowers the model and
 * draws until the effort is spent or the bound is reached. {@code FormSolver} does the same for a
 * form without a model.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.solve;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
