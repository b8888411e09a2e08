package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.Optional;

/**
 * An approximate penalty of an inequality, without a slack: {@code square h^2 - linear h} with h
 * how far the terms lie within the limit, the second order of an exponential that falls with h.
 *
 * <p>It is steep where the inequality is broken (h &lt; 0), but neither zero nor the same where it
 * is kept: lowest at {@code h = linear / (2 square)}. So the energy of a feasible plan is not its
 * value, and the lowest energy may belong to another plan than the best, or to none.
 *
 * <p>Source: A. Montanez-Barrera, D. Willsch, A. Maldonado-Romo and K. Michielsen, "Unbalanced
 * penalization: a new approach to encode inequality constraints of combinatorial problems for
 * quantum optimization algorithms" (2022); the two factors are tuned for the problem at hand.
 *
 * @param linear what a unit of h wins, positive
 * @param square what a unit of the square of h costs, positive
 */
record UnbalancedForm(double linear, double square) {
  /** The penalty, already in the units of the form; nothing for an equality or two limits. */
  Optional<Penalty> of(Limits limits, int size) {
    if (limits.hasLowest() == limits.hasHighest()) {
      return Optional.empty();
    }
    double sign = limits.hasLowest() ? 1 : -1;
    double limit = limits.hasLowest() ? limits.lowest() : limits.highest();
    Polynomial.Builder within = Polynomial.builder(size);
    Polynomial h = within.add(limits.terms(), sign).add(-sign * limit).build();
    Polynomial terms = Polynomial.builder(size).add(h.times(h), square).add(h, -linear).build();
    String form =
        "approximate, "
            + Weights.shown(square)
            + " h^2 - "
            + Weights.shown(linear)
            + " h for h left to the limit";
    return Optional.of(new Penalty(terms, 0, form, true));
  }
}
