package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/**
 * What a rule becomes: a polynomial over bits that, minimised over the auxiliary bits, is zero
 * where the rule is kept and at least 1 where it is not, wherever the bits stand for a plan.
 *
 * @param terms the polynomial, not yet multiplied by its weight
 * @param lowest a bound from below over all bit patterns: 0, or less where the penalty goes below 0
 *     on patterns that break a code of which it has bits
 * @param form how it was made, in words
 * @param approximate whether it is no penalty in that sense but an {@link UnbalancedForm}
 */
record Penalty(Polynomial terms, double lowest, String form, boolean approximate) {
  Penalty(Polynomial terms, double lowest, String form) {
    this(terms, lowest, form, false);
  }

  /** A penalty that is nowhere below 0. */
  Penalty(Polynomial terms, String form) {
    this(terms, 0, form);
  }

  /** The penalty of all of them: 0 where each is, 1 or more where one is. */
  static Penalty sum(List<Penalty> penalties, int size) {
    if (penalties.size() == 1) {
      return penalties.get(0);
    }
    Polynomial.Builder sum = Polynomial.builder(size);
    Polynomial.Builder below = Polynomial.builder(size);
    for (Penalty penalty : penalties) {
      sum.add(penalty.terms(), 1);
      if (penalty.lowest() < 0) {
        below.add(penalty.terms(), 1);
      }
    }
    double lowest = Math.min(0, Terms.lowest(below.build()));
    String form = words(penalties.stream().map(Penalty::form).toList());
    return new Penalty(sum.build(), lowest, form);
  }

  /** The forms of a rule's parts in words; equal ones are counted. */
  static String words(List<String> forms) {
    Map<String, Integer> counts = new LinkedHashMap<>();
    forms.forEach(form -> counts.merge(form, 1, Integer::sum));
    return counts.entrySet().stream()
        .map(one -> one.getValue() == 1 ? one.getKey() : one.getValue() + " x " + one.getKey())
        .collect(Collectors.joining("; "));
  }
}
