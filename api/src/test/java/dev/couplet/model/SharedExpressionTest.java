package dev.couplet.model;

import static dev.couplet.model.Expr.constant;
import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Polynomial;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;

/** Expressions that use a part of themselves again and again: small as graphs, endless as trees. */
class SharedExpressionTest {
  private final Model model = Model.named("shared");
  private final Bit x = model.bit("x");
  private final Bit y = model.bit("y");

  private static Expr times(int count, Expr start, UnaryOperator<Expr> step) {
    Expr expr = start;
    for (int k = 0; k < count; k++) {
      expr = step.apply(expr);
    }
    return expr;
  }

  private Plan all() {
    return model.plan().set(x, true).set(y, true).evaluate();
  }

  private static void soon(Runnable work) {
    assertTimeoutPreemptively(Duration.ofSeconds(20), work::run);
  }

  /** 2^60 and 2^-10 are exact. */
  @Test
  void sixtyDoublings() {
    soon(
        () -> {
          Expr doubled = times(60, x.plus(y.times(3)).plus(0x1p-70), e -> e.plus(e));
          Polynomial terms = model.minimize("doubled", doubled).terms();
          assertEquals(0x1p60, terms.coefficient(0));
          assertEquals(3 * 0x1p60, terms.coefficient(1));
          assertEquals(0x1p-10, terms.constant());
          assertEquals(4 * 0x1p60, all().number(doubled));
          assertTrue(doubled.toString().length() < 2000);
        });
  }

  /** Doubled up and halved again: 2^40 ways down, and a rule in small whole numbers. */
  @Test
  void doublingsThatAreHalvedInARule() {
    soon(
        () -> {
          Expr mixed =
              times(40, x.minus(y), e -> e.times(0.5).plus(e.times(0.25)).plus(e.times(0.25)));
          Rule.Part rule = model.require("same", mixed.exactly(0)).parts().get(0);
          assertEquals(1, rule.terms().coefficient(0));
          assertEquals(-1, rule.terms().coefficient(1));
          assertEquals(0, all().number(mixed));
        });
  }

  /** x^k = x: products of the same, down to 2^60 factors, and sums inside of products. */
  @Test
  void squaresOfSquares() {
    soon(
        () -> {
          Expr power = times(60, x.times(y), e -> e.times(e));
          assertEquals(1, model.minimize("power", power).terms().coefficient(0, 1));
          assertEquals(1, all().number(power));
          // e -> e^2 - e + 1 leaves 1 as it is, and makes 1 of 0.
          Expr nested = times(60, x.times(y), e -> e.times(e).minus(e).plus(1));
          Polynomial terms = model.minimize("nested", nested).terms();
          assertEquals(1, terms.constant());
          assertEquals(0, terms.coefficient(0, 1));
          assertEquals(1, all().number(nested));
          Expr scaled = times(60, x, e -> e.times(2).times(e).times(0.5));
          assertEquals(1, model.require("one", scaled.atLeast(1)).parts().get(0).lowest());
          assertEquals(1, all().number(scaled));
        });
  }

  @Test
  void numbersWithoutEndAreRefused() {
    soon(
        () -> {
          Expr power = times(60, x.plus(1), e -> e.times(e));
          String rule =
              assertThrows(
                      IllegalArgumentException.class, () -> model.require("r", power.atMost(5)))
                  .getMessage();
          assertTrue(rule.contains("rule 'r'") && rule.contains("1000 digits"), rule);
          String objective =
              assertThrows(IllegalArgumentException.class, () -> model.minimize("m", power))
                  .getMessage();
          assertTrue(objective.contains("objective 'm'"), objective);
        });
  }

  /** Sums of all sums so far: 2,000 of them, each used twice and more. */
  @Test
  void runningSums() {
    soon(
        () -> {
          List<Expr> parts = new ArrayList<>();
          Expr running = constant(0);
          for (int k = 0; k < 2000; k++) {
            running = running.plus(k % 2 == 0 ? x : y.times(2));
            parts.add(running);
          }
          Expr total = sum(parts);
          assertEquals(
              2_001_000 - 1_000_000, model.minimize("total", total).terms().coefficient(0));
          assertEquals(1_001_000 + 2_000_000, all().number(total));
        });
  }

  /** Grown at random from parts made before; the same value as is built up beside it. */
  @Test
  void anyGraphHasTheValueThatItsPartsMake() {
    SplittableRandom random = new SplittableRandom(5);
    for (int round = 0; round < 30; round++) {
      List<Expr> exprs = new ArrayList<>(List.of(x, y, x.not(), constant(1)));
      List<long[]> values =
          new ArrayList<>(List.of(v(0, 1, 0, 1), v(0, 0, 1, 1), v(1, 0, 1, 0), v(1, 1, 1, 1)));
      for (int k = 0; k < 120; k++) {
        int i = exprs.size() - 1 - random.nextInt(Math.min(4, exprs.size()));
        int j = exprs.size() - 1 - random.nextInt(Math.min(4, exprs.size()));
        boolean product = random.nextInt(3) == 0 && small(values.get(i)) && small(values.get(j));
        long[] value = new long[4];
        for (int p = 0; p < 4; p++) {
          long left = values.get(i)[p];
          long right = values.get(j)[p];
          value[p] = product ? left * right : left - right;
        }
        if (Math.abs(value[3]) + Math.abs(value[2]) + Math.abs(value[1]) < 1L << 40) {
          exprs.add(product ? exprs.get(i).times(exprs.get(j)) : exprs.get(i).minus(exprs.get(j)));
          values.add(value);
        }
      }
      check("round " + round, exprs.get(exprs.size() - 1), values.get(values.size() - 1));
    }
  }

  private static long[] v(long... values) {
    return values;
  }

  private static boolean small(long[] values) {
    for (long value : values) {
      if (Math.abs(value) > 1 << 15) {
        return false;
      }
    }
    return true;
  }

  private void check(String name, Expr expr, long[] values) {
    soon(
        () -> {
          Polynomial terms = model.minimize(name, expr).terms();
          for (int p = 0; p < 4; p++) {
            boolean first = (p & 1) != 0;
            boolean second = (p & 2) != 0;
            Plan plan = model.plan().set(x, first).set(y, second).evaluate();
            assertEquals(values[p], terms.value(plan.literals()));
            assertEquals(values[p], plan.number(expr));
          }
        });
  }
}
