package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Rule;
import java.util.Arrays;
import java.util.List;

/**
 * A piece of what one rule adds to the form: terms that hang together by common bits, and the parts
 * of the rule that speak of the decisions among these.
 */
final class Share {
  private final Polynomial terms;
  private final List<Rule.Part> parts;
  private final int[] bits;
  private final int[] others;

  /**
   * A share.
   *
   * @param terms without the constant
   * @param parts of one rule
   * @param bits the decision bits that matter, ascending
   * @param others the auxiliary bits, ascending
   */
  Share(Polynomial terms, List<Rule.Part> parts, int[] bits, int[] others) {
    this.terms = terms;
    this.parts = List.copyOf(parts);
    this.bits = bits;
    this.others = others;
  }

  Polynomial terms() {
    return terms;
  }

  List<Rule.Part> parts() {
    return parts;
  }

  int[] bits() {
    return bits;
  }

  int[] others() {
    return others;
  }

  /** The terms over own numbers: {@code bits} first, then {@code others}. */
  Polynomial renumbered() {
    Polynomial.Builder own = Polynomial.builder(bits.length + others.length);
    terms.forEachTerm(
        (coefficient, variables) -> {
          for (int k = 0; k < variables.length; k++) {
            int at = Arrays.binarySearch(bits, variables[k]);
            variables[k] = at >= 0 ? at : bits.length + Arrays.binarySearch(others, variables[k]);
          }
          own.add(coefficient, variables);
        });
    return own.build();
  }
}
