/**
 * Published families of problems, each stated in the model language: one class a family, which
 * holds the model, its decisions, and the way from an answer written by hand to a plan.
 *
 * <p>Graphs: {@link dev.couplet.bench.models.Colouring}, {@link dev.couplet.bench.models.Clique}.
 * Orders: {@link dev.couplet.bench.models.Tour}, {@link
 * dev.couplet.bench.models.QuadraticAssignment}. Packing: {@link
 * dev.couplet.bench.models.GeneralisedAssignment}, {@link dev.couplet.bench.models.Knapsack}.
 * Schedules: {@link dev.couplet.bench.models.JobShop}. The value of a plan is the family's own
 * figure, in its own sense and units.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.bench.models;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
