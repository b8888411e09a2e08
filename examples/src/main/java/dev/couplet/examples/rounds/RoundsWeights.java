package dev.couplet.examples.rounds;

import dev.couplet.lower.Lowering;
import dev.couplet.lower.Weights;
import java.util.Optional;

/**
 * How heavy the rules weigh: each as much as the range bound asks for, and all but the loads more,
 * so that draws keep them.
 *
 * <p>A load's penalty is a square: one village that is too much may count the square of its crates.
 * A village without a van counts 1. Were both weighed alike, leaving villages out would be the
 * cheap way to bring loads in order, and draws would end there. So everything but loads weighs as
 * much more as the largest village can count in a load; more than enough is still enough.
 */
final class RoundsWeights implements Weights {
  private final RoundsModel rounds;
  private final Weights enough = Weights.rangeBound();
  private final double times;

  private RoundsWeights(RoundsModel rounds) {
    this.rounds = rounds;
    double most = rounds.data().villages().stream().mapToInt(Village::crates).max().orElse(1);
    this.times = Math.max(1, most * most);
  }

  /** The standard lowering with these weights. */
  static Lowering lowering(RoundsModel rounds) {
    return Lowering.standard().with(new RoundsWeights(rounds));
  }

  @Override
  public Chosen choose(Facts facts) {
    Chosen chosen = enough.choose(facts);
    if (times == 1 || rounds.kindOf(facts.rule()).equals(Optional.of(RuleKind.LOAD))) {
      return chosen;
    }
    String reason =
        Numbers.shown(times)
            + " times a number "
            + chosen.reason()
            + "; so much the largest village counts in a load";
    return new Chosen(times * chosen.value(), reason);
  }
}
