/**
 * Making forms smaller without losing their minimum.
 *
 * <p>{@link dev.couplet.reduce.Reduction} removes bits that can be decided, or expressed by others,
 * and splits what is left into connected parts. {@link dev.couplet.reduce.Reduced} holds the parts,
 * leads their minima back to a minimum of the original, and reports which {@link
 * dev.couplet.reduce.Removal} removed how many bits.
 *
 * <p>On forms whose energies are exact every step is exact; on others each step adds what it
 * rounded to the result's slack.
 */
@CheckReturnValue
@NullMarked
package dev.couplet.reduce;

import dev.couplet.form.CheckReturnValue;
import org.jspecify.annotations.NullMarked;
