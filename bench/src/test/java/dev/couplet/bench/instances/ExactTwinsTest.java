package dev.couplet.bench.instances;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.PublishedData.Published;
import dev.couplet.bench.models.HeldKarp;
import dev.couplet.bench.models.NumberTable;
import dev.couplet.bench.models.Operation;
import dev.couplet.form.TokenReader;
import dev.couplet.host.CompactGraph;
import java.io.IOException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.chocosolver.solver.Model;
import org.chocosolver.solver.variables.IntVar;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * The numbers that our readers take from published files have the published optimum, by exact
 * methods that share nothing with our models.
 */
class ExactTwinsTest {
  private interface Reading<T> {
    T read(TokenReader text) throws IOException;
  }

  private static <T> T parsed(Published row, Reading<T> reading) throws IOException {
    return new TextFile(row.path()).read(text -> reading.read(new TokenReader(row.name(), text)));
  }

  private static Published row(String family, String name) {
    return PublishedData.of(family).stream()
        .filter(row -> row.name().equals(name))
        .findFirst()
        .orElseThrow();
  }

  /** By dynamic programming. */
  @ParameterizedTest
  @ValueSource(strings = {"burma14", "ulysses16", "gr17"})
  void shortestTours(String name) throws IOException {
    Published row = row("tsp", name);
    assertEquals(row.best(), HeldKarp.length(parsed(row, TspText::read)));
  }

  /** By a depth-first search that gives a job up once even the best agents cannot catch up. */
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5})
  void generalisedAssignments(int item) throws IOException {
    Published row = row("gap", "gap1 c515-" + item);
    GapText.Problem problem =
        parsed(
            row,
            text -> {
              text.seekToken("the number of problems");
              int problems = text.integer("the number of problems", 5, 5);
              List<GapText.Problem> all = new ArrayList<>();
              while (all.size() < problems) {
                all.add(GapText.readProblem(text));
              }
              return all.get(item - 1);
            });
    double[] free = problem.capacity().stream().mapToDouble(Double::doubleValue).toArray();
    double[] ahead = new double[problem.profit().columns() + 1];
    for (int job = ahead.length - 2; job >= 0; job--) {
      double most = 0;
      for (int agent = 0; agent < free.length; agent++) {
        most = Math.max(most, problem.profit().at(agent, job));
      }
      ahead[job] = ahead[job + 1] + most;
    }
    double[] best = {Double.NEGATIVE_INFINITY};
    assign(problem, 0, 0, free, ahead, best);
    assertEquals(row.best(), best[0]);
  }

  private static void assign(
      GapText.Problem problem,
      int job,
      double profit,
      double[] free,
      double[] ahead,
      double[] best) {
    if (job == problem.profit().columns()) {
      best[0] = Math.max(best[0], profit);
      return;
    }
    for (int agent = 0; agent < free.length; agent++) {
      double with = profit + problem.profit().at(agent, job);
      double need = problem.need().at(agent, job);
      if (need <= free[agent] && with + ahead[job + 1] > best[0]) {
        free[agent] -= need;
        assign(problem, job + 1, with, free, ahead, best);
        free[agent] += need;
      }
    }
  }

  /** All permutations, cut where what is placed costs as much as the best already. */
  @Test
  void quadraticAssignment() throws IOException {
    Published row = row("qap", "tai10a");
    QapText.Matrices read = parsed(row, QapText::read);
    double[] best = {Double.POSITIVE_INFINITY};
    place(read, new int[10], 0, 0, best);
    assertEquals(row.best(), best[0]);
  }

  private static void place(QapText.Matrices m, int[] p, int placed, double cost, double[] best) {
    if (cost >= best[0]) {
      return;
    }
    if (placed == p.length) {
      best[0] = cost;
      return;
    }
    for (int place = 0; place < p.length; place++) {
      int candidate = place;
      if (Arrays.stream(p, 0, placed).noneMatch(taken -> taken == candidate)) {
        double added = m.a().at(placed, placed) * m.b().at(place, place);
        for (int i = 0; i < placed; i++) {
          added += m.a().at(i, placed) * m.b().at(p[i], place);
          added += m.a().at(placed, i) * m.b().at(place, p[i]);
        }
        p[placed] = place;
        place(m, p, placed + 1, cost + added, best);
      }
    }
  }

  /** By colouring the vertex that sees the most colours first: Brelaz (1979), from memory. */
  @ParameterizedTest
  @ValueSource(strings = {"myciel3", "myciel4", "myciel5", "queen5_5", "queen6_6"})
  void chromaticNumbers(String name) throws IOException {
    Published row = row("colour", name);
    CompactGraph graph = parsed(row, DimacsGraph::read);
    int chromatic = (int) row.best();
    assertTrue(colourable(graph, chromatic, new int[graph.vertices()], 0));
    assertFalse(colourable(graph, chromatic - 1, new int[graph.vertices()], 0));
  }

  /** No fewer colours than the vertices of a clique. */
  @ParameterizedTest
  @ValueSource(strings = {"huck", "jean", "miles250", "queen5_5"})
  void chromaticNumbersThatAreThoseOfCliques(String name) throws IOException {
    Published row = row("colour", name);
    CompactGraph graph = parsed(row, DimacsGraph::read);
    List<Integer> all = new ArrayList<>();
    for (int v = 0; v < graph.vertices(); v++) {
      all.add(v);
    }
    assertTrue(hasClique(graph, all, (int) row.best()));
    assertFalse(hasClique(graph, all, (int) row.best() + 1));
  }

  private static boolean hasClique(CompactGraph graph, List<Integer> among, int size) {
    if (size == 0) {
      return true;
    }
    for (int k = 0; k + size <= among.size(); k++) {
      int first = among.get(k);
      List<Integer> rest =
          among.subList(k + 1, among.size()).stream()
              .filter(v -> graph.adjacent(first, v))
              .toList();
      if (hasClique(graph, rest, size - 1)) {
        return true;
      }
    }
    return false;
  }

  private static boolean colourable(CompactGraph graph, int colours, int[] colourOf, int used) {
    int next = -1;
    int most = -1;
    for (int v = 0; v < colourOf.length; v++) {
      int seen = Long.bitCount(seen(graph, colourOf, v)) * 1000 + graph.degree(v);
      if (colourOf[v] == 0 && seen > most) {
        next = v;
        most = seen;
      }
    }
    if (next < 0) {
      return true;
    }
    long seen = seen(graph, colourOf, next);
    for (int colour = 1; colour <= Math.min(colours, used + 1); colour++) {
      if ((seen >> colour & 1) == 0) {
        colourOf[next] = colour;
        if (colourable(graph, colours, colourOf, Math.max(used, colour))) {
          return true;
        }
      }
    }
    colourOf[next] = 0;
    return false;
  }

  private static long seen(CompactGraph graph, int[] colourOf, int vertex) {
    long seen = 0;
    for (int neighbour : graph.neighbours(vertex)) {
      seen |= colourOf[neighbour] == 0 ? 0 : 1L << colourOf[neighbour];
    }
    return seen;
  }

  /** By a general-purpose constraint solver with a start an operation; Fisher and Thompson 1963. */
  @Test
  void jobShopOfSix() throws IOException {
    Published row = row("jobshop", "ft06");
    List<Operation> all = parsed(row, JobShopText::read).stream().flatMap(List::stream).toList();
    Model model = new Model();
    IntVar end = model.intVar(0, 100);
    IntVar[] start = model.intVarArray(all.size(), 0, 100);
    for (int a = 0; a < start.length; a++) {
      Operation one = all.get(a);
      model.arithm(end, "-", start[a], ">=", one.time()).post();
      for (int b = 0; b < start.length; b++) {
        Operation other = all.get(b);
        if (one.job() == other.job() && one.step() < other.step()) {
          model.arithm(start[b], "-", start[a], ">=", one.time()).post();
        } else if (a < b && one.job() != other.job() && one.machine() == other.machine()) {
          var before = model.arithm(start[b], "-", start[a], ">=", one.time());
          var after = model.arithm(start[a], "-", start[b], ">=", other.time());
          model.or(before, after).post();
        }
      }
    }
    model.getSolver().limitTime("60s");
    var best = model.getSolver().findOptimalSolution(end, false);
    assertFalse(model.getSolver().isStopCriterionMet());
    assertEquals(row.best(), best.getIntVal(end));
  }

  /** Nothing ends before the longest job, or the most loaded machine: Lawrence 1984. */
  @ParameterizedTest
  @ValueSource(strings = {"la01", "la05"})
  void jobShopsWhoseLoadIsTheOptimum(String name) throws IOException {
    Published row = row("jobshop", name);
    Map<Integer, Integer> load = new TreeMap<>();
    for (List<Operation> job : parsed(row, JobShopText::read)) {
      for (Operation operation : job) {
        load.merge(operation.machine(), operation.time(), Integer::sum);
        load.merge(-operation.job(), operation.time(), Integer::sum);
      }
    }
    assertEquals(
        row.best(), load.values().stream().mapToInt(Integer::intValue).max().orElseThrow());
  }

  @Test
  void distancesOfOneFileAreTheTableOfItsBook() throws IOException {
    NumberTable distances = parsed(row("tsp", "burma14"), TspText::read);
    assertEquals(153, distances.at(0, 1), "1 to 2, worked out from 16.47 96.10 and 16.47 94.44");
  }
}
