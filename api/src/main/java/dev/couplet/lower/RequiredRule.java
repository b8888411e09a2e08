package dev.couplet.lower;

import dev.couplet.model.Rule;
import java.util.List;
import java.util.Optional;

/** Chooses the penalties of a required rule's parts: the forms with fewest auxiliary bits first. */
final class RequiredRule {
  private RequiredRule() {}

  /** The penalties of the parts that some plan breaks, in their order. */
  static List<Penalty> penalties(Rule rule, Coding coding, BitTable bits, Aim aim) {
    return rule.parts().stream()
        .filter(part -> !part.alwaysKept())
        .map(part -> penalty(Limits.tightened(part, coding), rule.name(), bits, aim))
        .toList();
  }

  private static Penalty penalty(Limits limits, String rule, BitTable bits, Aim aim) {
    Optional<Penalty> exact =
        TwoBitForm.of(limits, bits.size())
            .or(() -> ConflictForm.of(limits, bits.size()))
            .or(() -> ClauseForm.of(limits, rule, bits, aim));
    return exact.orElseGet(() -> SquareForm.of(limits, rule, bits));
  }
}
