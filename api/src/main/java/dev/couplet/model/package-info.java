/**
 * What a user writes: decisions, expressions over them, rules, an objective; and plans.
 *
 * <p>A {@link dev.couplet.model.Model} makes decisions ({@link dev.couplet.model.Bit}, {@link
 * dev.couplet.model.Spin}, {@link dev.couplet.model.Count}, {@link dev.couplet.model.Choice},
 * {@link dev.couplet.model.Order}, {@link dev.couplet.model.Subset}, and keyed {@link
 * dev.couplet.model.Family families} of them). Each decision offers {@link
 * dev.couplet.model.Literal literals}, facts that hold or not: a bit is set, a choice is this
 * option. {@link dev.couplet.model.Expr Expressions} add and multiply literals; comparing one gives
 * a {@link dev.couplet.model.Condition}, which has no effect until a model requires or prefers it
 * as a named {@link dev.couplet.model.Rule}. A {@link dev.couplet.model.Plan} holds a value for
 * every decision, and is checked against the model itself.
 *
 * <p>Literals combine to literals by and, or, xor and not ({@code Compound}); {@code Logic} finds
 * the lightest sums that say what they say, {@code Relaxed} limits that matter only where a literal
 * holds. {@code StrictOrder} makes one objective of several, {@code Extreme} counts of the largest
 * of some expressions; {@code Expansion} multiplies out, each part that {@code Sharing} finds again
 * once.
 *
 * <p>Rules are kept with integer coefficients (decimals are scaled exactly), so that whether a rule
 * is kept never depends on rounding. A {@link dev.couplet.model.Statement} is the immutable content
 * of a model at one moment; it is what is lowered, audited and solved.
 *
 * <p>{@link dev.couplet.model.PseudoBooleanText} reads models from and writes statements to the
 * text of the pseudo-Boolean competitions.
 *
 * <p>Why literals and not encoded bits: how a choice is folded into bits is decided later, by the
 * lowering, and can change without touching a model.
 */
@NullMarked
package dev.couplet.model;

import org.jspecify.annotations.NullMarked;
