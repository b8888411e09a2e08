package dev.couplet.lower;

import dev.couplet.model.Rule;
import java.util.Optional;

/** Chooses the penalty of a required rule: the forms without auxiliary bits first. */
final class RequiredRule {
  private RequiredRule() {}

  static Penalty penalty(Rule rule, BitTable bits) {
    Limits limits = Limits.tightened(rule);
    Optional<Penalty> exact =
        TwoBitForm.of(limits, bits.size()).or(() -> ConflictForm.of(limits, bits.size()));
    return exact.orElseGet(() -> SquareForm.of(limits, rule.name(), bits));
  }
}
