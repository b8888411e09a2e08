package dev.couplet.lower;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Condition;
import dev.couplet.model.Literal;
import dev.couplet.model.Model;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What logic takes in the form: bits and weights, each audited in full. */
class LogicLoweredTest {
  private final Model model = Model.named("logic");

  private List<Bit> bits(int count) {
    List<Integer> keys = IntStream.range(0, count).boxed().toList();
    return List.copyOf(model.bits("x", keys).decisions());
  }

  private Lowered audited() {
    Lowered lowered = Lowering.standard().lower(model);
    LoweringAudit.exhaustive(lowered).orThrow();
    return lowered;
  }

  /** The sum is 1 + 2 s with s up to floor((n - 1) / 2): so many values, in binary. */
  @ParameterizedTest
  @ValueSource(ints = {2, 3, 4, 5, 6, 8, 9})
  void anOddNumberTakesABitForEachBinaryDigitOfHalfOfIt(int n) {
    List<Bit> x = bits(n);
    model.require("odd", Literal.oddOf(x).isTrue());
    model.minimize("ones", sum(x).times(1.5).plus(x.get(0).times(-4)));
    int most = (n - 1) / 2;
    assertEquals(32 - Integer.numberOfLeadingZeros(most), audited().auxiliaryBits());
    assertEquals(1L << (n - 1), LoweringAudit.exhaustive(audited()).feasible());
  }

  @ParameterizedTest
  @ValueSource(ints = {3, 4, 5, 7})
  void anOddNumberThatIsPreferredCostsOneUnitWhereItIsMissed(int n) {
    List<Bit> x = bits(n);
    model.prefer("odd", Literal.oddOf(x).isTrue(), 2.5);
    model.preferSquared("odd too", Literal.oddOf(x).not().isTrue(), 0.75);
    model.minimize("ones", sum(x).times(-1));
    LoweringAudit.Report report = LoweringAudit.exhaustive(audited());
    double odd = n % 2 == 1 ? 0.75 - n : Math.min(2.5 - n, 0.75 - n + 1);
    assertEquals(odd, report.optimum().orElseThrow());
  }

  @Test
  void squaredMissesCostTheirSquare() {
    List<Bit> x = bits(5);
    model.preferSquared("load", sum(x, bit -> bit.times(0.5)).between(0.5, 1), 8);
    model.preferSquared("exact", x.get(0).plus(x.get(1)).exactly(1), 3);
    model.maximize("gain", sum(x).times(0.25));
    audited();
    Plan5 all = new Plan5(model, x);
    assertEquals(1.25 - 8 * 2.25 - 3, all.value(5), "missed by 1.5 units, and by 1");
    assertEquals(-8 * 0.25 - 3, all.value(0), "missed by 0.5 on the other side");
    assertEquals(0.25, all.value(1));
  }

  /** So many of the bits, from the first on. */
  private record Plan5(Model model, List<Bit> bits) {
    double value(int ones) {
      var draft = model.plan();
      for (int k = 0; k < bits.size(); k++) {
        draft.set(bits.get(k), k < ones);
      }
      return draft.evaluate().value();
    }
  }

  @Test
  void implicationsOfManyTakePairsOnly() {
    List<Bit> x = bits(6);
    model.require("each", x.get(0).or(x.get(1)).implies(x.get(2).and(x.get(3))));
    model.require("all", x.get(4).and(x.get(5).not()).isTrue());
    Lowered lowered = audited();
    assertEquals(0, lowered.auxiliaryBits());
    assertEquals(4, lowered.qubo().pairs());
  }

  @Test
  void choicesThatAllDifferTakePairsOnly() {
    List<Choice<Integer>> choices =
        List.copyOf(model.choices("c", List.of(0, 1, 2), List.of(1, 2, 3, 4)).decisions());
    model.require("differ", Condition.allDifferent(choices));
    Lowered lowered = audited();
    assertEquals(0, lowered.auxiliaryBits());
    assertEquals(3 * 6 + 4 * 3, lowered.qubo().pairs());
    assertEquals(24, LoweringAudit.exhaustive(lowered).feasible(), "4 * 3 * 2");
  }

  @Test
  void aGuardTakesNoBitOfItsOwn() {
    List<Bit> x = bits(5);
    model.require("always", sum(x.subList(0, 4)).atMost(2));
    int without = audited().auxiliaryBits();
    Model guarded = Model.named("guarded");
    List<Bit> y = List.copyOf(guarded.bits("y", List.of(0, 1, 2, 3, 4)).decisions());
    guarded.require("where", sum(y.subList(0, 4)).atMost(2).when(y.get(4)));
    Lowered lowered = Lowering.standard().lower(guarded);
    LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
    report.orThrow();
    assertEquals(16 + 11, report.feasible());
    assertTrue(lowered.auxiliaryBits() <= without + 1, "the range left is 4 in the place of 2");
  }
}
