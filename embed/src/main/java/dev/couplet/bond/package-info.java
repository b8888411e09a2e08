/**
 * A form on a host: coefficients spread over branch sets, bonds that hold each set together, and
 * the way back from host spins to guest spins.
 *
 * <p>{@link dev.couplet.bond.HostedSampler} is a sampler like any other: it puts the form that it
 * is given onto the host of an embedding, lets another method sample there, and reads the draws
 * back. {@link dev.couplet.bond.HostedForm} is the form on the host, {@link
 * dev.couplet.bond.BondStrength} chooses how strong each bond is, {@link dev.couplet.bond.Readback}
 * settles branch sets whose members disagree, and {@link dev.couplet.bond.HostedDraws} says how
 * often they did.
 *
 * <p>Bonds lie on a spanning tree of each set. The certified strength of a bond that splits its set
 * in two is strictly above the lighter side's weight, the sum of the magnitudes of its fields and
 * of its couplings to other sets: then flipping that side whole only gains, and no minimum of the
 * host's form is torn.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.bond;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
