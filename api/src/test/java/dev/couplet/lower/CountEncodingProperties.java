package dev.couplet.lower;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.form.State;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Count;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import java.util.List;
import java.util.SplittableRandom;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;

/** Codes of counts against their definition, and whole lowerings against the audit. */
class CountEncodingProperties {
  private static final List<CountEncoding> ALL =
      List.of(
          CountEncoding.binary(),
          CountEncoding.bounded(1),
          CountEncoding.bounded(2),
          CountEncoding.bounded(3),
          CountEncoding.unary(),
          CountEncoding.domainWall());

  @Example
  void everyNumberHasAPatternAndEveryPatternANumber() {
    for (CountEncoding encoding : ALL) {
      for (long width = 1; width <= 14; width++) {
        CountEncoding.Code code = encoding.code(width);
        int bits = code.amounts().size();
        assertEquals(width, code.amounts().stream().mapToLong(Long::longValue).sum());
        for (long number = 0; number <= width; number++) {
          boolean[] pattern = code.pattern(number);
          long held = 0;
          for (int k = 0; k < bits; k++) {
            held += pattern[k] ? code.amounts().get(k) : 0;
          }
          assertEquals(number, held, encoding.name() + " " + width);
          assertEquals(0, code.penalty().value(State.of(pattern)));
        }
        for (long pattern = 0; pattern < 1L << bits; pattern++) {
          double penalty = code.penalty().value(State.ofWords(bits, pattern));
          boolean rising = Long.bitCount(pattern & pattern + 1) == 0;
          boolean kept = !encoding.equals(CountEncoding.domainWall()) || rising;
          assertTrue(kept ? penalty == 0 : penalty >= 1, encoding.name() + " " + pattern);
        }
      }
    }
  }

  @Example
  void boundsAreKept() {
    assertEquals(List.of(1L, 2L, 4L, 3L), CountEncoding.binary().code(10).amounts());
    assertEquals(List.of(1L, 2L, 3L, 3L, 1L), CountEncoding.bounded(3).code(10).amounts());
    assertEquals(List.of(1L, 2L, 2L, 2L), CountEncoding.bounded(2).code(7).amounts());
    assertThrows(IllegalArgumentException.class, () -> CountEncoding.bounded(0));
    assertThrows(IllegalArgumentException.class, () -> CountEncoding.unary().code(1L << 40));
  }

  /** Squares, cubes and products of counts with other decisions, in rules and objectives. */
  /** A rule that is a conflict of digits, not of numbers. */
  @Example
  void digitsThatConflict() {
    everyEncodingIsFaithful(77);
  }

  @Property(tries = 150)
  void everyEncodingIsFaithful(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Model model = Model.named("counts");
    Count n = model.count("n", random.nextInt(-3, 3), random.nextInt(3, 6));
    Count m = model.count("m", 0, random.nextInt(0, 4));
    Bit bit = model.bit("bit");
    Choice<Integer> choice = model.choice("choice", List.of(1, 2, 3));
    List<Expr> parts =
        List.of(
            n, m, n.times(n), n.times(m), n.times(bit), m.times(m).times(n), m.times(choice.is(2)));
    Expr objective = Expr.constant(0);
    Expr sum = Expr.constant(0);
    for (Expr part : parts) {
      objective = objective.plus(part.times(random.nextInt(-3, 4)));
      sum = sum.plus(part.times(random.nextInt(-1, 2)));
    }
    model.minimize("objective", objective);
    Plan planted =
        model
            .plan()
            .set(n, n.lowest())
            .set(m, m.highest())
            .set(bit, true)
            .set(choice, 2)
            .evaluate();
    model.require("sum", sum.atMost(planted.number(sum) + random.nextInt(3)));
    model.require("pair", n.plus(m).atLeast(n.lowest() + m.highest() - 1));
    model.prefer("wish", n.minus(m).atLeast(1), 2);
    double best = Double.NaN;
    for (CountEncoding encoding : ALL) {
      Lowered lowered = Lowering.standard().with(encoding).lower(model);
      LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
      if (report.feasible() > 0) {
        report.orThrow();
        double optimum = report.optimum().orElseThrow();
        assertEquals(Double.isNaN(best) ? optimum : best, optimum, encoding.name());
        best = optimum;
      }
    }
  }

  @Example
  void codesAreSetByHandForSingleDecisions() {
    Model model = Model.named("counts");
    Count n = model.count("n", 1, 6);
    Count m = model.count("m", 1, 6);
    Choice<Integer> c = model.choice("c", List.of(1, 2, 3, 4));
    model.require("sum", n.plus(m).plus(c.is(3)).exactly(8));
    Lowered lowered =
        Lowering.standard()
            .encode(n, CountEncoding.domainWall())
            .encode(c, ChoiceEncoding.domainWall())
            .lower(model);
    assertEquals(List.of(0, 1, 2, 3, 4), lowered.bits(n));
    assertEquals(3, lowered.bits(m).size());
    assertEquals(3, lowered.bits(c).size());
    LoweringAudit.exhaustive(lowered).orThrow();
    Plan plan = model.plan().set(n, 4).set(m, 4).set(c, 1).evaluate();
    assertEquals("11100", lowered.complete(plan).toText().substring(0, 5));
    assertEquals(plan, lowered.plan(lowered.complete(plan)));
    Model other = Model.named("other");
    assertThrows(
        IllegalArgumentException.class,
        () -> Lowering.standard().encode(n, CountEncoding.unary()).lower(other));
  }
}
