package dev.couplet.lower;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ProductFormTest {
  /**
   * The published numbers of auxiliary bits for a product of degree d: 1 for a negative one
   * (Freedman and Drineas 2005); floor((d - 1) / 2) (Ishikawa 2011) or ceil(log2 d) - 1 (Boros,
   * Crama and Rodriguez-Heck 2020) for a positive one.
   */
  @ParameterizedTest
  @ValueSource(ints = {3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 100, 1025})
  void auxiliaryBitsAsPublished(int degree) {
    assertEquals(1, new ConjunctionForm().auxiliaries(degree));
    assertEquals(Math.floorDiv(degree - 1, 2), new ThresholdForm().auxiliaries(degree));
    int logarithm = 0;
    while (1L << logarithm < degree) {
      logarithm++;
    }
    assertEquals(logarithm - 1, new CountForm().auxiliaries(degree));
    for (ProductForm way : ProductForm.ALL) {
      assertEquals(way.auxiliaries(degree), way.of(degree).auxiliaries());
    }
  }

  /** Every way, on every pattern of up to 12 literals, plain and negated in turn. */
  @ParameterizedTest
  @ValueSource(ints = {3, 4, 5, 6, 7, 8, 9, 10, 11, 12})
  void theLowestValueIsTheProduct(int degree) {
    for (ProductForm way : ProductForm.ALL) {
      for (int negated : new int[] {0, 1, degree / 2, degree}) {
        int[] literals = IntStream.range(0, degree).map(v -> v < negated ? ~v : v).toArray();
        assertIsProduct(way, literals, IntStream.range(0, 1 << degree).asLongStream().toArray());
      }
    }
  }

  /** Above that the patterns 0..01..1, one for each number of ones, and their rotations by 5. */
  @ParameterizedTest
  @ValueSource(ints = {13, 14, 15, 16, 17})
  void theLowestValueOfALongProduct(int degree) {
    long[] patterns = new long[2 * (degree + 1)];
    for (int ones = 0; ones <= degree; ones++) {
      long pattern = (1L << ones) - 1;
      patterns[2 * ones] = pattern;
      patterns[2 * ones + 1] = (pattern << 5 | pattern >>> (degree - 5)) & ((1L << degree) - 1);
    }
    for (ProductForm way : ProductForm.ALL) {
      assertIsProduct(way, IntStream.range(0, degree).toArray(), patterns);
    }
  }

  private static void assertIsProduct(ProductForm way, int[] literals, long[] patterns) {
    int degree = literals.length;
    int auxiliaries = way.auxiliaries(degree);
    Polynomial.Builder terms = Polynomial.builder(degree + auxiliaries);
    way.of(degree).addTo(terms, 3, literals, degree);
    Polynomial form = terms.build();
    assertTrue(form.degree() <= 2);
    assertTrue(largest(form) <= 3 * way.of(degree).largest(degree, negated(literals)));
    AuxiliaryOracle oracle = new AuxiliaryOracle(form, degree);
    for (long pattern : patterns) {
      int ones = 0;
      for (int literal : literals) {
        ones += ((literal < 0 ? ~pattern >>> ~literal : pattern >>> literal) & 1) != 0 ? 1 : 0;
      }
      double expected = ones == degree ? 3 * way.sign() : 0;
      assertEquals(
          expected, oracle.lowest(pattern), () -> way + " of " + Arrays.toString(literals));
      long best = pattern;
      for (int i = 0; i < auxiliaries; i++) {
        best |= way.best(i, ones, degree) ? 1L << (degree + i) : 0;
      }
      assertEquals(expected, form.value(State.ofWords(form.size(), best)));
    }
  }

  private static int negated(int[] literals) {
    return (int) Arrays.stream(literals).filter(literal -> literal < 0).count();
  }

  private static double largest(Polynomial form) {
    double[] largest = {0};
    form.forEachTerm(
        (value, variables) ->
            largest[0] = Math.max(largest[0], variables.length == 0 ? 0 : Math.abs(value)));
    return largest[0];
  }

  /** The measure of size that choices go by is the size, not only above it. */
  @ParameterizedTest
  @ValueSource(ints = {3, 4, 5, 6, 7, 8, 12, 16, 31})
  void theLargestCoefficientIsKnownBeforehand(int degree) {
    for (ProductForm way : ProductForm.ALL) {
      for (int negated = 0; negated <= degree; negated++) {
        int plainFrom = negated;
        int[] literals = IntStream.range(0, degree).map(v -> v < plainFrom ? ~v : v).toArray();
        Polynomial.Builder terms = Polynomial.builder(degree + way.auxiliaries(degree));
        way.of(degree).addTo(terms, 1, literals, degree);
        assertEquals(largest(terms.build()), way.of(degree).largest(degree, negated));
      }
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {3, 4, 5, 6, 7, 8, 16, 33})
  void theChoiceFollowsTheAim(int degree) {
    ProductForms.Fitted fewest = new ProductForms(Aim.AUXILIARIES).of(1, degree);
    ProductForms.Fitted smallest = new ProductForms(Aim.COEFFICIENTS).of(1, degree);
    int least =
        List.of(new ThresholdForm(), new CountForm()).stream()
            .mapToInt(way -> way.auxiliaries(degree))
            .min()
            .orElseThrow();
    assertEquals(least, fewest.auxiliaries());
    assertTrue(smallest.form().largest(degree, 0) <= fewest.form().largest(degree, 0));
    assertTrue(smallest.auxiliaries() >= fewest.auxiliaries());
    assertEquals(1, new ProductForms(Aim.COEFFICIENTS).of(-1, degree).auxiliaries());
  }
}
