package dev.couplet.bench.models;

import static dev.couplet.model.Expr.sum;

import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import dev.couplet.model.Order;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/**
 * The shortest closed tour through all cities: city 1 stands first, and the others have an order.
 * The value is the length, to be minimised. Lowered it has (n - 1)^2 bits and O(n^3) pairs.
 * Immutable.
 *
 * <p>Source: Lucas, "Ising formulations of many NP problems" (2014), section 7.2, with the first
 * place fixed, as he remarks one can; the formulation goes back to Hopfield and Tank, "Neural
 * computation of decisions in optimization problems" (1985).
 */
public final class Tour {
  private final Statement statement;
  private final Order<Integer> afterFirst;

  private Tour(Statement statement, Order<Integer> afterFirst) {
    this.statement = statement;
    this.afterFirst = afterFirst;
  }

  /**
   * States the search for a shortest tour, in time O(n^3).
   *
   * @param distances from the city of the row to that of the column; need not be symmetric
   * @throws IllegalArgumentException if there are less than three cities, or distances are missing
   */
  public static Tour of(String name, NumberTable distances) {
    int n = distances.rows();
    if (n < 3) {
      throw new IllegalArgumentException("a tour of " + n + " cities; it takes 3 or more");
    }
    distances.require("the table of distances", n, n);
    Places.requireFew("tour " + name, (double) n * n * n);
    Model model = Model.named(name);
    Order<Integer> afterFirst = model.order("tour", Places.upTo(n).subList(1, n));
    List<Expr> length = new ArrayList<>();
    length.add(afterFirst.stepCost((from, to) -> distances.at(from - 1, to - 1)));
    for (int city : afterFirst.items()) {
      length.add(afterFirst.first(city).times(distances.at(0, city - 1)));
      length.add(afterFirst.last(city).times(distances.at(city - 1, 0)));
    }
    model.minimize("length", sum(length));
    return new Tour(model.snapshot(), afterFirst);
  }

  /** The statement; its cities are counted from 1. */
  public Statement statement() {
    return statement;
  }

  /**
   * The plan of a tour.
   *
   * @param cities counted from 1, in the order of the tour, beginning anywhere
   * @throws IllegalArgumentException if the cities are not those of the model, each once
   */
  public Plan plan(List<Integer> cities) {
    if (!cities.contains(1)) {
      throw new IllegalArgumentException("city 1 is not on the tour");
    }
    List<Integer> turned = new ArrayList<>(cities);
    Collections.rotate(turned, -cities.indexOf(1));
    return statement.plan().set(afterFirst, turned.subList(1, turned.size())).evaluate();
  }
}
