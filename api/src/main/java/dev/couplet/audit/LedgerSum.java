package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import dev.couplet.form.Qubo;
import dev.couplet.lower.Ledger;
import dev.couplet.lower.Ledger.Source;
import dev.couplet.lower.Lowered;

/** Whether the sources of a ledger add up to the form; linear in their terms, but for sorting. */
final class LedgerSum {
  private LedgerSum() {}

  /** Notes where they do not; {@code true} if they do everywhere. */
  static boolean check(Lowered lowered, Notes notes) {
    Qubo form = lowered.qubo();
    Polynomial.Builder sum = Polynomial.builder(form.size());
    long additions = 1;
    for (Source source : lowered.ledger().sources()) {
      sum.add(source.terms(), source.factor());
      additions += source.terms().terms();
    }
    Polynomial added = sum.build();
    double error = form.exact() && added.whole() ? 0 : Math.ulp(form.magnitude()) * additions;
    Polynomial own = form.toPolynomial();
    Polynomial left = Polynomial.builder(form.size()).add(own, 1).add(added, -1).build();
    notes.expect("ledger", true, () -> "");
    boolean[] same = {true};
    left.forEachTerm(
        (coefficient, variables) -> {
          boolean holds = Math.abs(coefficient) <= error;
          same[0] &= holds;
          notes.expect(
              "ledger",
              holds,
              () ->
                  place(lowered.ledger(), variables)
                      + ": the form has "
                      + Numbers.shown(own.coefficient(variables))
                      + ", the ledger's entries add up to "
                      + Numbers.shown(added.coefficient(variables)));
        });
    return same[0];
  }

  private static String place(Ledger ledger, int[] variables) {
    return switch (variables.length) {
      case 0 -> "the constant";
      case 1 -> "bit " + ledger.meaning(variables[0]);
      default ->
          "the pair of " + ledger.meaning(variables[0]) + " and " + ledger.meaning(variables[1]);
    };
  }
}
