package dev.couplet.bench.instances;

import dev.couplet.bench.models.GeneralisedAssignment;
import dev.couplet.bench.models.NumberTable;
import dev.couplet.form.TokenReader;
import java.io.IOException;
import java.util.List;

/**
 * OR-Library generalised assignment: the number of problems; for each the numbers of agents m and
 * of jobs n, the profits agent by agent, the needs likewise, and the m capacities. The profit is to
 * be maximised.
 *
 * <p>Source: Beasley, "OR-Library: distributing test problems by electronic mail" (1990); the
 * problems of Cattrysse, Salomon and Van Wassenhove (1994).
 */
final class GapText implements Format {
  private static final int MOST_AGENTS = 1 << 16;
  private static final int MOST_JOBS = 1 << 20;

  /** One of the problems. */
  record Problem(NumberTable profit, NumberTable need, List<Double> capacity) {}

  @Override
  public String kind() {
    return "gap";
  }

  @Override
  public boolean recognises(List<String> head) {
    return Format.numbersPerLine(head, 1, 2)
        && head.size() > 2
        && Format.numberRow(head.get(2), Format.lastNumber(head.get(1), MOST_JOBS));
  }

  @Override
  public Instance read(Source source) throws IOException {
    return source.oneOfSeveral(
        GapText::readProblem,
        (name, read) ->
            GeneralisedAssignment.of(name, read.profit(), read.need(), read.capacity())
                .statement());
  }

  static Problem readProblem(TokenReader text) throws IOException {
    text.seekToken("the line of sizes");
    int agents = text.integer("the number of agents", 1, MOST_AGENTS);
    int jobs = text.integer("the number of jobs", 1, MOST_JOBS);
    NumberTable profit = NumberList.readTable(text, agents, jobs, "the table of profits");
    NumberTable need = NumberList.readTable(text, agents, jobs, "the table of needs");
    return new Problem(profit, need, NumberList.readList(text, agents, "the capacities"));
  }
}
