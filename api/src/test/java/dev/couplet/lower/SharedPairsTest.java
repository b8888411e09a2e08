package dev.couplet.lower;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.lower.Ledger.Kind;
import dev.couplet.lower.Ledger.Source;
import dev.couplet.model.Bit;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class SharedPairsTest {
  /** The squares of the correlations C_k = sum_i s_i s_(i+k) of n spins, each a source. */
  private static List<Source> correlations(int n) {
    List<Source> sources = new ArrayList<>();
    for (int k = 1; k < n; k++) {
      Polynomial.Builder sum = Polynomial.builder(n);
      for (int i = 0; i + k < n; i++) {
        sum.add(1).add(-2, i).add(-2, i + k).add(4, i, i + k);
      }
      Polynomial correlation = sum.build();
      sources.add(new Source("C" + k, Kind.OBJECTIVE, correlation.times(correlation), 1));
    }
    return sources;
  }

  private static List<Product> products(List<Source> sources) {
    List<Product> products = new ArrayList<>();
    for (int s = 0; s < sources.size(); s++) {
      int source = s;
      sources
          .get(s)
          .terms()
          .forEachTerm(
              (value, variables) -> {
                if (variables.length > 2) {
                  products.add(new Product(source, value, variables));
                }
              });
    }
    return products;
  }

  /**
   * Low-autocorrelation sequences: optimal energies from the table in Packebusch and Mertens 2016.
   * The numbers of auxiliary bits were measured with this code: one for each product of the sources
   * without sharing, since none is of more than four bits, and what is left with it.
   */
  @ParameterizedTest
  @CsvSource({
    "3, 1, 0, 0",
    "4, 2, 10, 2",
    "5, 2, 26, 4",
    "6, 7, 58, 7",
    "7, 3, 106, 13",
    "8, 8, 178, 17",
    "9, 12, 270, 25",
    "10, 13, 396, 32",
    "11, 5, 550, 43",
    "12, 10, 744, 51"
  })
  void sharingAcrossSourcesSavesAuxiliaryBits(int n, double optimum, int alone, int shared) {
    List<Source> sources = correlations(n);
    assertEquals(alone, products(sources).size());
    BitTable table = DegreeReductionProperties.table(n);
    List<Source> reduced = DegreeReduction.of(sources, Aim.AUXILIARIES, table);
    assertEquals(shared, table.size() - n);
    Polynomial form = DegreeReductionProperties.sum(reduced, table.size());
    assertTrue(form.degree() <= 2);
    Polynomial energy = DegreeReductionProperties.sum(sources, n);
    AuxiliaryOracle oracle = new AuxiliaryOracle(form, n);
    double lowest = Double.POSITIVE_INFINITY;
    for (long pattern = 0; pattern < 1L << n; pattern++) {
      double value = energy.value(State.ofWords(n, pattern));
      assertEquals(value, AuxiliaryOracle.completed(form, table, pattern));
      if (shared <= 7) {
        assertEquals(value, oracle.lowest(pattern));
      }
      lowest = Math.min(lowest, value);
    }
    assertEquals(optimum, lowest);
  }

  /** The same as a model, each square an objective, audited on every pattern. */
  @ParameterizedTest
  @CsvSource({"3, 1", "4, 2", "5, 2", "6, 7", "7, 3", "8, 8", "9, 12", "10, 13", "11, 5", "12, 10"})
  void modelsWithSharedBitsPassTheAudit(int n, double optimum) {
    Model model = Model.named("low autocorrelation");
    List<Bit> x = List.copyOf(model.bits("x", numbers(n)).decisions());
    for (int k = 1; k < n; k++) {
      int distance = k;
      Expr sum = Expr.sum(numbers(n - k), i -> spin(x, i).times(spin(x, i + distance)));
      model.minimize("C" + k, sum.times(sum));
    }
    Lowered lowered = Lowering.standard().lower(model);
    LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
    report.orThrow();
    assertEquals(optimum, report.optimum().orElseThrow());
    LoweringAudit.exhaustive(Lowering.standard().smallestCoefficients().lower(model)).orThrow();
  }

  private static List<Integer> numbers(int n) {
    return IntStream.range(0, n).boxed().toList();
  }

  private static Expr spin(List<Bit> x, int i) {
    return Expr.constant(1).minus(x.get(i).times(2));
  }

  /** A rule and an objective that have products in common: its weight can still be told apart. */
  @Test
  void aRuleThatSharesBitsWithTheObjectiveIsAnalysed() {
    Model model = Model.named("triples");
    List<Bit> x = List.copyOf(model.bits("x", numbers(6)).decisions());
    Expr pair = x.get(0).times(x.get(1));
    Expr gain = Expr.sum(numbers(4), k -> pair.times(x.get(k + 2)).times(k + 1));
    Expr used = Expr.sum(numbers(4), k -> pair.times(x.get(k + 2)));
    model.maximize("gain", gain);
    model.require("two", used.atMost(2));
    Lowered lowered = Lowering.standard().lower(model);
    List<String> sources =
        IntStream.range(0, lowered.qubo().size())
            .boxed()
            .flatMap(bit -> lowered.ledger().linear(bit).stream())
            .filter(entry -> entry.kind() == Kind.PRODUCT)
            .map(Ledger.Entry::source)
            .toList();
    assertEquals(List.of("product of x 0 and x 1"), sources);
    LoweringAudit.Report report = LoweringAudit.exhaustive(lowered);
    report.orThrow();
    assertEquals(7, report.optimum().orElseThrow(), "4 + 3");
    assertEquals(
        2, report.weights().get(0).infimum().orElseThrow(), "one more gains 2 and misses by 1");
  }

  /** With small coefficients first, the largest is no larger and the bits are no fewer. */
  @ParameterizedTest
  @CsvSource({"5", "8", "12"})
  void smallCoefficientsTakeMoreBits(int n) {
    BitTable few = DegreeReductionProperties.table(n);
    BitTable small = DegreeReductionProperties.table(n);
    List<Source> fewest = DegreeReduction.of(correlations(n), Aim.AUXILIARIES, few);
    List<Source> smallest = DegreeReduction.of(correlations(n), Aim.COEFFICIENTS, small);
    double ofFewest = largest(DegreeReductionProperties.sum(fewest, few.size()));
    double ofSmallest = largest(DegreeReductionProperties.sum(smallest, small.size()));
    assertTrue(ofSmallest < ofFewest, ofSmallest + " against " + ofFewest);
    assertTrue(small.size() > few.size());
  }

  private static double largest(Polynomial form) {
    double[] largest = {0};
    form.forEachTerm(
        (value, variables) ->
            largest[0] = Math.max(largest[0], variables.length == 0 ? 0 : Math.abs(value)));
    return largest[0];
  }

  /** A single product gains nothing by pairs; of three that have a pair in common two bits go. */
  @Test
  void pairsAreSharedWhereThatSaves() {
    Polynomial one = Polynomial.builder(6).add(2, 0, 1, 2, 3).build();
    BitTable table = DegreeReductionProperties.table(6);
    Polynomial alone = DegreeReductionProperties.reduced(one, "one", table);
    assertEquals(7, table.size());
    assertEquals(3 * 2, alone.coefficient(6), "the form of Ishikawa for degree 4");
    Polynomial three =
        Polynomial.builder(6).add(2, 0, 1, 2).add(-3, 0, 1, 3).add(4, 0, 1, 4).build();
    table = DegreeReductionProperties.table(6);
    Polynomial shared = DegreeReductionProperties.reduced(three, "three", table);
    assertEquals(7, table.size());
    List<String> meanings = table.meanings();
    assertEquals(meanings.get(0) + " and " + meanings.get(1), meanings.get(6));
    assertEquals(6, shared.coefficient(0, 1), "the positive coefficients' sum");
    assertEquals(-9, shared.coefficient(0, 6), "less the sum of all magnitudes");
    assertEquals(12, shared.coefficient(6), "the positive sum, twice the negative");
    assertEquals(-3, shared.coefficient(3, 6));
  }

  /** The tie of decimal coefficients vanishes exactly at the product and suffices elsewhere. */
  @Test
  void tiesOfDecimalsVanishExactly() {
    Tie tie = new Tie();
    double positive = 0;
    double negative = 0;
    for (int k = 1; k <= 40; k++) {
      tie.carry(0.1 * k);
      tie.carry(-1e-7 / k);
      positive += 0.1 * k;
      negative += 1e-7 / k;
    }
    Polynomial.Builder terms = Polynomial.builder(3);
    tie.addTo(terms, 0, 1, 2);
    Polynomial penalty = terms.build();
    for (int pattern = 0; pattern < 8; pattern++) {
      boolean x = (pattern & 1) != 0;
      boolean y = (pattern & 2) != 0;
      boolean w = (pattern & 4) != 0;
      double value = penalty.value(State.ofWords(3, pattern));
      if (w == (x && y)) {
        assertEquals(0, value);
      } else {
        assertTrue(value >= (w ? negative : positive), pattern + ": " + value);
      }
    }
  }
}
