package dev.couplet.lower;

import static dev.couplet.model.Expr.constant;
import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTimeout;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.Findings.Finding;
import dev.couplet.audit.LoweringAudit;
import dev.couplet.audit.RandomModels;
import dev.couplet.audit.RandomModels.Regime;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.lower.Ledger.Entry;
import dev.couplet.lower.Ledger.Kind;
import dev.couplet.lower.Lowered.Weight;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.End;
import java.time.Duration;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class LoweringTest {
  private final Model model = Model.named("rounds");

  private static void refused(Executable call, String... words) {
    IllegalArgumentException refusal = assertThrows(IllegalArgumentException.class, call);
    for (String word : words) {
      assertTrue(refusal.getMessage().contains(word), refusal.getMessage());
    }
  }

  private List<Bit> bits(int count) {
    return List.copyOf(model.bits("x", IntStream.range(0, count).boxed().toList()).decisions());
  }

  @ParameterizedTest
  @EnumSource(Regime.class)
  void everyCoefficientIsTheSumOfItsLedgerEntries(Regime regime) {
    for (long seed = 0; seed < 40; seed++) {
      Lowered lowered = Lowering.standard().lower(RandomModels.of(regime, seed));
      Qubo qubo = lowered.qubo();
      Ledger ledger = lowered.ledger();
      assertEquals(qubo.size(), ledger.bits());
      assertEquals(qubo.constant(), added(ledger.constant()));
      for (int i = 0; i < qubo.size(); i++) {
        assertEquals(qubo.linear(i), added(ledger.linear(i)));
        assertFalse(ledger.meaning(i).isBlank());
        for (int j = 0; j < i; j++) {
          assertEquals(qubo.pair(i, j), added(ledger.pair(i, j)));
        }
      }
    }
  }

  private static double added(List<Entry> entries) {
    double sum = 0;
    for (Entry entry : entries) {
      sum += entry.amount();
    }
    return sum;
  }

  @Test
  void theLedgerNamesItsSources() {
    List<Bit> x = bits(3);
    Choice<String> van = model.choice("van", List.of("small", "large"));
    model.minimize("distance", x.get(0).times(5));
    model.require("one", sum(x).exactly(1));
    model.prefer("small", van.is("small").isTrue(), 2);
    Ledger ledger = Lowering.standard().lower(model).ledger();
    // Range of the objective: 0 at the least, 5 + 2 at the most; weights 8.
    assertEquals(
        List.of(new Entry("distance", Kind.OBJECTIVE, 5), new Entry("one", Kind.PENALTY, -8)),
        ledger.linear(0));
    assertEquals(
        List.of(new Entry("one option of 'van'", Kind.CODE, -8), new Entry("small", Kind.COST, -2)),
        ledger.linear(3));
    assertEquals(List.of(new Entry("one", Kind.PENALTY, 16)), ledger.pair(0, 1));
    assertEquals(List.of(), ledger.pair(0, 3));
    assertEquals("van = small", ledger.meaning(3));
    refused(() -> ledger.linear(5), "bit 5", "5 bits");
    refused(() -> ledger.pair(1, 1), "pair (1, 1)", "twice");
  }

  @ParameterizedTest
  @EnumSource(Regime.class)
  void theSameModelGivesTheSameBits(Regime regime) {
    for (long seed = 0; seed < 20; seed++) {
      Lowered first = Lowering.standard().lower(RandomModels.of(regime, seed));
      Lowered second = Lowering.standard().lower(RandomModels.of(regime, seed));
      assertEquals(first.qubo(), second.qubo());
      assertEquals(first.weights(), second.weights());
      for (int bit = 0; bit < first.qubo().size(); bit++) {
        assertEquals(first.ledger().meaning(bit), second.ledger().meaning(bit));
      }
    }
  }

  @Test
  void theRangeBoundSaysWhyItSuffices() {
    List<Bit> x = bits(3);
    model.maximize("gain", x.get(0).times(3).minus(x.get(1).times(4)).plus(10));
    model.require("two", sum(x).exactly(2));
    Weight weight = Lowering.standard().lower(model).weights().get(0);
    assertEquals(8, weight.value(), "the next whole number above 3 + 4");
    assertEquals(
        "above 7, all that the objective can win: -13 at the least, -6 at the most",
        weight.reason());
    Weight byHand = Lowering.standard().weight("two", 2.5).lower(model).weights().get(0);
    assertEquals(2.5, byHand.value());
    assertEquals("set by hand, not proved to suffice", byHand.reason());
  }

  @Test
  void decimalObjectivesGetWeightsThatRoundingDoesNotReach() {
    for (double width : new double[] {0.1, 1.3, 1.9999999, 2, 77.7, 1e-9, 1e12}) {
      double weight = RangeBound.above(width, false);
      assertTrue(weight > width * (1 + 0x1p-10), weight + " for " + width);
      assertTrue(weight < width * (1 + 0x1p-6), weight + " for " + width);
    }
    assertEquals(1, RangeBound.above(0, false));
    List<Bit> x = bits(2);
    model.minimize("constant", constant(-5.17));
    model.require("r", x.get(0).implies(x.get(1)));
    assertTrue(Lowering.standard().lower(model).weights().get(0).value() > 1e-9);
  }

  @Test
  void weightsByHandAreForRulesThatHaveOne() {
    List<Bit> x = bits(3);
    model.choice("van", List.of(1, 2));
    model.require("r", sum(x).exactly(1));
    model.prefer("w", sum(x).exactly(2), 1);
    refused(() -> Lowering.standard().weight("s", 2).lower(model), "rule 's'", "'rounds'");
    refused(() -> Lowering.standard().weight("w", 2).lower(model), "rule 'w'", "preferred");
    refused(() -> Lowering.standard().weight("r", 0), "rule 'r'", "0");
    refused(() -> Lowering.standard().weight("r", Double.NaN), "rule 'r'", "NaN");
    refused(() -> Weights.fixed(-1), "-1");
    refused(() -> Weights.fixed(Double.POSITIVE_INFINITY), "Infinity");
    Lowering broken = Lowering.standard().with(facts -> new Weights.Chosen(Double.NaN, "none"));
    refused(() -> broken.lower(model), "NaN", "'r'");
    Lowered code = Lowering.standard().weight("one option of 'van'", 77).lower(model);
    assertEquals(77, code.weights().get(0).value());
  }

  @Test
  void aFormTooLargeForExactEnergiesNamesItsHeaviestPart() {
    List<Bit> x = bits(3);
    model.minimize("cost", x.get(0).times(1e6));
    model.require("small", sum(x).exactly(1));
    model.require("heavy", sum(x, bit -> bit.times(30011)).plus(x.get(0)).exactly(30011));
    refused(() -> Lowering.standard().lower(model), "heaviest part is 'heavy'", "2^51");
    assertTrue(Lowering.standard().with(Weights.fixed(10)).lower(model).qubo().exact());
  }

  @Test
  void penaltiesTooLargeToBeWholeAreRefusedWhateverTheObjective() {
    List<Bit> x = bits(3);
    model.minimize("cost", x.get(0).times(0.1));
    double unit = 0x1p26 + 1;
    model.require("heavy", sum(x, bit -> bit.times(unit)).plus(x.get(0)).exactly(unit));
    refused(() -> Lowering.standard().with(Weights.fixed(0.3)).lower(model), "'heavy'", "2^51");
  }

  @Test
  void objectivesThatRoundingWouldEatUpAreRefused() {
    List<Bit> x = bits(3);
    model.minimize("cost", x.get(0).times(0.1));
    model.require("heavy", sum(x, bit -> bit.times(1e6 + 1)).plus(x.get(0)).exactly(1e6 + 1));
    refused(() -> Lowering.standard().lower(model), "'heavy'", "rounding");
  }

  @Test
  void maximisationTurnsTheSignOfEnergiesOnly() {
    List<Bit> x = bits(2);
    model.maximize("gain", x.get(0).times(3).plus(x.get(1)));
    model.prefer("not both", x.get(0).plus(x.get(1)).atMost(1), 0.5);
    Lowered lowered = Lowering.standard().lower(model);
    State both = State.parse("11");
    assertEquals(3.5, lowered.plan(both).value());
    assertEquals(-3.5, lowered.qubo().value(both));
    assertEquals(3.5, lowered.valueOf(-3.5));
    assertEquals(-3.5, lowered.energyOf(3.5));
    assertEquals("0.0", String.valueOf(lowered.valueOf(0)), "no negative zero");
  }

  @Test
  void modelsWithNextToNothing() {
    Lowered empty = Lowering.standard().lower(model);
    assertEquals(0, empty.qubo().size());
    assertEquals(0, empty.qubo().constant());
    assertTrue(empty.plan(State.zeros(0)).feasible());
    model.minimize("constant", constant(4));
    assertEquals(4, Lowering.standard().lower(model).qubo().constant());
    model.bit("b");
    model.choice("c", List.of("only"));
    Lowered decisions = Lowering.standard().lower(model);
    assertEquals(2, decisions.decisionBits());
    assertEquals(0, decisions.auxiliaryBits());
    assertEquals(4, decisions.qubo().value(State.parse("01")));
    assertEquals(5, decisions.qubo().value(State.parse("00")), "no option");
  }

  @Test
  void drawsAreReadBestFirstAndOnce() {
    List<Bit> x = bits(3);
    model.maximize("gain", sum(x));
    model.require("not all", sum(x).atMost(2));
    Lowered lowered = Lowering.standard().lower(model);
    assertEquals(1, lowered.auxiliaryBits());
    List<State> states =
        List.of(State.parse("1110"), State.parse("1000"), State.parse("1100"), State.parse("1101"));
    Plans plans = lowered.read(Draws.of(lowered.qubo(), states, End.DONE, 1));
    assertEquals(3, plans.all().size(), "states that differ in auxiliary bits are one plan");
    assertEquals(List.of(2.0, 1.0, 3.0), plans.all().stream().map(Plan::value).toList());
    assertEquals(2, plans.feasible().size());
    assertTrue(plans.best().value(x.get(0)) && plans.best().value(x.get(1)));
  }

  @Test
  void statesAndPlansOfOtherFormsAreRefused() {
    List<Bit> x = bits(2);
    Lowered lowered = Lowering.standard().lower(model);
    refused(() -> lowered.plan(State.zeros(3)), "3 bits", "2");
    Model other = Model.named("other");
    other.bits("x", List.of(0, 1));
    Plan foreign = other.snapshot().plan(State.zeros(2));
    refused(() -> lowered.complete(foreign), "other", "rounds");
    Plan before = model.snapshot().plan(State.zeros(2));
    model.bit("late");
    refused(() -> Lowering.standard().lower(model).complete(before), "2 decisions", "3 decisions");
    assertEquals(State.zeros(2), lowered.complete(before));
    assertEquals(2, x.size());
  }

  /** A coefficient changed by hand: the audit tells which plan is off, and that the ledger is. */
  @Test
  void aChangedCoefficientIsFoundByTheAudit() {
    List<Bit> x = bits(3);
    model.minimize("cost", sum(x, bit -> bit.times(2)));
    model.require("one", sum(x).exactly(1));
    Lowered faithful = Lowering.standard().lower(model);
    LoweringAudit.exhaustive(faithful).orThrow();
    for (double change : new double[] {1, -1}) {
      Qubo.Builder changed = Qubo.builder(3).addConstant(faithful.qubo().constant());
      for (int i = 0; i < 3; i++) {
        changed.addLinear(i, faithful.qubo().linear(i) + (i == 1 ? change : 0));
      }
      faithful.qubo().forEachPair(changed::addPair);
      Coding coding = new Coding(faithful.statement(), Lowering.standard());
      Lowered sabotaged =
          new Lowered(
              faithful.statement(),
              changed.build(),
              coding,
              new BitTable(coding),
              faithful.ledger(),
              faithful.weights(),
              faithful.approximate(),
              faithful.structure());
      LoweringAudit.Report report = LoweringAudit.exhaustive(sabotaged);
      List<String> checks = report.findings().all().stream().map(Finding::check).toList();
      assertTrue(checks.contains("ledger"), checks.toString());
      assertTrue(checks.contains("value"), checks.toString());
      String message = report.findings().toString();
      assertTrue(message.contains("bit x 1"), message);
      assertTrue(message.contains("x 0 = false, x 1 = true, x 2 = false"), message);
    }
  }

  /** Rules over few of many bits: the time must not go with bits times rules. */
  @Test
  void manySmallRulesOverManyBits() {
    int n = 100_000;
    assertTimeout(
        Duration.ofSeconds(30),
        () -> {
          List<Bit> x = bits(n);
          for (int i = 1; i < n; i++) {
            model.require("rule " + i, x.get(i - 1).implies(x.get(i)));
          }
          model.minimize("cost", sum(x));
          Lowered lowered = Lowering.standard().lower(model);
          assertEquals(n - 1, lowered.qubo().pairs());
        });
  }
}
