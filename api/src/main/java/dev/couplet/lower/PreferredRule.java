package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Rule;
import dev.couplet.model.Rule.Part;
import java.util.Optional;

/**
 * What a preferred rule becomes: a cost that, minimised over the auxiliary bits, is exactly the
 * amount by which the rule is missed; and, where that takes auxiliary bits, a penalty that ties
 * them to the terms.
 *
 * <p>With a miss counted in auxiliary bits, the penalty is the square of the remaining difference
 * r. Counting one unit more costs one unit of cost and lowers |r| by 1, so that a weight of at
 * least the cost of a unit makes counting in full the best: w r^2 + (amount - |r|) c is at least
 * amount c for whole r.
 *
 * @param cost the amount of the miss in whole units
 * @param tie the penalty that ties auxiliary bits to the terms, if there are any
 * @param form how it was made, in words
 */
record PreferredRule(Polynomial cost, Optional<Polynomial> tie, String form) {
  /** The part of a rule; its cost is the amount, or the square of the amount. */
  static PreferredRule of(Part part, Rule rule, Coding coding, BitTable bits, Aim aim) {
    Limits limits = Limits.exact(part, coding);
    Optional<Penalty> clause = ClauseForm.of(limits, rule.name(), bits, aim);
    if (clause.isPresent()) {
      double amount = ClauseForm.amount(limits);
      Polynomial cost = clause.get().terms().times(rule.squared() ? amount * amount : amount);
      return new PreferredRule(cost, Optional.empty(), clause.get().form());
    }
    return rule.squared() ? squared(limits, rule.name(), bits) : single(limits, rule.name(), bits);
  }

  /** At the best slack, the square of the remaining difference is the amount squared. */
  private static PreferredRule squared(Limits limits, String rule, BitTable bits) {
    Penalty square = SquareForm.of(limits, rule, bits);
    return new PreferredRule(square.terms(), Optional.empty(), "amount squared, " + square.form());
  }

  private static PreferredRule single(Limits limits, String rule, BitTable bits) {
    Optional<Penalty> twoBits = TwoBitForm.of(limits, bits.size());
    if (twoBits.isPresent()) {
      return new PreferredRule(twoBits.get().terms(), Optional.empty(), twoBits.get().form());
    }
    return linear(limits, bits.size()).orElseGet(() -> counted(limits, rule, bits));
  }

  /** Where no bit pattern over-fulfils the limit, the amount is the difference itself. */
  private static Optional<PreferredRule> linear(Limits limits, int size) {
    Polynomial.Builder amount = Polynomial.builder(size);
    if (!limits.hasLowest() && limits.highest() <= Terms.lowest(limits.terms())) {
      amount.add(limits.terms(), 1).add(-limits.highest());
    } else if (!limits.hasHighest() && limits.lowest() >= Terms.highest(limits.terms())) {
      amount.add(limits.terms(), -1).add(limits.lowest());
    } else {
      return Optional.empty();
    }
    return Optional.of(new PreferredRule(amount.build(), Optional.empty(), "the amount itself"));
  }

  private static PreferredRule counted(Limits limits, String rule, BitTable bits) {
    double low = limits.range().lowest();
    double high = limits.range().highest();
    double step = limits.step();
    double between = Math.floor(step / 2);
    double room = Math.ceil(room(limits, low, high) / step);
    double mostOver = limits.hasHighest() ? Math.max(between, high - limits.highest()) : 0;
    double mostUnder = limits.hasLowest() ? Math.max(between, limits.lowest() - low) : 0;
    Slack slack = Slack.upTo(room, "the slack of '" + rule + "'", bits);
    Slack over = Slack.upTo(mostOver, "the excess over '" + rule + "'", bits);
    Slack under = Slack.upTo(mostUnder, "the shortage of '" + rule + "'", bits);
    boolean fromAbove = limits.hasHighest();
    double limit = fromAbove ? limits.highest() : limits.lowest();
    Polynomial.Builder difference = SquareForm.difference(limits.terms(), bits.size());
    difference.add(-limit);
    slack.addTo(difference, fromAbove ? step : -step);
    over.addTo(difference, -1);
    under.addTo(difference, 1);
    Polynomial.Builder amount = Polynomial.builder(bits.size());
    over.addTo(amount, 1);
    under.addTo(amount, 1);
    bits.completeWith(
        values -> {
          double value = Terms.value(limits.terms(), values);
          double wanted = Math.rint((fromAbove ? limit - value : value - limit) / step);
          double steps = Math.max(0, Math.min(room, wanted));
          slack.set(steps, values);
          double beyond = value - (fromAbove ? limit - steps * step : limit + steps * step);
          over.set(beyond, values);
          under.set(-beyond, values);
        });
    int used = slack.bits() + over.bits() + under.bits();
    return new PreferredRule(
        amount.build(),
        Optional.of(SquareForm.squared(difference)),
        "amount counted in " + used + " bits");
  }

  /**
   * How far the terms can lie inside the limits. In steps it is rounded up: the value that is
   * nearest to the end of the range may lie beyond it.
   */
  private static double room(Limits limits, double low, double high) {
    if (limits.hasHighest()) {
      return limits.highest() - Math.max(low, limits.lowest());
    }
    return high - limits.lowest();
  }
}
