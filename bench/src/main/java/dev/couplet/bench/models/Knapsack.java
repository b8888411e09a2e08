package dev.couplet.bench.models;

import static dev.couplet.model.Expr.sum;

import dev.couplet.model.Bit;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;

/**
 * The multi-dimensional knapsack: a choice of items with the most profit, of which the weights in
 * each dimension stay within its capacity. A bit an item and a rule a dimension. Lowered it has n
 * bits and slack of floor(log2 capacity) + 1 bits a dimension. Immutable.
 *
 * <p>Source: Petersen, "Computational experience with variants of the Balas algorithm applied to
 * the selection of R&amp;D projects" (1967).
 */
public final class Knapsack {
  private final Statement statement;
  private final Family<Integer, Bit> taken;

  private Knapsack(Statement statement, Family<Integer, Bit> taken) {
    this.statement = statement;
    this.taken = taken;
  }

  /**
   * States the choice, in time O(m n).
   *
   * @param profit of each item
   * @param weight a dimension a row, an item a column
   * @param capacity of each dimension
   */
  public static Knapsack of(
      String name, List<Double> profit, NumberTable weight, List<Double> capacity) {
    weight.require("the table of weights", capacity.size(), profit.size());
    Model model = Model.named(name);
    List<Integer> items = Places.upTo(profit.size());
    Family<Integer, Bit> taken = model.bits("item", items);
    for (int d = 1; d <= capacity.size(); d++) {
      List<Expr> load = new ArrayList<>();
      for (int item : items) {
        load.add(taken.of(item).times(weight.at(d - 1, item - 1)));
      }
      model.require("capacity " + d, sum(load).atMost(capacity.get(d - 1)));
    }
    model.maximize("profit", sum(items, item -> taken.of(item).times(profit.get(item - 1))));
    return new Knapsack(model.snapshot(), taken);
  }

  /** The statement; its items and dimensions are counted from 1. */
  public Statement statement() {
    return statement;
  }

  /** The plan that takes these items, counted from 1. */
  public Plan plan(Set<Integer> items) {
    Places.requireKnown("item", items, taken.keys());
    Plan.Draft draft = statement.plan();
    taken.keys().forEach(item -> draft.set(taken.of(item), items.contains(item)));
    return draft.evaluate();
  }
}
