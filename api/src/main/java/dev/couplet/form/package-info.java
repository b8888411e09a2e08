/**
 * Pure data: what a solver is given and what it gives back.
 *
 * <p>{@link dev.couplet.form.Qubo} is a quadratic form in 0/1 variables, {@link
 * dev.couplet.form.Ising} the same in ±1 variables, {@link dev.couplet.form.Polynomial} a
 * multilinear form of any degree, {@link dev.couplet.form.State} one assignment of values. {@link
 * dev.couplet.form.MatrixMarket} reads and writes forms as text; a malformed text is a {@link
 * dev.couplet.form.FormatException} with file, line and column.
 *
 * <p>Conventions, fixed for the whole library: everything is minimised; {@code s = 1 - 2x}, so that
 * x = 0 is s = +1; each pair stands once and multiplies its product once.
 *
 * <p>Energies of forms whose coefficients are integers are exact in double arithmetic, in any order
 * of summation: a form whose magnitudes add up to 2^51 or more is refused unless its builder was
 * told that rounding is acceptable. All types are immutable and safe to share between threads;
 * builders belong to one thread.
 */
@NullMarked
package dev.couplet.form;

import org.jspecify.annotations.NullMarked;
