package dev.couplet.exact.plans;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.plans.PlanSearch.Found;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Watch;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;

class PlanSearchTest {
  private static final PlanSearch SEARCH = PlanSearch.standard();
  private static final Effort EFFORT = Effort.draws(1);

  private static Found search(Model model) {
    return SEARCH.search(model.snapshot(), Optional.empty(), EFFORT, Watch.none());
  }

  private static void proves(double value, Model model) {
    Found found = search(model);
    assertTrue(found.complete());
    assertEquals(value, found.best().orElseThrow().value());
    assertEquals(value, found.bound());
    assertTrue(found.best().get().feasible());
  }

  private static void refutes(Model model) {
    Found found = search(model);
    assertTrue(found.complete());
    assertTrue(found.best().isEmpty());
    assertEquals(Double.POSITIVE_INFINITY, found.bound());
  }

  /** Mycielski graphs: chromatic number k + 1, no triangle (Mycielski 1955). */
  @Test
  void mycielskiGraphsNeedOneColourMoreEachTime() {
    boolean[][] graph = {{false, true}, {true, false}};
    for (int k = 2; k <= 4; k++) {
      graph = mycielskian(graph);
      refutes(Problems.colouring(graph, k));
      proves(0, Problems.colouring(graph, k + 1));
      proves(2, Problems.clique(graph));
    }
  }

  private static boolean[][] mycielskian(boolean[][] graph) {
    int n = graph.length;
    boolean[][] larger = new boolean[2 * n + 1][2 * n + 1];
    for (int v = 0; v < n; v++) {
      for (int w = 0; w < n; w++) {
        larger[v][w] = graph[v][w];
        larger[v][n + w] = graph[v][w];
        larger[n + v][w] = graph[v][w];
      }
      larger[n + v][2 * n] = true;
      larger[2 * n][n + v] = true;
    }
    return larger;
  }

  /** Queens on squares that attack each other: 5 colours do for 5 x 5 (Johnson and Trick 1996). */
  @Test
  void queensOfFiveColoursCoverTheBoard() {
    boolean[][] attacked = new boolean[25][25];
    for (int s = 0; s < 25; s++) {
      for (int t = 0; t < 25; t++) {
        int across = Math.abs(s % 5 - t % 5);
        int down = Math.abs(s / 5 - t / 5);
        attacked[s][t] = s != t && (across == 0 || down == 0 || across == down);
      }
    }
    proves(0, Problems.colouring(attacked, 5));
    refutes(Problems.colouring(attacked, 4));
    proves(5, Problems.clique(attacked));
  }

  @Test
  void knapsacksAreWorthWhatTheTableSays() {
    SplittableRandom random = new SplittableRandom(1);
    for (int instance = 0; instance < 20; instance++) {
      double[] values = random.ints(24, 1, 100).asDoubleStream().toArray();
      double[] weights = random.ints(24, 1, 40).asDoubleStream().toArray();
      double[] table = new double[201];
      for (int i = 0; i < values.length; i++) {
        for (int room = 200; room >= weights[i]; room--) {
          table[room] = Math.max(table[room], table[room - (int) weights[i]] + values[i]);
        }
      }
      proves(table[200], Problems.knapsack(values, new double[][] {weights}, new double[] {200}));
    }
  }

  /** Two agents: the dynamic programme over the first one's load leaves the rest to the other. */
  @Test
  void assignmentsToTwoAgentsAgreeWithTheTable() {
    SplittableRandom random = new SplittableRandom(2);
    for (int instance = 0; instance < 20; instance++) {
      int jobs = 22;
      double[][] profits = new double[2][];
      double[][] loads = new double[2][];
      for (int agent = 0; agent < 2; agent++) {
        profits[agent] = random.ints(jobs, 1, 60).asDoubleStream().toArray();
        loads[agent] = random.ints(jobs, 5, 25).asDoubleStream().toArray();
      }
      proves(
          bestOfTwo(profits, loads, 170, 180),
          Problems.assignment(profits, loads, new double[] {170, 180}));
    }
  }

  private static double bestOfTwo(double[][] profits, double[][] loads, int first, int second) {
    double[][] table = new double[first + 1][second + 1];
    for (double[] row : table) {
      Arrays.fill(row, Double.NEGATIVE_INFINITY);
    }
    table[0][0] = 0;
    for (int job = 0; job < profits[0].length; job++) {
      double[][] next = new double[first + 1][second + 1];
      for (int a = 0; a <= first; a++) {
        for (int b = 0; b <= second; b++) {
          int one = a - (int) loads[0][job];
          int two = b - (int) loads[1][job];
          double toOne = one < 0 ? Double.NEGATIVE_INFINITY : table[one][b] + profits[0][job];
          double toTwo = two < 0 ? Double.NEGATIVE_INFINITY : table[a][two] + profits[1][job];
          next[a][b] = Math.max(toOne, toTwo);
        }
      }
      table = next;
    }
    return Arrays.stream(table).flatMapToDouble(Arrays::stream).max().orElseThrow();
  }

  /** Held and Karp (1962): the shortest way to each city through each set of others. */
  @Test
  void toursAreAsLongAsTheTableSays() {
    for (int cities = 6; cities <= 10; cities++) {
      long[][] distances = cities(cities);
      proves(shortest(distances), Problems.tour(distances));
    }
  }

  private static long[][] cities(int count) {
    SplittableRandom random = new SplittableRandom(count);
    int[] x = random.ints(count, 0, 1000).toArray();
    int[] y = random.ints(count, 0, 1000).toArray();
    long[][] distances = new long[count][count];
    for (int a = 0; a < count; a++) {
      for (int b = 0; b < count; b++) {
        distances[a][b] = Math.round(StrictMath.hypot(x[a] - x[b], y[a] - y[b]));
      }
    }
    return distances;
  }

  private static long shortest(long[][] distances) {
    int n = distances.length;
    long[][] way = new long[1 << n][n];
    for (long[] row : way) {
      Arrays.fill(row, Integer.MAX_VALUE);
    }
    way[1][0] = 0;
    for (int seen = 1; seen < 1 << n; seen++) {
      for (int a = 0; a < n; a++) {
        for (int b = 1; b < n; b++) {
          int more = seen | 1 << b;
          if (more != seen) {
            way[more][b] = Math.min(way[more][b], way[seen][a] + distances[a][b]);
          }
        }
      }
    }
    long best = Integer.MAX_VALUE;
    for (int a = 1; a < n; a++) {
      best = Math.min(best, way[(1 << n) - 1][a] + distances[a][0]);
    }
    return best;
  }

  @Test
  void decimalsAreComparedAsTheyAreWritten() {
    Model model = Model.named("decimals");
    Choice<String> choice = model.choice("offer", List.of("three", "one and two"));
    Bit dearer = model.bit("dearer");
    model.minimize(
        "price",
        sum(
            choice.is("three").times(0.3),
            choice.is("one and two").times(0.1),
            choice.is("one and two").times(0.2),
            dearer.times(1e-7)));
    Found found = search(model);
    assertTrue(found.complete());
    assertEquals(0.3, found.best().orElseThrow().value(), 1e-15);
    assertFalse(found.best().get().value(dearer));
  }

  @Test
  void costsOfManyDigitsAreBoundedFromBelow() {
    SplittableRandom random = new SplittableRandom(3);
    Model model = Model.named("many digits");
    List<Expr> parts = new ArrayList<>();
    double sumOfNegative = 0;
    for (int i = 0; i < 12; i++) {
      double cost = random.nextDouble() * StrictMath.pow(10, random.nextInt(-6, 7)) - 1;
      parts.add(model.bit("x" + i).times(cost));
      sumOfNegative += Math.min(0, cost);
    }
    model.minimize("sum", sum(parts));
    Found found = search(model);
    assertTrue(found.complete());
    assertEquals(sumOfNegative, found.best().orElseThrow().value(), 1e-9);
    assertTrue(found.bound() <= sumOfNegative);
    assertEquals(sumOfNegative, found.bound(), 1e-5);
  }

  @Test
  void theSameSearchTwiceGivesTheSame() {
    Model model = Problems.tour(cities(8));
    PlanSearch limited = SEARCH.nodes(100);
    Found one = limited.search(model.snapshot(), Optional.empty(), EFFORT, Watch.none());
    Found other =
        limited.search(model.snapshot(), Optional.empty(), EFFORT.seed(9).threads(2), Watch.none());
    assertEquals(one.bound(), other.bound());
    assertEquals(one.best().map(Plan::value), other.best().map(Plan::value));
    assertEquals(100, one.nodes());
    assertFalse(one.complete());
  }

  @Test
  void theDeadlineIsSeenWithinSoManyLooks() {
    AtomicLong looks = new AtomicLong();
    Model model = Problems.tour(cities(11));
    Watch watch = Watch.none().clock(() -> looks.incrementAndGet() * 1_000_000);
    Effort effort = Effort.within(Duration.ofMillis(40));
    Found found = SEARCH.search(model.snapshot(), Optional.empty(), effort, watch);
    assertEquals(End.DEADLINE, found.end());
    assertFalse(found.complete());
    assertTrue(looks.get() <= 50, looks + " looks");
    assertTrue(found.bound() > 0);
  }

  @Test
  void aStopBeforeTheStartIsHonoured() {
    Watch.StopSignal stop = Watch.StopSignal.create();
    stop.stop();
    Model model = Problems.tour(cities(8));
    Found found = SEARCH.search(model.snapshot(), Optional.empty(), EFFORT, Watch.stop(stop));
    assertEquals(End.STOPPED, found.end());
    assertEquals(0, found.nodes());
    assertFalse(found.complete());
    assertTrue(found.bound() <= shortest(cities(8)));
  }

  @Test
  void aTargetEndsTheSearchWithTheFirstPlanThatReachesIt() {
    Model model = Problems.tour(cities(10));
    long target = 2 * shortest(cities(10));
    Found found =
        SEARCH.search(model.snapshot(), Optional.empty(), EFFORT.target(target), Watch.none());
    assertEquals(End.TARGET, found.end());
    assertTrue(found.best().orElseThrow().value() <= target);
  }

  @Test
  void progressTellsPlanAndBound() {
    List<Watch.Progress> seen = new ArrayList<>();
    Model model = Problems.tour(cities(9));
    AtomicLong now = new AtomicLong();
    Watch watch = Watch.none().clock(() -> now.addAndGet(100_000_000)).progress(seen::add);
    Found found = SEARCH.search(model.snapshot(), Optional.empty(), EFFORT, watch);
    assertTrue(found.complete());
    assertFalse(seen.isEmpty());
    for (Watch.Progress progress : seen) {
      assertTrue(progress.bound().orElseThrow() <= shortest(cities(9)));
      assertTrue(progress.best().orElse(Double.MAX_VALUE) >= shortest(cities(9)));
    }
  }

  @Test
  void whatIsTooLargeIsRefused() {
    Model model = Model.named("large");
    List<Integer> options = Problems.upTo(1000);
    Choice<Integer> before = model.choice("choice", options);
    List<Expr> parts = new ArrayList<>();
    for (int d = 0; d < 20; d++) {
      Choice<Integer> next = model.choice("choice " + d, options);
      parts.add(before.is(0).times(next.is(1)));
      before = next;
    }
    model.minimize("sum", sum(parts));
    assertFalse(SEARCH.fits(model.snapshot()));
    assertThrows(IllegalArgumentException.class, () -> search(model));
    assertThrows(IllegalArgumentException.class, () -> SEARCH.nodes(0));
  }
}
