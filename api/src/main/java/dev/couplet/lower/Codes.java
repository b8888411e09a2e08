package dev.couplet.lower;

import dev.couplet.model.Choice;
import dev.couplet.model.Count;
import dev.couplet.model.Decision;
import dev.couplet.model.Statement;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * Which decision takes which code: one for all of a kind, and others set by hand for single ones.
 */
record Codes(
    ChoiceEncoding choices,
    CountEncoding counts,
    Map<Decision, ChoiceEncoding> choicesByHand,
    Map<Decision, CountEncoding> countsByHand) {
  static final Codes STANDARD =
      new Codes(ChoiceEncoding.oneHot(), CountEncoding.binary(), Map.of(), Map.of());

  Codes with(ChoiceEncoding newChoices) {
    return new Codes(newChoices, counts, choicesByHand, countsByHand);
  }

  Codes with(CountEncoding newCounts) {
    return new Codes(choices, newCounts, choicesByHand, countsByHand);
  }

  Codes with(Choice<?> choice, ChoiceEncoding encoding) {
    return new Codes(choices, counts, more(choicesByHand, choice, encoding), countsByHand);
  }

  Codes with(Count count, CountEncoding encoding) {
    return new Codes(choices, counts, choicesByHand, more(countsByHand, count, encoding));
  }

  private static <E> Map<Decision, E> more(Map<Decision, E> known, Decision decision, E encoding) {
    Map<Decision, E> more = new LinkedHashMap<>(known);
    more.put(decision, encoding);
    return Collections.unmodifiableMap(more);
  }

  /** The code of one of the groups of a decision. */
  ChoiceEncoding of(Decision decision) {
    ChoiceEncoding standard = decision instanceof Choice ? choices : ChoiceEncoding.oneHot();
    return choicesByHand.getOrDefault(decision, standard);
  }

  CountEncoding of(Count count) {
    return countsByHand.getOrDefault(count, counts);
  }

  /** Insists that what is set by hand belongs to the statement. */
  void requireKnown(Statement statement) {
    choicesByHand.keySet().forEach(statement::require);
    countsByHand.keySet().forEach(statement::require);
  }
}
