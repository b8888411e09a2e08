package dev.couplet.audit;

import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;

/**
 * A decision problem in plain numbers, from which a model is made ({@link SpecModel}) and which is
 * judged by itself ({@link SpecJudge}).
 *
 * @param options for each decision the number of its options; 0 stands for a bit
 */
record Spec(List<Integer> options, List<Limit> rules, List<Term> objective, boolean maximise) {
  /** A fact: the decision is this option (of a bit: 1), or its negation. */
  record Fact(int decision, int option, boolean negated) {}

  record Term(BigDecimal coefficient, List<Fact> facts) {}

  /** Terms between two limits; with a cost a preferred rule. */
  record Limit(
      String name,
      List<Term> terms,
      Optional<BigDecimal> lowest,
      Optional<BigDecimal> highest,
      Optional<BigDecimal> cost) {}
}
