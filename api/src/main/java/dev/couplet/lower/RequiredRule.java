package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Rule;
import java.util.List;
import java.util.Optional;

/**
 * Chooses the penalties of a required rule's parts: the forms with fewest auxiliary bits first; of
 * those without any, forms over bits before those over literals.
 *
 * <p>A form over literals is written over bits with the polynomials of its literals in their place:
 * {@code (u1 - u2) (v2 - v3)} for two options of domain walls that exclude each other. Where the
 * bits stand for a plan, literals are 0 or 1 and the form is worth what it is worth over literals.
 * Where they break a code a literal may be -1, and the form below 0: the weights of the codes make
 * up for that.
 */
final class RequiredRule {
  private RequiredRule() {}

  /** The penalties of the parts that some plan breaks, in their order. */
  static List<Penalty> penalties(Rule rule, Coding coding, BitTable bits, Lowering settings) {
    Optional<UnbalancedForm> approximate =
        rule.parts().size() == 1 ? settings.unbalanced(rule.name()) : Optional.empty();
    return rule.parts().stream()
        .filter(part -> !part.alwaysKept())
        .map(part -> penalty(part, rule.name(), coding, bits, settings.aim(), approximate))
        .toList();
  }

  private static Penalty penalty(
      Rule.Part part,
      String rule,
      Coding coding,
      BitTable bits,
      Aim aim,
      Optional<UnbalancedForm> approximate) {
    Limits limits = Limits.tightened(part, coding);
    Optional<Penalty> exact =
        exact(limits, bits.size())
            .or(() -> overLiterals(part, coding, bits.size()))
            .or(() -> ClauseForm.of(limits, rule, bits, aim))
            .or(() -> approximate.flatMap(form -> form.of(limits, bits.size())));
    return exact.orElseGet(() -> SquareForm.of(limits, rule, bits));
  }

  private static Optional<Penalty> exact(Limits limits, int size) {
    return TwoBitForm.of(limits, size).or(() -> ConflictForm.of(limits, size));
  }

  /**
   * Of degree 2, where some literals are no bits; not over digits, whose patterns such a form tells
   * apart and not only their number.
   */
  private static Optional<Penalty> overLiterals(Rule.Part part, Coding coding, int size) {
    if (coding.ofBits(part.terms()) || coding.hasDigits(part.terms())) {
      return Optional.empty();
    }
    return exact(Limits.overLiterals(part), part.terms().size())
        .map(penalty -> overBits(penalty, coding, size))
        .filter(penalty -> penalty.terms().degree() <= 2);
  }

  private static Penalty overBits(Penalty penalty, Coding coding, int size) {
    Polynomial terms = coding.overBits(penalty.terms());
    double lowest = Math.min(0, Terms.lowest(terms));
    return new Penalty(terms.inVariables(size), lowest, penalty.form() + ", over literals");
  }
}
