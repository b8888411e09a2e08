package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;

class MetropolisProperties {
  @Property(tries = 200)
  void sweepsLikeItsSlowTwin(
      @ForAll @IntRange(max = 12) int size,
      @ForAll @IntRange(max = 4) int quarters,
      @ForAll @DoubleRange(min = 0, max = 2) double inverseTemperature,
      @ForAll long seed) {
    Qubo form = Forms.integers(size, quarters / 4.0, 9, seed);
    LocalFields fields = new LocalFields(Adjacency.of(form));
    State begin = LocalFields.random(size, Streams.of(seed, 0));
    fields.set(begin);
    Metropolis kernel = new Metropolis(fields);
    SplittableRandom random = Streams.of(seed, 1);
    SplittableRandom same = Streams.of(seed, 1);
    State slow = begin;
    for (int sweep = 0; sweep < 10; sweep++) {
      assertTrue(kernel.sweep(inverseTemperature, random, Pace.free()));
      slow = slowSweep(form, slow, inverseTemperature, same);
      assertEquals(slow, fields.state());
    }
    for (int i = 0; i < size; i++) {
      double gain = form.value(slow.with(i, !slow.get(i))) - form.value(slow);
      assertTrue(gain == fields.gain(i), gain + " is not " + fields.gain(i));
    }
  }

  /** All energies from the form itself, exponentials from the library. */
  private static State slowSweep(
      Qubo form, State begin, double inverseTemperature, SplittableRandom random) {
    State state = begin;
    for (int i = 0; i < form.size(); i++) {
      State flipped = state.with(i, !state.get(i));
      double x = (form.value(flipped) - form.value(state)) * inverseTemperature;
      boolean accepted = x <= 0;
      if (x > 0 && x < Boltzmann.NEVER) {
        accepted = random.nextDouble() < StrictMath.exp(-x);
      }
      state = accepted ? flipped : state;
    }
    return state;
  }

  @Property(tries = 200)
  void descentEndsInALocalMinimumNoHigherThanItBegan(
      @ForAll @IntRange(max = 16) int size,
      @ForAll @IntRange(max = 4) int quarters,
      @ForAll long seed) {
    Qubo form = Forms.reals(size, quarters / 4.0, seed);
    LocalFields fields = new LocalFields(Adjacency.of(form));
    State begin = LocalFields.random(size, Streams.of(seed, 0));
    fields.set(begin);
    new Descent(fields).run(Pace.free());
    assertTrue(form.value(fields.state()) <= form.value(begin) + 1e-12);
    assertTrue(Forms.localMinimum(form, fields.state(), 1e-12));
  }
}
