package dev.couplet.exact;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class EnumerationProperties {
  private static final Enumeration ENUMERATION = Enumeration.standard().keep(1 << 20);

  @Property(tries = 400)
  void findsEveryMinimum(
      @ForAll Regime regime, @ForAll @IntRange(min = 0, max = 13) int size, @ForAll long seed) {
    Qubo form = TestForms.random(regime, size, seed);
    Draws draws = ENUMERATION.sample(form, Effort.draws(1));
    double minimum = TestForms.minimum(form);
    Set<State> expected = new HashSet<>();
    for (long x = 0; x < 1L << size; x++) {
      State state = TestForms.state(size, x);
      if (form.value(state) == minimum) {
        expected.add(state);
      }
    }
    Set<State> found = new HashSet<>();
    for (Draw draw : draws) {
      assertEquals(minimum, draw.energy());
      found.add(draw.state());
    }
    assertEquals(expected, found);
    assertTrue(draws.proved());
  }

  @Property(tries = 400)
  void findsTheLowestLevels(
      @ForAll Regime regime,
      @ForAll @IntRange(min = 0, max = 13) int size,
      @ForAll @IntRange(min = 1, max = 40) int count,
      @ForAll long seed) {
    Qubo form = TestForms.random(regime, size, seed);
    Map<Double, Long> twin = new TreeMap<>();
    for (long x = 0; x < 1L << size; x++) {
      twin.merge(form.value(TestForms.state(size, x)), 1L, Long::sum);
    }
    List<Levels.Level> expected = new ArrayList<>();
    twin.forEach((energy, states) -> expected.add(new Levels.Level(energy, states)));
    Levels levels = ENUMERATION.levels(form, count);
    assertEquals(expected.subList(0, Math.min(count, expected.size())), levels.levels());
    assertTrue(levels.complete());
  }

  /** Sizes beyond one chunk and one part: all the machinery for many blocks is used. */
  @Property(tries = 12)
  void manyBlocksAgreeWithTheSlowTwin(@ForAll Regime regime, @ForAll long seed) {
    Qubo form = TestForms.random(regime, 19, seed);
    assertEquals(TestForms.minimum(form), ENUMERATION.levels(form, 1).minimum());
  }

  @Property(tries = 24)
  void threadsDoNotChangeTheResult(@ForAll Regime regime, @ForAll long seed) {
    Qubo form = TestForms.random(regime, 18, seed);
    Enumeration few = Enumeration.standard().keep(7);
    Effort one = Effort.draws(1);
    assertEquals(few.sample(form, one), few.sample(form, one.threads(3)));
    double target = few.sample(form, one).best().energy() / 2;
    assertEquals(
        few.sample(form, one.target(target)), few.sample(form, one.target(target).threads(3)));
  }
}
