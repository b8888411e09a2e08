package dev.couplet.bench.instances;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.PublishedData.Published;
import dev.couplet.bench.models.Clique;
import dev.couplet.bench.models.Colouring;
import dev.couplet.bench.models.GeneralisedAssignment;
import dev.couplet.bench.models.JobShop;
import dev.couplet.bench.models.Knapsack;
import dev.couplet.bench.models.NumberTable;
import dev.couplet.bench.models.Operation;
import dev.couplet.bench.models.QuadraticAssignment;
import dev.couplet.bench.models.Tour;
import dev.couplet.form.TokenReader;
import dev.couplet.host.CompactGraph;
import dev.couplet.model.Plan;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Collections;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Test;

/**
 * Every published instance with rules: an answer of the published value, entered as a plan, is
 * feasible and of that value under our model; and so it is worked out from the file directly.
 *
 * <p>Values: the data folder's table; Reinelt 1991, Burkard, Karisch and Rendl 1997, Johnson and
 * Trick 1996, Cattrysse et al. 1994, Petersen 1967, Fisher and Thompson 1963, Lawrence 1984.
 */
class PublishedModelsTest {
  private interface Check {
    void check(Published row) throws IOException;
  }

  private static void each(String family, Check check) throws IOException {
    List<Published> rows = PublishedData.of(family);
    assertFalse(rows.isEmpty());
    for (Published row : rows) {
      assertEquals("optimal", row.status());
      check.check(row);
    }
  }

  private static <T> T parsed(Path path, Reading<T> reading) throws IOException {
    return new TextFile(path).read(text -> reading.read(new TokenReader(path.toString(), text)));
  }

  private interface Reading<T> {
    T read(TokenReader text) throws IOException;
  }

  private static void assertWorth(double value, Plan plan, String name) {
    assertEquals(List.of(), plan.unmet(), name);
    assertTrue(plan.feasible(), name);
    assertEquals(value, plan.value(), name);
  }

  private static int[] array(List<Integer> numbers) {
    return numbers.stream().mapToInt(Integer::intValue).toArray();
  }

  @Test
  void tours() throws IOException {
    each(
        "tsp",
        row -> {
          NumberTable distances = parsed(row.path(), TspText::read);
          assertEquals(row.size(), distances.rows());
          List<Integer> tour = Answers.of("tsp", row.name());
          assertEquals(row.size(), new HashSet<>(tour).size());
          double length = 0;
          for (int k = 0; k < tour.size(); k++) {
            int next = tour.get((k + 1) % tour.size());
            length += distances.at(tour.get(k) - 1, next - 1);
          }
          assertEquals(row.best(), length, row.name());
          Tour model = Tour.of(row.name(), distances);
          assertEquals((row.size() - 1) * (row.size() - 1), model.statement().literals());
          assertWorth(row.best(), model.plan(tour), row.name());
        });
  }

  @Test
  void quadraticAssignments() throws IOException {
    each(
        "qap",
        row -> {
          QapText.Matrices read = parsed(row.path(), QapText::read);
          Path solution = row.path().resolveSibling(row.name() + ".sln");
          List<Integer> p =
              Files.exists(solution)
                  ? Answers.solutionFile(solution)
                  : Answers.of("qap", row.name());
          double cost = 0;
          for (int i = 0; i < p.size(); i++) {
            for (int j = 0; j < p.size(); j++) {
              cost += read.a().at(i, j) * read.b().at(p.get(i) - 1, p.get(j) - 1);
            }
          }
          assertEquals(row.best(), cost, row.name());
          QuadraticAssignment model = QuadraticAssignment.of(row.name(), read.a(), read.b());
          assertEquals(row.size() * row.size(), model.statement().literals());
          assertWorth(row.best(), model.plan(p), row.name());
        });
  }

  @Test
  void cliques() throws IOException {
    each(
        "clique",
        row -> {
          CompactGraph graph = parsed(row.path(), DimacsGraph::read);
          assertEquals(row.size(), graph.vertices());
          Set<Integer> members = new HashSet<>(Answers.of("clique", row.name()));
          assertEquals(row.best(), members.size());
          for (int u : members) {
            for (int v : members) {
              assertTrue(u == v || graph.adjacent(u - 1, v - 1), row.name());
            }
          }
          Clique model = Clique.of(row.name(), graph);
          assertWorth(row.best(), model.plan(members), row.name());
          int outside = outsider(members, graph);
          members.add(outside);
          assertFalse(model.plan(members).feasible(), "one more, not adjacent to all");
        });
  }

  private static int outsider(Set<Integer> members, CompactGraph graph) {
    for (int v = 1; v <= graph.vertices(); v++) {
      int vertex = v;
      if (members.stream().anyMatch(u -> u != vertex && !graph.adjacent(u - 1, vertex - 1))) {
        return v;
      }
    }
    throw new AssertionError("the graph is complete");
  }

  @Test
  void colourings() throws IOException {
    each(
        "colour",
        row -> {
          CompactGraph graph = parsed(row.path(), DimacsGraph::read);
          assertEquals(row.size(), graph.vertices());
          List<Integer> colours = Answers.of("colour", row.name());
          int[] edge = {-1, -1};
          graph.forEachEdge(
              (u, v) -> {
                assertFalse(colours.get(u).equals(colours.get(v)), row.name());
                edge[0] = u;
                edge[1] = v;
              });
          int chromatic = (int) row.best();
          assertEquals(chromatic, Collections.max(colours));
          Colouring model = Colouring.of(row.name(), graph, chromatic);
          Plan plan = model.plan(array(colours));
          assertWorth(0, plan, row.name());
          assertEquals(colours, java.util.Arrays.stream(model.colours(plan)).boxed().toList());
          int[] alike = array(colours);
          alike[edge[0]] = alike[edge[1]];
          assertFalse(model.plan(alike).feasible(), "an edge with both ends alike");
        });
  }

  /** Two files list every edge once, the others twice; see the data folder's table. */
  @Test
  void edgesListedTwiceCountOnce() throws IOException {
    for (Published row : PublishedData.of("colour")) {
      int expected =
          switch (row.name()) {
            case "myciel3" -> 20;
            case "myciel4" -> 71;
            case "myciel5" -> 236;
            case "queen5_5" -> 160;
            case "queen6_6" -> 290;
            case "huck" -> 301;
            case "jean" -> 254;
            case "miles250" -> 387;
            default -> throw new AssertionError(row.name());
          };
      assertEquals(expected, parsed(row.path(), DimacsGraph::read).edges(), row.name());
    }
  }

  @Test
  void generalisedAssignments() throws IOException {
    each(
        "gap",
        row -> {
          int item = row.name().charAt(row.name().length() - 1) - '0';
          GapText.Problem read =
              parsed(row.path(), text -> picked(text, item, GapText::readProblem));
          List<Integer> agents = Answers.of("gap", row.name());
          double profit = 0;
          double[] load = new double[read.profit().rows()];
          for (int job = 0; job < agents.size(); job++) {
            profit += read.profit().at(agents.get(job) - 1, job);
            load[agents.get(job) - 1] += read.need().at(agents.get(job) - 1, job);
          }
          for (int agent = 0; agent < load.length; agent++) {
            assertTrue(load[agent] <= read.capacity().get(agent), row.name());
          }
          assertEquals(row.best(), profit, row.name());
          GeneralisedAssignment model =
              GeneralisedAssignment.of(row.name(), read.profit(), read.need(), read.capacity());
          assertWorth(row.best(), model.plan(array(agents)), row.name());
        });
  }

  private static <T> T picked(TokenReader text, int item, Reading<T> reading) throws IOException {
    text.seekToken("the number of problems");
    int problems = text.integer("the number of problems", item, 100);
    assertTrue(item <= problems);
    for (int k = 1; k < item; k++) {
      reading.read(text);
    }
    return reading.read(text);
  }

  @Test
  void knapsacks() throws IOException {
    each(
        "mknap",
        row -> {
          int item = row.name().charAt(row.name().length() - 1) - '0';
          KnapsackText.Problem read =
              parsed(row.path(), text -> picked(text, item, KnapsackText::readProblem));
          assertEquals(row.best(), read.optimum(), "as the file itself says");
          Set<Integer> items = new HashSet<>(Answers.of("mknap", row.name()));
          double profit = items.stream().mapToDouble(k -> read.profit().get(k - 1)).sum();
          assertEquals(row.best(), profit, 1e-9, row.name());
          for (int d = 0; d < read.capacity().size(); d++) {
            int dimension = d;
            double load = items.stream().mapToDouble(k -> read.weight().at(dimension, k - 1)).sum();
            assertTrue(load <= read.capacity().get(d) + 1e-9, row.name());
          }
          Knapsack model = Knapsack.of(row.name(), read.profit(), read.weight(), read.capacity());
          Plan plan = model.plan(items);
          assertTrue(plan.feasible(), row.name());
          assertEquals(row.best(), plan.value(), 1e-9, row.name());
        });
  }

  @Test
  void jobShops() throws IOException {
    each(
        "jobshop",
        row -> {
          List<List<Operation>> jobs = parsed(row.path(), JobShopText::read);
          List<Integer> starts = Answers.of("jobshop", row.name());
          assertEquals(row.best(), makespan(jobs, starts), row.name());
          JobShop model = JobShop.of(row.name(), jobs);
          assertWorth(row.best(), model.plan(starts), row.name());
          List<Integer> early = new java.util.ArrayList<>(starts);
          early.set(1, starts.get(0));
          if (starts.get(0) + jobs.get(0).get(0).time() > starts.get(0)
              && starts.get(0) >= jobs.get(0).get(0).time()) {
            assertFalse(model.plan(early).feasible(), "two steps of a job at once");
          }
        });
  }

  /** The end of a schedule in which nothing overlaps; every pair of operations is looked at. */
  private static double makespan(List<List<Operation>> jobs, List<Integer> starts) {
    List<Operation> all = jobs.stream().flatMap(List::stream).toList();
    double end = 0;
    for (int a = 0; a < all.size(); a++) {
      Operation one = all.get(a);
      int ends = starts.get(a) + one.time();
      end = Math.max(end, ends);
      for (int b = 0; b < all.size(); b++) {
        Operation other = all.get(b);
        boolean sameJob = one.job() == other.job();
        if (sameJob && one.step() < other.step()) {
          assertTrue(ends <= starts.get(b), one + ", " + other);
        }
        if (a < b && !sameJob && one.machine() == other.machine()) {
          int otherEnds = starts.get(b) + other.time();
          assertTrue(ends <= starts.get(b) || otherEnds <= starts.get(a), one + ", " + other);
        }
      }
    }
    return end;
  }
}
