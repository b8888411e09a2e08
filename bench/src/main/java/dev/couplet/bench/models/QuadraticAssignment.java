package dev.couplet.bench.models;

import static dev.couplet.model.Expr.sum;

import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import dev.couplet.model.Order;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Quadratic assignment: a permutation p with the least sum of {@code a(i, j) b(p(i), p(j))} over
 * all ordered pairs. An order of the things, the places being where they stand in it. Lowered it
 * has n^2 bits and O(n^4) pairs. Immutable.
 *
 * <p>Source: Koopmans and Beckmann, "Assignment problems and the location of economic activities"
 * (1957); as a form: Glover, Kochenberger and Du, "A tutorial on formulating and using QUBO models"
 * (2019), section 5.4.
 */
public final class QuadraticAssignment {
  private final Statement statement;
  private final Order<Integer> things;

  private QuadraticAssignment(Statement statement, Order<Integer> things) {
    this.statement = statement;
    this.things = things;
  }

  /**
   * States the assignment, in time O(n^2 + products that are not zero).
   *
   * @param a between the things that are assigned
   * @param b between the places, as many
   */
  public static QuadraticAssignment of(String name, NumberTable a, NumberTable b) {
    int n = a.rows();
    a.require("the first matrix", n, n);
    b.require("the second matrix", n, n);
    Places.requireFew("quadratic assignment " + name, nonzero(a) * nonzero(b));
    Model model = Model.named(name);
    Order<Integer> things = model.order("things by place", Places.upTo(n));
    List<Expr> costs = new ArrayList<>();
    for (int i = 1; i <= n; i++) {
      for (int j = 1; j <= n; j++) {
        addCosts(a.at(i - 1, j - 1), i, j, b, things, costs);
      }
    }
    model.minimize("cost", sum(costs));
    return new QuadraticAssignment(model.snapshot(), things);
  }

  private static double nonzero(NumberTable table) {
    double count = 0;
    for (int i = 0; i < table.rows(); i++) {
      for (int j = 0; j < table.columns(); j++) {
        count += table.at(i, j) == 0 ? 0 : 1;
      }
    }
    return count;
  }

  /** Two things stand at two places; one thing at one. */
  private static void addCosts(
      double flow, int i, int j, NumberTable b, Order<Integer> things, List<Expr> costs) {
    for (int k = 0; k < b.rows(); k++) {
      for (int l = 0; l < b.rows(); l++) {
        double cost = flow * b.at(k, l);
        if (cost != 0 && (i == j) == (k == l)) {
          Expr both = i == j ? things.at(i, k) : things.at(i, k).times(things.at(j, l));
          costs.add(both.times(cost));
        }
      }
    }
  }

  /** The statement; its things are counted from 1, its places from 0. */
  public Statement statement() {
    return statement;
  }

  /**
   * The plan of a permutation: p(1), p(2), ..., counted from 1.
   *
   * @throws IllegalArgumentException if it is none
   */
  public Plan plan(List<Integer> permutation) {
    int n = things.places();
    Places.requireLength("places", permutation.size(), n);
    Integer[] at = new Integer[n];
    for (int i = 1; i <= n; i++) {
      int place = permutation.get(i - 1);
      if (place < 1 || place > n || at[place - 1] != null) {
        throw new IllegalArgumentException(
            "p(" + i + ") is " + place + ", places 1 to " + n + " are taken once each");
      }
      at[place - 1] = i;
    }
    return statement.plan().set(things, Arrays.asList(at)).evaluate();
  }
}
