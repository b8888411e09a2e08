package dev.couplet.bench.models;

import static dev.couplet.bench.models.Formulation.assertInfeasible;
import static dev.couplet.bench.models.Formulation.assertOptimum;
import static dev.couplet.bench.models.Formulation.digits;
import static dev.couplet.bench.models.Formulation.in;
import static dev.couplet.bench.models.Formulation.least;
import static dev.couplet.bench.models.Formulation.productBits;
import static dev.couplet.bench.models.Formulation.words;
import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/**
 * Partitions, programmes, covers, packings and satisfiability, with the published number of spins,
 * against brute force.
 *
 * <p>Source: Lucas, "Ising formulations of many NP problems" (2014), sections 2 to 6; section
 * numbers and counts from memory.
 */
class PackingFormulationsTest {
  private static final double NONE = Double.POSITIVE_INFINITY;

  private static List<Integer> upTo(int n) {
    return IntStream.range(0, n).boxed().toList();
  }

  /** Section 2.1: N spins. */
  @Test
  void numberPartitioning() {
    int[] numbers = {25, 7, 13, 31, 42, 17, 21, 9};
    int n = numbers.length;
    int total = IntStream.of(numbers).sum();
    Model model = Model.named("number partitioning");
    Family<Integer, Bit> x = model.bits("x", upTo(n));
    Expr difference = sum(upTo(n), i -> x.of(i).times(2 * numbers[i])).minus(total);
    model.minimize("difference squared", difference.times(difference));
    double least =
        least(
            n,
            s -> {
              double d = upTo(n).stream().mapToInt(i -> in(s, i) ? numbers[i] : -numbers[i]).sum();
              return d * d;
            });
    assertTrue(least > 0, "an odd total cannot be halved");
    assertOptimum(least, n, model.snapshot());
  }

  /** Section 3: N spins for maximise c x, S x = b, x in {0, 1}. */
  @Test
  void binaryProgrammes() {
    int[][] rows = {{1, 2, 0, 3, 1, -1}, {2, 0, 1, 1, -2, 1}};
    int[] right = {4, 2};
    int[] worth = {3, -1, 4, 2, 5, -2};
    int n = worth.length;
    Model model = Model.named("binary programme");
    Family<Integer, Bit> x = model.bits("x", upTo(n));
    for (int r = 0; r < rows.length; r++) {
      int[] row = rows[r];
      model.require("row " + r, sum(upTo(n), i -> x.of(i).times(row[i])).exactly(right[r]));
    }
    model.maximize("worth", sum(upTo(n), i -> x.of(i).times(worth[i])));
    double least =
        least(
            n,
            s ->
                dot(rows[0], s) == right[0] && dot(rows[1], s) == right[1] ? -dot(worth, s) : NONE);
    assertOptimum(-least, n, model.snapshot());
  }

  private static int dot(int[] numbers, int subset) {
    return IntStream.range(0, numbers.length).map(i -> in(subset, i) ? numbers[i] : 0).sum();
  }

  /** Section 4.1: N spins, N subsets; every element is in exactly one that is chosen. */
  @Test
  void exactCover() {
    int[] subsets = {0b00011, 0b01100, 0b10000, 0b11100, 0b00110, 0b11001};
    assertOptimum(0, 6, exactCover(subsets, 5).snapshot());
    int[] without = {0b00011, 0b01100, 0b00110, 0b11000};
    assertEquals(NONE, least(4, s -> covers(without, s, 5, true) ? 0 : NONE));
    assertInfeasible(4, exactCover(without, 5).snapshot());
  }

  private static Model exactCover(int[] subsets, int elements) {
    Model model = Model.named("exact cover");
    Family<Integer, Bit> x = model.bits("x", upTo(subsets.length));
    for (int e = 0; e < elements; e++) {
      model.require("element " + e, sum(containing(subsets, e), x::of).exactly(1));
    }
    return model;
  }

  private static List<Integer> containing(int[] subsets, int element) {
    return upTo(subsets.length).stream().filter(i -> in(subsets[i], element)).toList();
  }

  private static boolean covers(int[] subsets, int chosen, int elements, boolean once) {
    return upTo(elements).stream()
        .mapToLong(e -> containing(subsets, e).stream().filter(i -> in(chosen, i)).count())
        .allMatch(count -> once ? count == 1 : count >= 1);
  }

  /** Section 4.2: N spins. */
  @Test
  void setPacking() {
    int[] subsets = {0b000011, 0b000110, 0b001100, 0b110000, 0b100001, 0b011000, 0b000100};
    int n = subsets.length;
    Model model = Model.named("set packing");
    Family<Integer, Bit> x = model.bits("x", upTo(n));
    for (int e = 0; e < 6; e++) {
      model.require("element " + e, sum(containing(subsets, e), x::of).atMost(1));
    }
    model.maximize("sets", sum(x.decisions()));
    double least =
        least(
            n,
            s ->
                upTo(n).stream().allMatch(i -> disjoint(subsets, s, i))
                    ? -Integer.bitCount(s)
                    : NONE);
    assertOptimum(-least, n, model.snapshot());
  }

  private static boolean disjoint(int[] subsets, int chosen, int i) {
    return IntStream.range(0, i)
        .allMatch(j -> !in(chosen, i) || !in(chosen, j) || (subsets[i] & subsets[j]) == 0);
  }

  /** Section 4.4: three spins a clause; a clause and a literal in it that holds are a vertex. */
  @Test
  void satisfiability() {
    int[][] satisfiable = {{1, 2, 3}, {-1, -2, 4}, {-3, 2, -4}, {1, -2, -3}, {-1, 3, 4}};
    int[][] allSigns = new int[8][];
    for (int c = 0; c < 8; c++) {
      allSigns[c] = new int[] {in(c, 0) ? 1 : -1, in(c, 1) ? 2 : -2, in(c, 2) ? 3 : -3};
    }
    assertEquals(5, satisfied(satisfiable, 4));
    assertOptimum(5, 15, independent(satisfiable).snapshot());
    assertEquals(7, satisfied(allSigns, 3));
    assertOptimum(7, 24, independent(allSigns).snapshot());
  }

  private static Model independent(int[][] clauses) {
    Model model = Model.named("satisfiability");
    Family<Integer, Bit> holds = model.bits("vertex", upTo(3 * clauses.length));
    for (int c = 0; c < clauses.length; c++) {
      int first = 3 * c;
      model.require("clause " + c, sum(upTo(3), k -> holds.of(first + k)).atMost(1));
    }
    for (int v = 0; v < 3 * clauses.length; v++) {
      for (int w = 0; w < v; w++) {
        if (clauses[v / 3][v % 3] == -clauses[w / 3][w % 3]) {
          model.require(v + " contradicts " + w, sum(holds.of(v), holds.of(w)).atMost(1));
        }
      }
    }
    model.maximize("clauses", sum(holds.decisions()));
    return model;
  }

  private static double satisfied(int[][] clauses, int variables) {
    return -least(
        variables,
        s ->
            -IntStream.range(0, clauses.length)
                .filter(
                    c -> IntStream.of(clauses[c]).anyMatch(l -> in(s, Math.abs(l) - 1) == l > 0))
                .count());
  }

  /**
   * Section 5.1: N spins and n floor(1 + log2 N) for the numbers of sets that hold an element. Here
   * "at least one" is a product, which takes one bit less.
   */
  @Test
  void setCover() {
    int[] subsets = {0b000111, 0b001110, 0b011100, 0b111000, 0b110001, 0b100011, 0b101010};
    int n = subsets.length;
    Model model = Model.named("set cover");
    Family<Integer, Bit> x = model.bits("x", upTo(n));
    int extra = 0;
    for (int e = 0; e < 6; e++) {
      List<Integer> containing = containing(subsets, e);
      model.require("element " + e, sum(containing, x::of).atLeast(1));
      extra += productBits(containing.size());
    }
    model.minimize("sets", sum(x.decisions()));
    double least = least(n, s -> covers(subsets, s, 6, false) ? Integer.bitCount(s) : NONE);
    assertTrue(extra <= 6 * digits(n), "no more than published");
    assertOptimum(least, n + extra, model.snapshot());
  }

  /** Section 5.2: N + floor(1 + log2 W) spins for whole weights. */
  @Test
  void knapsack() {
    int[] weight = {5, 4, 6, 3, 7, 2};
    int[] worth = {10, 40, 30, 50, 35, 8};
    int capacity = 12;
    NumberTable weights = NumberTable.of(1, 6, IntStream.of(weight).asDoubleStream().toArray());
    List<Double> profit = IntStream.of(worth).asDoubleStream().boxed().toList();
    Knapsack model = Knapsack.of("knapsack", profit, weights, List.of((double) capacity));
    double least = least(6, s -> dot(weight, s) <= capacity ? -dot(worth, s) : NONE);
    int bits = 6 + (int) Math.floor(1 + Math.log(capacity) / Math.log(2));
    assertOptimum(-least, bits, model.statement());
  }

  /** Section 6.3: m N + (m - 1) floor(1 + log2 M) spins, M above every difference of loads. */
  @Test
  void jobSequencing() {
    int[] lengths = {7, 5, 4, 3, 6, 2};
    int total = IntStream.of(lengths).sum();
    int machines = 3;
    Model model = Model.named("job sequencing");
    Family<Integer, Choice<Integer>> on = model.choices("machine of", upTo(6), upTo(machines));
    List<Expr> load = new ArrayList<>();
    for (int m : upTo(machines)) {
      load.add(sum(upTo(6), job -> on.of(job).is(m).times(lengths[job])));
    }
    for (int m = 1; m < machines; m++) {
      model.require("machine " + m + " no longer than the first", load.get(m).atMost(load.get(0)));
    }
    model.minimize("longest", load.get(0));
    double least =
        words(6, machines)
            .mapToDouble(
                word ->
                    IntStream.range(0, machines)
                        .map(
                            m ->
                                IntStream.range(0, 6)
                                    .filter(j -> word[j] == m)
                                    .map(j -> lengths[j])
                                    .sum())
                        .max()
                        .orElseThrow())
            .min()
            .orElseThrow();
    assertOptimum(least, machines * 6 + (machines - 1) * digits(total), model.snapshot());
  }
}
