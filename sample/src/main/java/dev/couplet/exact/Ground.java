package dev.couplet.exact;

import dev.couplet.form.State;

/**
 * The ground states of a form.
 *
 * @param energy the lowest energy
 * @param states how many states have it: exact below 2^53, beyond that to some 16 digits
 * @param state one of them
 */
public record Ground(double energy, double states, State state) {}
