package dev.couplet.model;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.State;
import java.util.List;
import java.util.Set;
import java.util.function.ToDoubleBiFunction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Spins, counts, orders and subsets, each against its definition. */
class DecisionsTest {
  private final Model model = Model.named("house");

  @Test
  void spinsAreWorthOneOrMinusOne() {
    Spin s = model.spin("s");
    Spin t = model.spin("t");
    Expr energy = s.times(t).plus(s.times(3)).minus(t);
    for (int a : new int[] {1, -1}) {
      for (int b : new int[] {1, -1}) {
        Plan plan = model.plan().set(s, a).set(t, b).evaluate();
        assertEquals(a, plan.value(s));
        assertEquals(a > 0, plan.holds(s.up()));
        assertEquals(a < 0, plan.holds(s.down()));
        assertEquals(a * b + 3 * a - b, plan.number(energy));
      }
    }
  }

  @ParameterizedTest
  @CsvSource({"0, 0", "0, 1", "-3, 4", "5, 12", "-10, -7", "0, 6"})
  void countsAreTheNumbersOfTheirRange(long lowest, long highest) {
    Count count = model.count("n", lowest, highest);
    Count other = model.count("m", -2, 2);
    assertEquals(highest - lowest + 1, count.values());
    for (long n = lowest; n <= highest; n++) {
      for (long m = -2; m <= 2; m++) {
        Plan plan = model.plan().set(count, n).set(other, m).evaluate();
        assertEquals(n, plan.value(count));
        assertEquals(n, plan.number(count));
        assertEquals(n * n * m - 2 * m, plan.number(count.times(count).minus(2).times(other)));
      }
    }
    assertThrows(
        IllegalArgumentException.class, () -> model.plan().set(count, highest + 1).evaluate());
  }

  @Test
  void plansOfEqualNumbersAreEqual() {
    Count count = model.count("n", 0, 4);
    Statement statement = model.snapshot();
    Plan low = statement.plan(State.of(true, false, false));
    Plan top = statement.plan(State.of(false, false, true));
    assertEquals(1, low.value(count));
    assertEquals(low, top);
  }

  @Test
  void countsOfAnySizeTakeFewLiterals() {
    model.count("n", -1_000_000_000_000L, 1_000_000_000_000L);
    assertEquals(41, model.snapshot().literals());
    assertThrows(IllegalArgumentException.class, () -> model.count("m", 0, 1L << 51));
    assertThrows(IllegalArgumentException.class, () -> model.count("k", 1, 0));
  }

  @Test
  void ordersSayWhoIsWhere() {
    Order<String> order = model.order("visits", List.of("a", "b", "c"));
    Plan plan = model.plan().set(order, List.of("c", "a", "b")).evaluate();
    assertTrue(plan.feasible());
    assertEquals(List.of("c", "a", "b"), plan.value(order));
    assertTrue(plan.holds(order.first("c")));
    assertTrue(plan.holds(order.last("b")));
    assertTrue(plan.holds(order.at("a", 1)));
    assertFalse(plan.holds(order.at("a", 0)));
    assertEquals(2, plan.number(order.placeOf("b")));
    assertEquals(1, plan.number(order.before("c", "b")));
    assertEquals(0, plan.number(order.before("b", "a")));
    ToDoubleBiFunction<String, String> letters = (x, y) -> 10 * x.charAt(0) + y.charAt(0) - 1067;
    double ca = 10 * 'c' + 'a' - 1067;
    double ab = 10 * 'a' + 'b' - 1067;
    double bc = 10 * 'b' + 'c' - 1067;
    assertEquals(ca + ab, plan.number(order.stepCost(letters)));
    assertEquals(ca + ab + bc, plan.number(order.cycleCost(letters)));
    assertEquals(6, order.values());
    Plan twice = model.plan().set(order, List.of("a", "a", "b")).evaluate();
    assertFalse(twice.feasible());
    assertEquals("no item twice in 'visits'", twice.unmet().get(0).rule());
  }

  @Test
  void ordersMayLeaveItemsOut() {
    Order<Integer> order = model.order("podium", List.of(1, 2, 3, 4), 2);
    assertEquals(12, order.values());
    assertEquals(8, model.snapshot().literals());
    Plan plan = model.plan().set(order, List.of(4, 2)).evaluate();
    assertTrue(plan.feasible());
    assertEquals(0, plan.number(order.contains(1)));
    assertEquals(1, plan.number(order.contains(2)));
    assertThrows(IllegalArgumentException.class, () -> model.plan().set(order, List.of(1)));
    assertThrows(IllegalArgumentException.class, () -> order.at(1, 2));
    assertThrows(IllegalArgumentException.class, () -> order.at(9, 0));
    assertThrows(IllegalArgumentException.class, () -> model.order("all", List.of(1), 2));
  }

  @Test
  void subsetsTakeWhatTheyTake() {
    Subset<String> subset = model.subset("tools", List.of("saw", "axe", "file"));
    model.require("two tools", subset.size().exactly(2));
    Plan plan = model.plan().set(subset, Set.of("file", "saw")).evaluate();
    assertTrue(plan.feasible());
    assertEquals(List.of("saw", "file"), List.copyOf(plan.value(subset)));
    assertTrue(plan.holds(subset.contains("saw")));
    assertFalse(model.plan().set(subset, Set.of("axe")).evaluate().feasible());
    assertEquals(8, subset.values());
    assertThrows(IllegalArgumentException.class, () -> subset.contains("drill"));
    assertThrows(IllegalArgumentException.class, () -> model.subset("none", List.of()));
  }

  @Test
  void familiesOfEachKind() {
    List<Integer> keys = List.of(1, 2);
    assertEquals("s 1", model.spins("s", keys).of(1).name());
    Family<Integer, Count> counts = model.counts("n", keys, 0, 9);
    assertEquals(3, model.orders("o", keys, List.of("x", "y", "z")).of(2).places());
    assertEquals(3, model.subsets("u", keys, List.of("x", "y", "z")).of(1).items().size());
    Rule rule = model.require("sum", sum(counts.decisions()).atMost(18));
    assertTrue(rule.alwaysKept(), "9 + 9 is 18");
    assertFalse(model.require("less", sum(counts.decisions()).atMost(17)).alwaysKept());
  }

  @Test
  void descriptionsNameTheirValues() {
    model.spin("s");
    model.count("n", -1, 3);
    model.order("o", List.of("x", "y"));
    model.subset("u", List.of("p", "q"));
    String text = model.describe();
    assertTrue(text.contains("decide s: up or down, 1 or -1"), text);
    assertTrue(text.contains("decide n: a whole number from -1 to 3"), text);
    assertTrue(text.contains("decide o: the order, at 2 places, of x, y"), text);
    assertTrue(text.contains("decide u: any of p, q"), text);
    assertTrue(text.contains("require no item twice in 'o': [o 0 = x] + [o 1 = x] = 1"), text);
  }
}
