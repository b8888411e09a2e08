package dev.couplet.exact.plans;

import static dev.couplet.model.Expr.sum;

import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/** Models of textbook problems. */
final class Problems {
  private Problems() {}

  /** One of k colours for each vertex, neighbours different. */
  static Model colouring(boolean[][] adjacent, int colours) {
    Model model = Model.named("colouring");
    List<Integer> palette = upTo(colours);
    List<Choice<Integer>> colourOf = new ArrayList<>();
    for (int v = 0; v < adjacent.length; v++) {
      colourOf.add(model.choice("colour of " + v, palette));
    }
    for (int v = 0; v < adjacent.length; v++) {
      for (int w = 0; w < v; w++) {
        for (int colour : adjacent[v][w] ? palette : List.<Integer>of()) {
          Expr both = colourOf.get(v).is(colour).plus(colourOf.get(w).is(colour));
          model.require(v + " and " + w + " differ, " + colour, both.atMost(1));
        }
      }
    }
    return model;
  }

  /** As many vertices as possible, every two of them adjacent. */
  static Model clique(boolean[][] adjacent) {
    Model model = Model.named("clique");
    List<Bit> in = new ArrayList<>();
    for (int v = 0; v < adjacent.length; v++) {
      in.add(model.bit("vertex " + v));
      for (int w = 0; w < v; w++) {
        if (!adjacent[v][w]) {
          model.require(v + " or " + w, in.get(v).plus(in.get(w)).atMost(1));
        }
      }
    }
    model.maximize("size", sum(in));
    return model;
  }

  /** Items of one value, and a weight in each of several knapsacks that all must hold them. */
  static Model knapsack(double[] values, double[][] weights, double[] capacities) {
    Model model = Model.named("knapsack");
    List<Bit> packed = new ArrayList<>();
    for (int i = 0; i < values.length; i++) {
      packed.add(model.bit("item " + i));
    }
    List<Integer> items = upTo(values.length);
    for (int k = 0; k < capacities.length; k++) {
      double[] own = weights[k];
      model.require(
          "capacity " + k, sum(items, i -> packed.get(i).times(own[i])).atMost(capacities[k]));
    }
    model.maximize("value", sum(items, i -> packed.get(i).times(values[i])));
    return model;
  }

  /** One agent for each job, within the agents' capacities; numbers are {@code [agent][job]}. */
  static Model assignment(double[][] profits, double[][] loads, double[] capacities) {
    Model model = Model.named("assignment");
    List<Integer> agents = upTo(capacities.length);
    List<Integer> jobs = upTo(profits[0].length);
    List<Choice<Integer>> agentOf = new ArrayList<>();
    jobs.forEach(job -> agentOf.add(model.choice("agent of " + job, agents)));
    for (int agent : agents) {
      model.require(
          "capacity of " + agent,
          sum(jobs, job -> agentOf.get(job).is(agent).times(loads[agent][job]))
              .atMost(capacities[agent]));
    }
    List<Expr> parts = new ArrayList<>();
    for (int agent : agents) {
      jobs.forEach(job -> parts.add(agentOf.get(job).is(agent).times(profits[agent][job])));
    }
    model.maximize("profit", sum(parts));
    return model;
  }

  /** A closed tour: one city at each place, each city at one place. */
  static Model tour(long[][] distances) {
    Model model = Model.named("tour");
    List<Integer> cities = upTo(distances.length);
    List<Choice<Integer>> at = new ArrayList<>();
    cities.forEach(place -> at.add(model.choice("place " + place, cities)));
    for (int city : cities) {
      model.require("once " + city, sum(at, place -> place.is(city)).exactly(1));
    }
    model.require("begin", at.get(0).is(0).isTrue());
    List<Expr> steps = new ArrayList<>();
    for (int place : cities) {
      Choice<Integer> here = at.get(place);
      Choice<Integer> next = at.get((place + 1) % cities.size());
      for (int a : cities) {
        for (int b : cities) {
          steps.add(here.is(a).times(next.is(b)).times(distances[a][b]));
        }
      }
    }
    model.minimize("length", sum(steps));
    return model;
  }

  static List<Integer> upTo(int count) {
    return IntStream.range(0, count).boxed().toList();
  }
}
