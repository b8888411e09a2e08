package dev.couplet.lower;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.audit.RandomModels;
import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class RepairBoundTest {
  private static final Lowering BY_REPAIR = Lowering.standard().with(Weights.repairBound());

  private final Model model = Model.named("repair");

  private List<Bit> bits(int n) {
    return List.copyOf(model.bits("x", IntStream.range(0, n).boxed().toList()).decisions());
  }

  private static Expr weighted(List<Bit> x, double... factors) {
    return sum(IntStream.range(0, x.size()).mapToObj(k -> x.get(k).times(factors[k])).toList());
  }

  /** The weights by name, after an audit of every pattern. */
  private Map<String, Double> audited() {
    Lowered lowered = BY_REPAIR.lower(model);
    LoweringAudit.exhaustive(lowered).orThrow();
    return lowered.weights().stream()
        .collect(Collectors.toMap(Lowered.Weight::rule, Lowered.Weight::value));
  }

  /** Leaving out the dearest item repairs any load; the range is the sum of all. */
  @Test
  void aKnapsackWeighsItsDearestItem() {
    List<Bit> x = bits(6);
    model.maximize("worth", weighted(x, 4, 5, 3, 8, 5, 1));
    model.require("load", weighted(x, 3, 5, 2, 7, 4, 1).atMost(11));
    model.require("few", sum(x).atMost(4));
    assertEquals(Map.of("load", 9.0, "few", 9.0), audited());
  }

  /** Pairs may win more or less: the least that an item can be worth beside others counts. */
  @Test
  void pairsOfTheObjectiveAreTakenAtTheirWorst() {
    List<Bit> x = bits(5);
    Expr pairs = sum(x.get(0).times(x.get(1)).times(4), x.get(1).times(x.get(2)).times(-7));
    model.maximize("worth", weighted(x, 4, 5, 3, 8, 5).plus(pairs));
    model.require("load", weighted(x, 3, 5, 2, 7, 4).atMost(11));
    assertEquals(Map.of("load", 10.0), audited(), "above 5 + 4 for x 1");
  }

  @Test
  void aCoverWeighsItsDearestSet() {
    List<Bit> x = bits(6);
    model.minimize("cost", weighted(x, 4, 5, 3, 8, 5, 1));
    model.require("a", sum(x.subList(0, 4)).atLeast(1));
    model.require("b", sum(x.subList(2, 6)).atLeast(2));
    assertEquals(Map.of("a", 9.0, "b", 9.0), audited());
  }

  /** A bit that one rule wants set and another cleared repairs neither. */
  @Test
  void whatAnotherRuleHoldsBackWeighsByTheRange() {
    List<Bit> x = bits(5);
    model.maximize("worth", weighted(x, 4, 5, 3, 8, 5));
    model.require("load", weighted(x, 3, 5, 2, 7, 4).atMost(11));
    model.require("some", sum(x.subList(1, 4)).atLeast(1));
    assertEquals(Map.of("load", 26.0, "some", 26.0), audited());
    assertTrue(BY_REPAIR.lower(model).weights().get(0).reason().contains("no repair by one bit"));
  }

  /** Codes of choices: a free option repairs "none", leaving one out repairs "several". */
  @Test
  void codesOfChoicesThatAreFree() {
    List<String> vans = List.of("small", "large", "none");
    Choice<String> first = model.choice("first", vans);
    Choice<String> second = model.choice("second", vans);
    Choice<String> third = model.choice("third", vans);
    model.maximize(
        "worth",
        sum(
            first.is("small").times(6),
            first.is("large").times(9),
            second.is("small").times(5),
            second.is("small").times(first.is("small")).times(2),
            third.is("small").times(20)));
    model.prefer("wish", second.is("none").isTrue(), 3);
    model.require(
        "room", sum(first.is("large"), second.is("large").times(2), third.is("large")).atMost(2));
    model.require("both", third.is("small").equalTo(second.is("small")));
    Map<String, Double> weights = audited();
    assertEquals(10, weights.get("one option of 'first'"), "above the 9 of 'large'");
    double range = Lowering.standard().lower(model).weights().get(1).value();
    assertEquals(range, weights.get("one option of 'second'"), "'both' holds 'small' back");
  }

  /** Random models of every regime, each audited on all patterns. */
  @ParameterizedTest
  @EnumSource(Regime.class)
  void randomModelsPassTheAudit(Regime regime) {
    for (long seed = 1000; seed < 1080; seed++) {
      Model random = RandomModels.of(regime, seed);
      Lowered lowered = BY_REPAIR.lower(random);
      LoweringAudit.exhaustive(lowered).orThrow();
      List<Lowered.Weight> byRange = Lowering.standard().lower(random).weights();
      for (int k = 0; k < byRange.size(); k++) {
        assertTrue(lowered.weights().get(k).value() <= byRange.get(k).value());
      }
    }
  }
}
