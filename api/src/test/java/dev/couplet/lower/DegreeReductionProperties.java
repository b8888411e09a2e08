package dev.couplet.lower;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.audit.LoweringAudit;
import dev.couplet.audit.RandomModels;
import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.lower.Ledger.Kind;
import dev.couplet.lower.Ledger.Source;
import dev.couplet.model.Model;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import net.jqwik.api.Assume;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

/** Random sources of degree up to 8 in up to 10 variables against all patterns of all bits. */
class DegreeReductionProperties {
  private static final int MOST_COUPLED = 9;

  static BitTable table(int size) {
    Model model = Model.named("products");
    model.bits("x", IntStream.range(0, size).boxed().toList());
    return new BitTable(new Coding(model.snapshot(), Lowering.standard()));
  }

  /** A polynomial by itself, brought to degree 2 with few auxiliary bits. */
  static Polynomial reduced(Polynomial polynomial, String name, BitTable table) {
    Source only = new Source(name, Kind.OBJECTIVE, polynomial, 1);
    return DegreeReduction.of(List.of(only), Aim.AUXILIARIES, table).get(0).terms();
  }

  static Polynomial sum(List<Source> sources, int size) {
    Polynomial.Builder sum = Polynomial.builder(size);
    sources.forEach(source -> sum.add(source.terms(), source.factor()));
    return sum.build();
  }

  private static Polynomial terms(SplittableRandom random, int n, int count) {
    Polynomial.Builder terms = Polynomial.builder(n).add(random.nextInt(-9, 10));
    for (int t = 0; t < count; t++) {
      int degree = 1 + random.nextInt(Math.min(8, n));
      int[] variables = random.ints(degree, 0, n).distinct().toArray();
      terms.add(random.nextInt(-9, 10), variables);
    }
    return terms.build();
  }

  @Property(tries = 300)
  void theLowestValueIsTheSameForEveryPattern(
      @ForAll long seed,
      @ForAll @IntRange(min = 3, max = 10) int n,
      @ForAll @IntRange(min = 1, max = 3) int parts,
      @ForAll @IntRange(min = 1, max = 6) int count,
      @ForAll Aim aim) {
    SplittableRandom random = new SplittableRandom(seed);
    List<Source> sources = new ArrayList<>();
    for (int s = 0; s < parts; s++) {
      sources.add(
          new Source("part " + s, Kind.OBJECTIVE, terms(random, n, count), 1 + random.nextInt(3)));
    }
    BitTable table = table(n);
    List<Source> reduced = DegreeReduction.of(sources, aim, table);
    Polynomial before = sum(sources, n);
    Polynomial after = sum(reduced, table.size());
    assertTrue(after.degree() <= 2);
    assertEquals(reduced, DegreeReduction.of(sources, aim, table(n)), "the same again");
    AuxiliaryOracle oracle = new AuxiliaryOracle(after, n);
    boolean small = oracle.largestComponent() <= MOST_COUPLED;
    for (long pattern = 0; pattern < 1L << n; pattern++) {
      double expected = before.value(State.ofWords(n, pattern));
      assertEquals(expected, AuxiliaryOracle.completed(after, table, pattern));
      if (small) {
        assertEquals(expected, oracle.lowest(pattern));
      }
    }
    Assume.that(small);
  }

  @Property(tries = 40)
  void modelsPassTheAuditWithSmallCoefficients(
      @ForAll long seed, @ForAll RandomModels.Regime regime) {
    Model model = RandomModels.of(regime, seed);
    Lowered small = Lowering.standard().smallestCoefficients().lower(model);
    LoweringAudit.exhaustive(small).orThrow();
    assertTrue(
        small.auxiliaryBits()
            >= Lowering.standard().fewestAuxiliaries().lower(model).auxiliaryBits());
  }
}
