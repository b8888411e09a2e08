package dev.couplet.bench.models;

import static dev.couplet.bench.models.Formulation.assertOptimum;
import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowering;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Objectives of degree four, and rules that leave a known number of plans. */
class SequencesAndQueensTest {
  /** Least energies for N = 3, 4, ...: the table in Packebusch and Mertens (2016). */
  private static final int[] PUBLISHED = {1, 2, 2, 7, 3, 8, 12, 13, 5, 10, 6, 19, 15, 24, 32, 25};

  private static List<Integer> upTo(int n) {
    return IntStream.range(0, n).boxed().toList();
  }

  /**
   * Low-autocorrelation binary sequences: the least sum over k of the square of the sum of s_i
   * s_(i+k), s = 1 - 2x. Bernasconi, "Low autocorrelation binary sequences" (1987), from memory.
   */
  private static Statement sequence(int n) {
    Model model = Model.named("sequence of " + n);
    Family<Integer, Bit> x = model.bits("x", upTo(n));
    List<Expr> s = upTo(n).stream().map(i -> x.of(i).times(-2).plus(1)).toList();
    List<Expr> squares = new ArrayList<>();
    for (int k = 1; k < n; k++) {
      int shift = k;
      Expr correlation = sum(upTo(n - k), i -> s.get(i).times(s.get(i + shift)));
      squares.add(correlation.times(correlation));
    }
    model.minimize("energy", sum(squares));
    return model.snapshot();
  }

  /** Every sequence by the statement's own polynomial. */
  @ParameterizedTest
  @ValueSource(ints = {3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18})
  void leastEnergiesOfSequencesAreThePublished(int n) {
    Statement statement = sequence(n);
    double least = Double.POSITIVE_INFINITY;
    boolean reversedAlike = true;
    // The first spin may be fixed: turning all of them changes nothing.
    for (long bits = 0; bits < 1L << (n - 1); bits++) {
      double energy = statement.objective().value(State.ofWords(n, bits));
      least = Math.min(least, energy);
      reversedAlike &= bits > 64 || energy == direct(n, bits);
    }
    assertEquals(PUBLISHED[n - 3], least);
    assertTrue(reversedAlike, "the polynomial is the sum of squares");
  }

  private static double direct(int n, long bits) {
    double energy = 0;
    for (int k = 1; k < n; k++) {
      int correlation = 0;
      for (int i = 0; i + k < n; i++) {
        correlation += (bits >> i & 1) == (bits >> (i + k) & 1) ? 1 : -1;
      }
      energy += correlation * correlation;
    }
    return energy;
  }

  /** The same by way of the lowered form, auxiliary bits and all. */
  @ParameterizedTest
  @ValueSource(ints = {3, 4, 5, 6, 7})
  void loweredSequencesHaveThePublishedMinimum(int n) {
    Statement statement = sequence(n);
    int bits = Lowering.standard().lower(statement).qubo().size();
    assertTrue(bits >= n, "degree four takes auxiliary bits from five on");
    assertOptimum(PUBLISHED[n - 3], bits, statement);
  }

  /** Solutions of the n queens: common knowledge; OEIS A000170. */
  @ParameterizedTest
  @CsvSource({"4, 2", "5, 10", "6, 4"})
  void queensHaveAsManyMinimaAsSolutions(int n, int solutions) {
    Model model = Model.named(n + " queens");
    Family<Integer, Choice<Integer>> column = model.choices("column in row", upTo(n), upTo(n));
    for (int c : upTo(n)) {
      model.require("column " + c, sum(upTo(n), r -> column.of(r).is(c)).exactly(1));
    }
    for (int d = 1; d < 2 * n - 2; d++) {
      int diagonal = d;
      model.require("falling " + d, sum(cells(column, n, (r, c) -> r + c == diagonal)).atMost(1));
      model.require(
          "rising " + d, sum(cells(column, n, (r, c) -> r - c + n - 1 == diagonal)).atMost(1));
    }
    Lowered lowered = Lowering.standard().lower(model);
    assertEquals(n * n, lowered.qubo().size(), "no auxiliary bits");
    assertEquals(solutions, new States(lowered.qubo()).atMost(0));
    assertEquals(0, new States(lowered.qubo()).atMost(-1), "no penalty is negative");
  }

  private interface Cell {
    boolean lies(int row, int column);
  }

  private static List<Expr> cells(Family<Integer, Choice<Integer>> column, int n, Cell cell) {
    List<Expr> on = new ArrayList<>();
    for (int r : upTo(n)) {
      upTo(n).stream().filter(c -> cell.lies(r, c)).forEach(c -> on.add(column.of(r).is(c)));
    }
    return on;
  }

  /**
   * Counts the states of a form up to an energy. Bit by bit; what is left cannot lower the energy
   * by more than its negative coefficients, since no pair has a negative one.
   */
  private static final class States {
    private final Qubo form;
    private final double[] field;

    States(Qubo form) {
      this.form = form;
      this.field = new double[form.size()];
      for (int i = 0; i < field.length; i++) {
        field[i] = form.linear(i);
        for (int j = 0; j < i; j++) {
          assertTrue(form.pair(i, j) >= 0);
        }
      }
    }

    long atMost(double energy) {
      return count(0, form.constant(), energy);
    }

    private long count(int bit, double energy, double most) {
      double lowest = energy;
      for (int i = bit; i < field.length; i++) {
        lowest += Math.min(0, field[i]);
      }
      if (lowest > most) {
        return 0;
      }
      if (bit == field.length) {
        return 1;
      }
      long count = count(bit + 1, energy, most);
      double own = field[bit];
      move(bit, 1);
      count += count(bit + 1, energy + own, most);
      move(bit, -1);
      return count;
    }

    private void move(int bit, int sign) {
      for (int i = bit + 1; i < field.length; i++) {
        field[i] += sign * form.pair(bit, i);
      }
    }
  }
}
