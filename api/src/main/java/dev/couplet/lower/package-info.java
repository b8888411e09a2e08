/**
 * From a stated model to a quadratic form, and back.
 *
 * <p>{@link dev.couplet.lower.Lowering} holds the settings; {@link dev.couplet.lower.Lowered} is
 * the result: a {@link dev.couplet.form.Qubo} whose minimum is the model's optimum, the way back
 * from draws to {@link dev.couplet.lower.Plans plans}, the {@link dev.couplet.lower.Lowered.Weight
 * weight} of each rule with the reason why it suffices, and the {@link dev.couplet.lower.Ledger}
 * that says where each coefficient came from.
 *
 * <p>One step a file, in the order of the work: {@code Coding} allots bits to decisions by {@code
 * ChoiceEncoding} and {@code CountEncoding}, {@code BitTable} numbers all, {@code Limits} tightens
 * a rule, {@code RequiredRule} and {@code PreferredRule} choose its penalty from the forms ({@code
 * TwoBitForm}, {@code ConflictForm}, {@code ClauseForm}, on request {@code UnbalancedForm}, {@code
 * SquareForm} with {@code Slack}), {@code RangeBound} or {@code IncumbentBound} or {@code
 * RepairBound} weighs it, {@code DegreeReduction} brings every term to degree 2, {@code Assembly}
 * adds all up.
 *
 * <p>{@code DegreeReduction} compares {@code ReductionDraft}s: each product by a {@code
 * ProductForm} of its own ({@code ConjunctionForm}, {@code ThresholdForm}, {@code CountForm}), or
 * with {@code SharedPairs}, each bit held to its product by a {@code Tie}.
 *
 * <p>Every penalty is zero, for the best values of its auxiliary bits, where its rule is kept, and
 * at least 1 under every plan that breaks it: so a weight above the objective's whole range
 * suffices, as long as no penalty is below 0 anywhere. Penalties over bits never are. A penalty
 * written over options whose code is not one bit an option ({@code RequiredRule}) can be where the
 * code is broken, and only there. Let w be the weight of such a rule and -b the lowest that its
 * penalty can be; let the weight of each code whose bits it has be more than the objective's range
 * plus the sum of w b over all such rules. A pattern that breaks some codes gains at most w b by
 * each rule that has bits of one of them, and pays each code broken: so it lies above every plan.
 */
@NullMarked
package dev.couplet.lower;

import org.jspecify.annotations.NullMarked;
