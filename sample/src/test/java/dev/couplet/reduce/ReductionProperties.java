package dev.couplet.reduce;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.Enumeration;
import dev.couplet.exact.Levels;
import dev.couplet.exact.TestForms;
import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class ReductionProperties {
  private static final Run RUN = Run.of(Effort.draws(1));
  private static final Enumeration ENUMERATION = Enumeration.standard().keep(1 << 20);

  @Property(tries = 2000)
  void keepsAMinimum(
      @ForAll Regime regime,
      @ForAll @IntRange(min = 0, max = 12) int size,
      @ForAll boolean local,
      @ForAll long seed) {
    Qubo form = TestForms.random(regime, size, seed);
    Reduction all = Reduction.standard();
    Reduced reduced = (local ? all.localOnly() : all).reduce(form, RUN);
    List<State> states = new ArrayList<>();
    double sum = reduced.constant();
    for (Qubo part : reduced.parts()) {
      Levels levels = ENUMERATION.levels(part, 1);
      states.add(levels.lowest().get(0));
      sum += levels.minimum();
    }
    State restored = reduced.restore(states);
    double minimum = TestForms.minimum(form);
    assertTrue(!form.exact() || reduced.slack() == 0);
    double slack = form.exact() ? 0 : reduced.slack() + 1e-14 * form.magnitude();
    assertEquals(minimum, sum, slack);
    assertEquals(minimum, form.value(restored), slack);
    assertEquals(states, reduced.project(restored));
    int removed = reduced.report().values().stream().mapToInt(count -> count).sum();
    assertEquals(size, reduced.size() + removed);
  }

  @Property(tries = 1000)
  void strictRulesKeepEveryMinimum(
      @ForAll Regime regime, @ForAll @IntRange(min = 0, max = 11) int size, @ForAll long seed) {
    Qubo form = TestForms.random(regime, size, seed);
    if (!form.exact()) {
      return;
    }
    Reduced reduced = Reduction.standard().keepEveryMinimum().reduce(form, RUN);
    List<List<State>> combinations = List.of(List.of());
    for (Qubo part : reduced.parts()) {
      List<List<State>> longer = new ArrayList<>();
      for (List<State> combination : combinations) {
        for (State state : ENUMERATION.levels(part, 1).lowest()) {
          List<State> one = new ArrayList<>(combination);
          one.add(state);
          longer.add(one);
        }
      }
      combinations = longer;
    }
    Set<State> restored = new HashSet<>();
    combinations.forEach(states -> restored.add(reduced.restore(states)));
    assertEquals(new HashSet<>(ENUMERATION.levels(form, 1).lowest()), restored);
    assertEquals(combinations.size(), restored.size());
  }

  /** Any assignment of what is left keeps its energy, up to what the removed bits are best at. */
  @Property(tries = 500)
  void energiesOfPartsAreThoseOfTheOriginal(
      @ForAll @IntRange(min = 0, max = 14) int size, @ForAll long seed) {
    Qubo form = TestForms.random(Regime.SPARSE, size, seed);
    Reduced reduced = Reduction.standard().localOnly().reduce(form, RUN);
    SplittableRandom random = new SplittableRandom(seed);
    List<State> states = new ArrayList<>();
    double sum = reduced.constant();
    for (Qubo part : reduced.parts()) {
      State state = TestForms.state(part.size(), random.nextLong(1L << part.size()));
      states.add(state);
      sum += part.value(state);
    }
    assertEquals(sum, form.value(reduced.restore(states)));
  }

  @Property(tries = 300)
  void treesVanish(@ForAll @IntRange(min = 0, max = 40) int size, @ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Qubo.Builder tree = Qubo.builder(size);
    for (int i = 0; i < size; i++) {
      tree.addLinear(i, random.nextInt(-20, 21));
      if (i > 0) {
        tree.addPair(i, random.nextInt(i), random.nextInt(-20, 21));
      }
    }
    Qubo form = tree.build();
    Reduced reduced = Reduction.standard().localOnly().reduce(form, RUN);
    assertEquals(0, reduced.size());
    assertEquals(reduced.constant(), form.value(reduced.restore(List.of())));
  }
}
