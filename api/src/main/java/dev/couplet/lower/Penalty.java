package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/**
 * What a rule becomes: a polynomial over bits that, minimised over the auxiliary bits, is zero
 * where the rule is kept and at least 1 where it is not.
 *
 * @param terms the polynomial, not yet multiplied by its weight
 * @param form how it was made, in words
 */
record Penalty(Polynomial terms, String form) {
  /** The penalty of all of them: 0 where each is, 1 or more where one is. */
  static Penalty sum(List<Penalty> penalties, int size) {
    if (penalties.size() == 1) {
      return penalties.get(0);
    }
    Polynomial.Builder sum = Polynomial.builder(size);
    penalties.forEach(penalty -> sum.add(penalty.terms(), 1));
    return new Penalty(sum.build(), words(penalties.stream().map(Penalty::form).toList()));
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
