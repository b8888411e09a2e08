package dev.couplet.bench.instances;

import dev.couplet.bench.models.Knapsack;
import dev.couplet.bench.models.NumberTable;
import dev.couplet.form.TokenReader;
import java.io.IOException;
import java.util.List;

/**
 * OR-Library multi-dimensional knapsack: the number of problems; for each the numbers of items n
 * and of dimensions m and the optimum (0 if it is not known), the n profits, the weights dimension
 * by dimension, and the m capacities. The profit is to be maximised.
 *
 * <p>Source: Beasley, "OR-Library: distributing test problems by electronic mail" (1990); the
 * problems of Petersen (1967).
 */
final class KnapsackText implements Format {
  private static final int LARGEST = 1 << 20;

  /** One of the problems, with the optimum that the file states. */
  record Problem(List<Double> profit, NumberTable weight, List<Double> capacity, double optimum) {}

  @Override
  public String kind() {
    return "knapsack";
  }

  @Override
  public boolean recognises(List<String> head) {
    return Format.numbersPerLine(head, 1, 3)
        && head.size() > 2
        && Format.numberRow(head.get(2), Format.firstNumber(head.get(1), LARGEST));
  }

  @Override
  public Instance read(Source source) throws IOException {
    return source.oneOfSeveral(
        KnapsackText::readProblem,
        (name, read) ->
            Knapsack.of(name, read.profit(), read.weight(), read.capacity()).statement());
  }

  static Problem readProblem(TokenReader text) throws IOException {
    text.seekToken("the line of sizes");
    int items = text.integer("the number of items", 1, LARGEST);
    int dimensions = text.integer("the number of dimensions", 1, LARGEST);
    double optimum = text.number("the optimum");
    List<Double> profit = NumberList.readList(text, items, "the profits");
    NumberTable weight = NumberList.readTable(text, dimensions, items, "the table of weights");
    List<Double> capacity = NumberList.readList(text, dimensions, "the capacities");
    return new Problem(profit, weight, capacity, optimum);
  }
}
