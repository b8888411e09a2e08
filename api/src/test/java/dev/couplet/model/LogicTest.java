package dev.couplet.model;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.State;
import java.util.Collections;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/** Literals made of literals, and conditions that matter only where a literal holds. */
class LogicTest {
  private final Model model = Model.named("shifts");
  private final Bit a = model.bit("a");
  private final Bit b = model.bit("b");
  private final Bit c = model.bit("c");
  private final Choice<String> van = model.choice("van", List.of("small", "large"));

  private static void refused(Runnable call, String... words) {
    IllegalArgumentException refusal = assertThrows(IllegalArgumentException.class, call::run);
    for (String word : words) {
      assertTrue(refusal.getMessage().contains(word), refusal.getMessage());
    }
  }

  private Plan plan(boolean first, boolean second, boolean third, String option) {
    return model.plan().set(a, first).set(b, second).set(c, third).set(van, option).evaluate();
  }

  @Test
  void whatLiteralsMake() {
    Literal both = a.and(b);
    assertEquals("(a and b)", both.toString());
    assertEquals("(not a or not b)", both.not().toString());
    assertEquals("(a and b and not c)", both.and(c.not(), a).toString(), "said twice, said once");
    assertEquals("(not a xor b)", a.xor(b).not().toString());
    assertEquals("((a and b) or van = small)", both.or(van.is("small")).toString());
    assertSame(a, a.or(a), "one literal is itself");
    assertSame(a, a.and());
    assertEquals(both.toString(), both.not().not().toString());
    Plan plan = plan(true, false, true, "small");
    assertFalse(plan.holds(both));
    assertTrue(plan.holds(a.xor(b)));
    assertFalse(plan.holds(a.xor(a)), "never");
    assertTrue(plan.holds(a.xor(a).not()), "always");
    assertFalse(plan.holds(a.xor(b, c, van.is("large"))), "two of four");
    assertEquals(3, plan.number(a.or(b).times(3)));
  }

  /** Multiplied out, each is the one polynomial that takes its values. */
  @Test
  void asExpressionsTheyCountOneOrNothing() {
    assertEquals("[a][b]", terms("and", a.and(b)));
    assertEquals("[a] + [b] - [a][b]", terms("or", a.or(b)));
    assertEquals("[a] + [b] - 2[a][b]", terms("xor", a.xor(b)));
    assertEquals("1 - [a] - [b] + 2[a][b]", terms("same", a.xor(b).not()));
    assertEquals("[c] + [a][b] - [a][b][c]", terms("nested", a.and(b).or(c)));
    assertEquals(
        -8, model.minimize("m", a.xor(b, c, van.is("small"))).terms().coefficient(0, 1, 2, 3));
  }

  private String terms(String name, Expr expr) {
    model.minimize(name, expr);
    String all = model.describe();
    String before = "minimize " + name + ": ";
    return all.substring(all.indexOf(before) + before.length()).lines().findFirst().orElseThrow();
  }

  /** Each condition comes to sums that need no product. */
  @Test
  void conditionsAvoidProducts() {
    Literal small = van.is("small");
    Rule all = model.require("all", a.and(b.not(), small).isTrue());
    assertEquals(1, all.parts().size());
    assertEquals(1, all.parts().get(0).terms().degree());
    assertEquals(
        3, all.amount(State.of(false, true, false, false, true)), "each that fails counts");
    Rule number = model.require("number", a.and(b.not(), small).atLeast(1));
    assertEquals(1, number.amount(State.of(false, true, false, false, true)));
    Rule any = model.require("any", a.and(b).isFalse());
    assertEquals(1, any.parts().get(0).terms().degree());
    Rule clauses = model.require("clauses", a.or(b).not().or(c).isTrue());
    assertEquals(2, clauses.parts().size(), "not a or c, not b or c");
    Rule each = model.require("each", a.implies(b.and(c)));
    assertEquals(2, each.parts().size());
    Rule odd = model.require("odd", a.xor(b, c).isTrue());
    assertEquals(2, odd.parts().get(0).step());
    assertEquals(3, odd.parts().get(0).highest());
    assertEquals(1, odd.amount(State.of(true, true, false, false, false)));
    for (Rule rule : List.of(clauses, each, odd)) {
      rule.parts().forEach(part -> assertEquals(1, part.terms().degree(), rule.toString()));
    }
  }

  @Test
  void aMillionLiteralsInOneCondition() {
    Literal first = Literal.anyOf(Collections.nCopies(1 << 20, a));
    assertSame(a, first);
    List<Bit> bits = List.copyOf(model.bits("x", range(1 << 16)).decisions());
    Rule rule = model.require("one of many", Literal.anyOf(bits).isTrue());
    assertEquals(1 << 16, rule.parts().get(0).terms().terms());
    Rule odd = model.require("odd of many", Literal.oddOf(bits).isTrue());
    assertEquals((1 << 16) - 1, odd.parts().get(0).highest());
  }

  private static List<Integer> range(int end) {
    return IntStream.range(0, end).boxed().toList();
  }

  /** 20 literals have 2^20 terms at the most, 21 are refused. */
  @Test
  void whatWouldMultiplyOutWithoutEndIsRefused() {
    List<Bit> bits = List.copyOf(model.bits("x", range(40)).decisions());
    refused(() -> model.minimize("m", Literal.anyOf(bits)), "x 0 or x 1", "1048576", "isTrue");
    refused(() -> model.minimize("m", Literal.oddOf(bits)), "x 0 xor x 1", "require(name, bit");
    assertEquals(
        (1 << 12) - 1, model.minimize("m", Literal.anyOf(bits.subList(0, 12))).terms().terms());
    Literal doubled = a.and(b).or(c);
    Literal endless = doubled;
    for (int k = 0; k < 20; k++) {
      endless = endless.and(doubled.not()).or(endless.not(), c);
    }
    Literal twice = endless;
    assertTrue(twice.toString().length() < 2000);
    refused(
        () -> {
          Literal more = twice;
          for (int k = 0; k < 20; k++) {
            more = more.and(doubled.not()).or(more.not(), c);
          }
        },
        "16777216",
        "bit of its own");
  }

  @Test
  void conditionsThatMatterWhereALiteralHolds() {
    Expr load = sum(a.times(3), b.times(2), c.times(4));
    Rule rule = model.require("load", load.atMost(5).when(van.is("small")));
    assertEquals(4, rule.amount(State.of(true, true, true, true, false)), "9 where 5 is the limit");
    assertEquals(0, rule.amount(State.of(true, true, true, false, true)));
    assertEquals(9, rule.parts().get(0).highest(), "as much as there can be");
    Rule both = model.require("both", load.between(3, 5).when(a).when(b.not()));
    assertEquals(2, both.parts().size());
    assertEquals(
        2, both.amount(State.of(true, false, true, true, false)), "7 where 5 is the limit");
    assertEquals(0, both.amount(State.of(true, true, true, true, false)));
    assertEquals(0, both.amount(State.of(false, false, false, true, false)));
    Rule decimals = model.prefer("tenths", load.times(0.1).atMost(0.5).when(a), 10);
    assertEquals(0.4, decimals.amount(State.of(true, true, true, true, false)));
    assertTrue(model.require("free", load.atMost(9).when(a)).alwaysKept());
    Rule never = model.require("never", load.atLeast(10).when(a));
    assertFalse(never.alwaysKept());
    assertTrue(never.kept(State.of(false, true, true, true, false)));
    assertEquals(
        "3 (a) + 2 (b) + 4 (c) <= 5 when (a and not b)",
        load.atMost(5).when(a).when(b.not()).toString());
  }

  @Test
  void severalConditionsAtOnce() {
    Rule rule = model.prefer("two", a.isTrue().and(b.isFalse()), 3);
    assertEquals(6, plan(false, true, false, "small").value(), "both are missed");
    assertEquals(2, rule.parts().size());
    assertTrue(model.require("nothing", Condition.all(List.of())).alwaysKept());
    List<Bit> bits = List.of(a, b, c);
    assertTrue(
        model
            .require("k", Condition.exactly(2, bits))
            .kept(State.of(true, true, false, true, false)));
    assertFalse(
        model.require("n", Condition.none(bits)).kept(State.of(true, true, false, true, false)));
    refused(
        () -> model.require("four", Condition.atLeast(4, bits)),
        "rule 'four' can be kept by no plan",
        "between 0 and 3");
    refused(
        () -> model.require("less", Condition.atMost(-1, bits)), "'less' can be kept by no plan");
    refused(() -> model.require("even", a.xor(a).isTrue()), "'even' can be kept by no plan");
  }

  @Test
  void choicesThatAllDiffer() {
    Choice<String> other = model.choice("other", List.of("large", "bike"));
    Choice<String> third = model.choice("third", List.of("large", "small", "boat"));
    Rule rule = model.require("differ", Condition.allDifferent(List.of(van, other, third)));
    assertEquals(2, rule.parts().size(), "small and large; nobody else has bike or boat");
    refused(() -> Condition.allDifferent(List.of(van, other, van)), "'van'", "twice");
    Choice<String> same = model.choice("same", List.of("small", "large"));
    Choice<String> again = model.choice("again", List.of("small", "large"));
    refused(() -> Condition.allDifferent(List.of(van, same, again)), "3 choices", "2 options");
    Choice<String> foreign = Model.named("foreign").choice("van", List.of("x", "y", "z"));
    refused(() -> Condition.allDifferent(List.of(van, foreign)), "'shifts'", "'foreign'");
  }

  @Test
  void tablesAreLookedUp() {
    Expr cost = van.lookUp(option -> option.length() / 10.0);
    Choice<Integer> day = model.choice("day", List.of(1, 2, 3));
    Expr fee = van.lookUp(day, (option, number) -> option.length() * number);
    Plan plan =
        model
            .plan()
            .set(a, true)
            .set(b, true)
            .set(c, true)
            .set(van, "small")
            .set(day, 3)
            .evaluate();
    assertEquals(0.5, plan.number(cost));
    assertEquals(15, plan.number(fee));
    refused(
        () -> van.lookUp(option -> option.equals("large") ? Double.NaN : 0),
        "'van'",
        "large",
        "NaN");
    refused(() -> van.lookUp(day, (option, number) -> 1.0 / (number - 2)), "small, 2", "Infinity");
  }

  @Test
  void whatIsOfAnotherModelIsRefusedAtOnce() {
    Bit foreign = Model.named("foreign").bit("a");
    refused(() -> a.and(foreign), "'shifts'", "'foreign'");
    refused(() -> a.or(b.xor(c), foreign.and(foreign.not())), "'foreign'");
    refused(() -> a.isTrue().when(foreign), "'shifts'", "'foreign'");
    refused(() -> Expr.constant(1).atMost(0).when(a).when(foreign), "'shifts'", "'foreign'");
    refused(() -> model.require("r", foreign.isTrue().and(a.isTrue())), "'foreign'", "'shifts'");
    refused(
        () -> model.require("r", Expr.constant(1).atMost(0).when(foreign)),
        "'foreign'",
        "'shifts'");
    refused(() -> Literal.allOf(List.of()), "'and'", "at least one");
    assertEquals(0, model.snapshot().rules().size());
  }
}
