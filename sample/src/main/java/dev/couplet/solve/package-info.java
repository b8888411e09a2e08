/**
 * The one-call way in: {@link dev.couplet.solve.Solver} takes a model and returns an {@link
 * dev.couplet.solve.Answer}, a plan with its value, a proved bound, and how the two compare.
 *
 * <p>What it does, one stage a file: {@code PlanStage} looks at every plan where they are few
 * enough; else {@code SearchStage} branches over the decisions of the model. What that does not
 * prove is lowered, {@code BoundStage} bounds the value, {@code DrawStage} draws until its share of
 * the effort is spent or the bound is reached, and a last search takes what time is left. {@code
 * Escalation} raises weights that draws show to be too light. Where it is proved that no plan keeps
 * all rules, {@code ConflictStage} names a few that cannot hold together. {@code FormSolver} does
 * without a model what can be done on a form alone.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.solve;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
