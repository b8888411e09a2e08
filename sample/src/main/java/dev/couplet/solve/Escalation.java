package dev.couplet.solve;

import dev.couplet.lower.Weights;
import dev.couplet.lower.Weights.Chosen;
import dev.couplet.model.Plan;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import dev.couplet.model.Unmet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Weights that begin at a share of what is proved to suffice, and are raised rule by rule where a
 * lowest draw shows that they were too light: light weights leave the objective to be felt.
 *
 * <p>Belongs to one run. Common practice.
 */
final class Escalation {
  private static final double FIRST = 0.125;
  private static final double STEP = 4;
  private static final int MOST_ROUNDS = 4;

  private final Map<String, Double> shares = new LinkedHashMap<>();
  private int rounds;

  /** Light weights for the required rules of a statement; codes weigh what they must. */
  Escalation(Statement statement) {
    statement.rules().stream()
        .filter(Rule::required)
        .forEach(rule -> shares.put(rule.name(), FIRST));
  }

  /** The weights as they stand, of what a known plan, or the range of the objective, calls for. */
  Weights weights(Optional<Plan> known) {
    Weights enough =
        known.filter(Plan::feasible).map(Weights::incumbentBound).orElseGet(Weights::rangeBound);
    Map<String, Double> now = Map.copyOf(shares);
    return facts -> lighter(enough.choose(facts), now.getOrDefault(facts.rule(), 1.0));
  }

  private static Chosen lighter(Chosen enough, double share) {
    double value = enough.value();
    if (share >= 1) {
      return enough;
    }
    boolean whole = value == Math.rint(value);
    double lighter = whole ? Math.max(1, Math.ceil(value * share)) : value * share;
    return new Chosen(lighter, "light at first, not proved to suffice");
  }

  /** Whether every weight is one that is proved to suffice. */
  boolean exhausted() {
    return shares.values().stream().allMatch(share -> share >= 1);
  }

  /**
   * Raises the weights of the required rules that a lowest draw breaks; in the end those of all.
   *
   * @return the rules; none if the draw keeps all, or none of those it breaks is light
   */
  List<String> raise(Plan lowest) {
    List<String> light =
        lowest.unmet().stream()
            .filter(Unmet::required)
            .map(Unmet::rule)
            .filter(rule -> shares.getOrDefault(rule, 1.0) < 1)
            .toList();
    light.forEach(rule -> shares.merge(rule, STEP, (share, step) -> Math.min(1, share * step)));
    if (++rounds == MOST_ROUNDS) {
      shares.replaceAll((rule, share) -> 1.0);
    }
    return light;
  }
}
