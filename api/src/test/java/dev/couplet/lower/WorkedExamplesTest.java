package dev.couplet.lower;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/**
 * Problems with published forms and answers, stated in the language, lowered and enumerated.
 *
 * <p>Source: Glover, Kochenberger and Du, "A tutorial on formulating and using QUBO models",
 * arXiv:1811.11538; section numbers as there. The published matrices are symmetric, x'Qx, so that
 * an off-diagonal entry is half the coefficient of its pair.
 */
class WorkedExamplesTest {
  private static final int[][] FIVE_VERTEX_EDGES = {{1, 2}, {1, 3}, {2, 4}, {3, 4}, {3, 5}, {4, 5}};

  @Test
  void quadraticObjectiveOfSection2() {
    Model model = Model.named("section 2");
    List<Bit> x = bits(model, 4);
    model.minimize(
        "y",
        sum(
            x.get(0).times(-5),
            x.get(1).times(-3),
            x.get(2).times(-8),
            x.get(3).times(-6),
            x.get(0).times(x.get(1)).times(4),
            x.get(0).times(x.get(2)).times(8),
            x.get(1).times(x.get(2)).times(2),
            x.get(2).times(x.get(3)).times(10)));
    Lowered lowered = Lowering.standard().lower(model);
    assertForm(
        lowered.qubo(),
        0,
        new double[][] {{-5, 2, 4, 0}, {2, -3, 1, 0}, {4, 1, -8, 5}, {0, 0, 5, -6}});
    assertOptima(lowered, -11, 1, "1001");
  }

  @Test
  void numberPartitioningOfSection31() {
    int[] numbers = {25, 7, 13, 31, 42, 17, 21, 10};
    Model model = Model.named("section 3.1");
    List<Bit> x = bits(model, numbers.length);
    List<Expr> signed = new ArrayList<>();
    for (int i = 0; i < numbers.length; i++) {
      signed.add(x.get(i).times(2 * numbers[i]));
    }
    Expr difference = Expr.constant(166).minus(sum(signed));
    model.minimize("difference squared", difference.times(difference));
    Qubo qubo = Lowering.standard().lower(model).qubo();
    double[] diagonal = {-3525, -1113, -1989, -4185, -5208, -2533, -3045, -1560};
    assertEquals(166.0 * 166, qubo.constant(), "c^2");
    for (int i = 0; i < numbers.length; i++) {
      assertEquals(4 * diagonal[i], qubo.linear(i), "difference^2 = c^2 + 4y");
      for (int j = i + 1; j < numbers.length; j++) {
        assertEquals(4.0 * 2 * numbers[i] * numbers[j], qubo.pair(i, j));
      }
    }
    assertOptima(Lowering.standard().lower(model), 0, 4, "00011001");
  }

  @Test
  void maximumCutOfSection32() {
    Model model = Model.named("section 3.2");
    List<Bit> x = bits(model, 5);
    List<Expr> cut = new ArrayList<>();
    for (int[] edge : FIVE_VERTEX_EDGES) {
      Bit a = x.get(edge[0] - 1);
      Bit b = x.get(edge[1] - 1);
      cut.add(a.plus(b).minus(a.times(b).times(2)));
    }
    model.maximize("cut", sum(cut));
    Lowered lowered = Lowering.standard().lower(model);
    double[] degree = {2, 2, 3, 3, 2};
    for (int i = 0; i < 5; i++) {
      assertEquals(-degree[i], lowered.qubo().linear(i));
    }
    assertEquals(6, lowered.qubo().pairs());
    assertOptima(lowered, 5, 4, "01100");
  }

  @Test
  void minimumVertexCoverOfSection41() {
    Model model = Model.named("section 4.1");
    List<Bit> x = bits(model, 5);
    for (int[] edge : FIVE_VERTEX_EDGES) {
      model.require(
          "edge " + edge[0] + " " + edge[1],
          x.get(edge[0] - 1).plus(x.get(edge[1] - 1)).atLeast(1));
    }
    model.minimize("size", sum(x));
    Lowered lowered = Lowering.standard().with(Weights.fixed(8)).lower(model);
    double[][] published = new double[5][5];
    double[] diagonal = {-15, -15, -23, -23, -15};
    for (int i = 0; i < 5; i++) {
      published[i][i] = diagonal[i];
    }
    for (int[] edge : FIVE_VERTEX_EDGES) {
      published[edge[0] - 1][edge[1] - 1] = 4;
      published[edge[1] - 1][edge[0] - 1] = 4;
    }
    assertForm(lowered.qubo(), 48, published);
    assertOptima(lowered, 3, 4, "01101");
    assertOptima(Lowering.standard().lower(model), 3, 4, "01101");
  }

  @Test
  void setPackingOfSection42() {
    Model model = Model.named("section 4.2");
    List<Bit> x = bits(model, 4);
    model.require("first", sum(x.get(0), x.get(2), x.get(3)).atMost(1));
    model.require("second", sum(x.get(0), x.get(1)).atMost(1));
    model.maximize("number", sum(x));
    Lowered lowered = Lowering.standard().with(Weights.fixed(6)).lower(model);
    assertForm(
        lowered.qubo().times(-1),
        0,
        new double[][] {{1, -3, -3, -3}, {-3, 1, 0, 0}, {-3, 0, 1, -3}, {-3, 0, -3, 1}});
    assertOptima(lowered, 2, 2, "0110");
    assertOptima(Lowering.standard().lower(model), 2, 2, "0110");
  }

  @Test
  void setPartitioningOfSection51() {
    Model model = Model.named("section 5.1");
    List<Bit> x = bits(model, 6);
    int[][] members = {{1, 3, 6}, {2, 3, 5, 6}, {3, 4, 5}, {1, 2, 4, 6}};
    for (int[] set : members) {
      model.require(
          "set " + model.snapshot().rules().size(),
          sum(IntStream.of(set).boxed().toList(), i -> x.get(i - 1)).exactly(1));
    }
    double[] costs = {3, 2, 1, 1, 3, 2};
    model.minimize(
        "cost", sum(IntStream.range(0, 6).boxed().toList(), i -> x.get(i).times(costs[i])));
    Lowered lowered = Lowering.standard().with(Weights.fixed(10)).lower(model);
    assertForm(
        lowered.qubo(),
        40,
        new double[][] {
          {-17, 10, 10, 10, 0, 20},
          {10, -18, 10, 10, 10, 20},
          {10, 10, -29, 10, 20, 20},
          {10, 10, 10, -19, 10, 10},
          {0, 10, 20, 10, -17, 10},
          {20, 20, 20, 10, 10, -28}
        });
    assertOptima(lowered, 6, 1, "100010");
    assertOptima(Lowering.standard().lower(model), 6, 1, "100010");
  }

  @Test
  void colouringOfSection52() {
    Model model = Model.named("section 5.2");
    List<Integer> vertices = List.of(1, 2, 3, 4, 5);
    List<String> colours = List.of("first", "second", "third");
    Family<Integer, Choice<String>> colour = model.choices("colour of", vertices, colours);
    int[][] edges = {{1, 2}, {1, 5}, {2, 3}, {2, 4}, {2, 5}, {3, 4}, {4, 5}};
    for (int[] edge : edges) {
      for (String shade : colours) {
        model.require(
            edge[0] + " and " + edge[1] + " not both " + shade,
            colour.of(edge[0]).is(shade).implies(colour.of(edge[1]).is(shade).not()));
      }
    }
    Lowered lowered = Lowering.standard().with(Weights.fixed(4)).lower(model);
    double[][] published = new double[15][15];
    for (int v = 0; v < 5; v++) {
      for (int a = 0; a < 3; a++) {
        for (int b = 0; b < 3; b++) {
          published[3 * v + a][3 * v + b] = a == b ? -4 : 4;
        }
      }
    }
    for (int[] edge : edges) {
      for (int a = 0; a < 3; a++) {
        published[3 * (edge[0] - 1) + a][3 * (edge[1] - 1) + a] = 2;
        published[3 * (edge[1] - 1) + a][3 * (edge[0] - 1) + a] = 2;
      }
    }
    assertForm(lowered.qubo(), 20, published);
    assertOptima(lowered, 0, 6, "010100001010001");
    assertEquals(5, lowered.structure().exactlyOne().size());
  }

  private static List<Bit> bits(Model model, int count) {
    List<Bit> bits = new ArrayList<>();
    for (int i = 1; i <= count; i++) {
      bits.add(model.bit("x" + i));
    }
    return bits;
  }

  private static void assertForm(Qubo qubo, double constant, double[][] symmetric) {
    assertEquals(symmetric.length, qubo.size());
    assertEquals(constant, qubo.constant());
    for (int i = 0; i < symmetric.length; i++) {
      assertEquals(symmetric[i][i], qubo.linear(i), "linear " + i);
      for (int j = i + 1; j < symmetric.length; j++) {
        assertEquals(2 * symmetric[i][j], qubo.pair(i, j), "pair " + i + ", " + j);
      }
    }
  }

  /** Enumerates all states: the published optimum, how many reach it, and one that is published. */
  private static void assertOptima(Lowered lowered, double value, int optima, String one) {
    Qubo qubo = lowered.qubo();
    double best = Double.POSITIVE_INFINITY;
    List<State> states = new ArrayList<>();
    for (long pattern = 0; pattern < 1L << qubo.size(); pattern++) {
      State state = State.ofWords(qubo.size(), pattern);
      double energy = qubo.value(state);
      if (energy < best) {
        best = energy;
        states.clear();
      }
      if (energy == best) {
        states.add(state);
      }
    }
    assertEquals(value, lowered.valueOf(best));
    assertEquals(optima, states.size());
    assertTrue(states.contains(State.parse(one)), "the published state is optimal");
    for (State state : states) {
      Plan plan = lowered.plan(state);
      assertTrue(plan.feasible(), plan.toString());
      assertEquals(value, plan.value());
    }
  }
}
