package dev.couplet.bench.models;

import static dev.couplet.model.Expr.sum;

import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.List;

/**
 * Quadratic assignment: a permutation p with the least sum of {@code a(i, j) b(p(i), p(j))} over
 * all ordered pairs. A choice of p(i) for each i, and each place is taken exactly once. Lowered it
 * has n^2 bits and O(n^4) pairs. Immutable.
 *
 * <p>Source: Koopmans and Beckmann, "Assignment problems and the location of economic activities"
 * (1957); as a form: Glover, Kochenberger and Du, "A tutorial on formulating and using QUBO models"
 * (2019), section 5.4.
 */
public final class QuadraticAssignment {
  private final Statement statement;
  private final Family<Integer, Choice<Integer>> placeOf;

  private QuadraticAssignment(Statement statement, Family<Integer, Choice<Integer>> placeOf) {
    this.statement = statement;
    this.placeOf = placeOf;
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
    List<Integer> places = Places.upTo(n);
    Family<Integer, Choice<Integer>> placeOf = model.choices("place of", places, places);
    for (int place : places) {
      model.require(
          "place " + place + " is taken once",
          sum(places, i -> placeOf.of(i).is(place)).exactly(1));
    }
    model.minimize("cost", cost(a, b, placeOf));
    return new QuadraticAssignment(model.snapshot(), placeOf);
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

  private static Expr cost(NumberTable a, NumberTable b, Family<Integer, Choice<Integer>> placeOf) {
    List<Expr> products = new ArrayList<>();
    for (int i = 1; i <= a.rows(); i++) {
      for (int j = 1; j <= a.rows(); j++) {
        double flow = a.at(i - 1, j - 1);
        if (flow != 0) {
          addProducts(flow, b, placeOf.of(i), placeOf.of(j), products);
        }
      }
    }
    return sum(products);
  }

  /** Two things stand at two places; one thing at one. */
  private static void addProducts(
      double flow, NumberTable b, Choice<Integer> one, Choice<Integer> other, List<Expr> products) {
    for (int k : one.options()) {
      for (int l : one.options()) {
        double cost = flow * b.at(k - 1, l - 1);
        if (cost != 0 && (one == other) == (k == l)) {
          products.add(
              one == other ? one.is(k).times(cost) : one.is(k).times(other.is(l)).times(cost));
        }
      }
    }
  }

  /** The statement; its things and places are counted from 1. */
  public Statement statement() {
    return statement;
  }

  /** The plan of a permutation: p(1), p(2), ..., counted from 1. */
  public Plan plan(int... permutation) {
    Places.requireLength("places", permutation.length, placeOf.keys().size());
    Plan.Draft draft = statement.plan();
    placeOf.keys().forEach(i -> draft.set(placeOf.of(i), permutation[i - 1]));
    return draft.evaluate();
  }
}
