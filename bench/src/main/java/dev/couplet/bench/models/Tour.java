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
 * The shortest closed tour through all cities: city 1 stands first, each later place has a choice
 * among the others, and each of these stands at exactly one place. The value is the length, to be
 * minimised. Lowered it has (n - 1)^2 bits and O(n^3) pairs. Immutable.
 *
 * <p>Source: Lucas, "Ising formulations of many NP problems" (2014), section 7.2, with the first
 * place fixed, as he remarks one can; the formulation goes back to Hopfield and Tank, "Neural
 * computation of decisions in optimization problems" (1985).
 */
public final class Tour {
  private final Statement statement;
  private final Family<Integer, Choice<Integer>> cityAt;

  private Tour(Statement statement, Family<Integer, Choice<Integer>> cityAt) {
    this.statement = statement;
    this.cityAt = cityAt;
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
    List<Integer> others = Places.upTo(n).subList(1, n);
    Family<Integer, Choice<Integer>> cityAt = model.choices("city at place", others, others);
    for (int city : others) {
      model.require(
          "city " + city + " stands at one place",
          sum(others, place -> cityAt.of(place).is(city)).exactly(1));
    }
    model.minimize("length", length(distances, cityAt, others));
    return new Tour(model.snapshot(), cityAt);
  }

  private static Expr length(
      NumberTable distances, Family<Integer, Choice<Integer>> cityAt, List<Integer> others) {
    int n = distances.rows();
    List<Expr> steps = new ArrayList<>();
    for (int city : others) {
      steps.add(cityAt.of(2).is(city).times(distances.at(0, city - 1)));
      steps.add(cityAt.of(n).is(city).times(distances.at(city - 1, 0)));
    }
    for (int place : others.subList(0, n - 2)) {
      for (int from : others) {
        for (int to : others) {
          if (from != to) {
            Expr both = cityAt.of(place).is(from).times(cityAt.of(place + 1).is(to));
            steps.add(both.times(distances.at(from - 1, to - 1)));
          }
        }
      }
    }
    return sum(steps);
  }

  /** The statement; its cities and places are counted from 1. */
  public Statement statement() {
    return statement;
  }

  /**
   * The plan of a tour.
   *
   * @param cities counted from 1, in the order of the tour, beginning anywhere
   * @throws IllegalArgumentException if city 1 is not among them, or there are too few or many
   */
  public Plan plan(int... cities) {
    int n = cityAt.keys().size() + 1;
    Places.requireLength("cities", cities.length, n);
    int first = 0;
    while (first < n && cities[first] != 1) {
      first++;
    }
    if (first == n) {
      throw new IllegalArgumentException("city 1 is not on the tour");
    }
    Plan.Draft draft = statement.plan();
    for (int place = 2; place <= n; place++) {
      draft.set(cityAt.of(place), cities[(first + place - 1) % n]);
    }
    return draft.evaluate();
  }
}
