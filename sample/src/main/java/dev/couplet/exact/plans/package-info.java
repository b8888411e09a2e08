/**
 * Branch and bound on the decisions of a model, rather than on the bits it is lowered to.
 *
 * <p>{@link dev.couplet.exact.plans.PlanSearch} is the way in. A statement is read into a {@code
 * Network}: variables (a whole choice, a bit), their costs alone and in pairs as exact whole
 * numbers ({@code Scale}), forbidden pairs, and rows, which limit sums or charge for them. A {@code
 * Partial} is what is left of it once some variables are decided; {@code Propagation} removes
 * values that no plan can keep, {@code Sweeps} move costs between pairs and variables so that as
 * much as possible ends up in the bound, {@code Multipliers} do the same for rows, and {@code
 * Branching} walks the tree. {@code Likeness} finds options that are treated alike, {@code
 * Interchange} lets the walk try one of them for all. {@code ProofLog} writes what a walk does, and
 * {@code ConflictFilter} leaves out rules until few are left.
 *
 * <p>Why costs are moved: Cooper, de Givry, Sanchez, Schiex, Zytnicki and Werner, "Soft arc
 * consistency revisited" (2010); in sweeps along an order: Kolmogorov, "Convergent tree-reweighted
 * message passing for energy minimization" (2006). Every move keeps the cost of every plan, so that
 * whatever has been gathered as a constant is a lower bound without rounding.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.exact.plans;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
