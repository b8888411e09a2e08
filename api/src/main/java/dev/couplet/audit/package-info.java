/**
 * Checks that a user calls from a unit test: plain Java, bound to no test framework.
 *
 * <p>{@link dev.couplet.audit.SamplerAudit} runs the contract of every {@link
 * dev.couplet.sampling.Sampler} over one of them, the library's own or a user's. {@link
 * dev.couplet.audit.LoweringAudit} proves of one lowered model that its form says what the model
 * says, and tells how much each weight could be lowered: its {@link
 * dev.couplet.audit.LoweringAudit.Report}. Of a model of any size it proves rule by rule what it
 * can: the {@link dev.couplet.audit.LoweringAudit.Certificate} ({@code RuleAudit} cuts the form by
 * its ledger, {@code RuleProver} proves one penalty, by {@code ShareTable}, {@code SquareShare} or
 * {@code SymmetricShare}). {@link dev.couplet.audit.RandomModels} draws small models for property
 * tests. What an audit found wrong are its {@link dev.couplet.audit.Findings}, each a {@link
 * dev.couplet.audit.Findings.Finding} with the name of the check and a message that says what
 * happened and how to mend it; {@code orThrow()} turns them into an {@link
 * java.lang.AssertionError}.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.audit;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
