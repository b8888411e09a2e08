package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.BitSet;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;

class MovesProperties {
  @Property(tries = 150)
  void gainsAndBestMovesAreThoseOfTheForm(
      @ForAll @IntRange(max = 300) int size,
      @ForAll @IntRange(max = 4) int quarters,
      @ForAll @IntRange(min = 1, max = 5) int magnitude,
      @ForAll long seed) {
    int range = (int) StrictMath.pow(10, magnitude);
    Qubo form = Forms.integers(size, quarters * quarters / 16.0, range, seed);
    followAWalk(form, 12, seed);
  }

  /**
   * Long enough for packed rows: three widths, strands with a rest, and a common factor of the
   * pairs.
   */
  @Test
  void packedRowsGiveTheGainsOfTheForm() {
    for (int range : new int[] {30, 3000, 60_000}) {
      Qubo form = wide(4097, range);
      MoveRows rows = MoveRows.of(form);
      assertTrue(rows.dense());
      assertEquals(range < 100 ? 4 : range < 10_000 ? 2 : 1, rows.strands());
      followAWalk(form, 5, range);
    }
  }

  private static Qubo wide(int size, int range) {
    SplittableRandom random = new SplittableRandom(range);
    Qubo.Builder form = Qubo.builder(size);
    for (int i = 0; i < size; i++) {
      form.addLinear(i, random.nextInt(-range, range));
      for (int k = 0; k < 200; k++) {
        int j = (i + 1 + random.nextInt(size - 1)) % size;
        form.addPair(i, j, 4 * random.nextInt(-range, range));
      }
    }
    return form.build();
  }

  private static void followAWalk(Qubo form, int steps, long seed) {
    int size = form.size();
    MoveRows rows = MoveRows.of(form);
    assertTrue(rows.exact());
    Moves moves = new Moves(rows);
    SplittableRandom random = new SplittableRandom(seed);
    State state = LocalFields.random(size, random);
    BitSet blocked = new BitSet();
    moves.set(state);
    for (int step = 0; step < steps; step++) {
      assertEquals(form.value(state) - form.constant(), moves.energy());
      assertEquals(state, moves.state());
      int best = moves.best(random);
      double[] gain = gains(form, state);
      double lowest = Double.POSITIVE_INFINITY;
      for (int i = 0; i < size; i++) {
        assertTrue(gain[i] == moves.gain(i));
        assertEquals(state.get(i), moves.one(i));
        lowest = blocked.get(i) ? lowest : Math.min(lowest, gain[i]);
      }
      if (blocked.cardinality() == size) {
        assertEquals(-1, best);
        return;
      }
      assertFalse(blocked.get(best));
      assertTrue(gain[best] == lowest);
      moves.flip(best);
      state = state.with(best, !state.get(best));
      int block = random.nextInt(size);
      moves.block(best);
      moves.block(block);
      moves.free(size - 1 - best);
      blocked.set(best);
      blocked.set(block);
      blocked.clear(size - 1 - best);
    }
  }

  private static double[] gains(Qubo form, State state) {
    double[] gain = new double[form.size()];
    for (int i = 0; i < gain.length; i++) {
      gain[i] = form.linear(i);
    }
    form.forEachPair(
        (i, j, value) -> {
          gain[i] += state.get(j) ? value : 0;
          gain[j] += state.get(i) ? value : 0;
        });
    for (int i = 0; i < gain.length; i++) {
      gain[i] *= state.spin(i);
    }
    return gain;
  }

  @Property(tries = 200)
  void realCoefficientsAreRoundedFarBelowTheirFields(
      @ForAll @IntRange(min = 1, max = 40) int size, @ForAll long seed) {
    Qubo form = Forms.reals(size, 0.7, seed);
    Moves moves = new Moves(MoveRows.of(form));
    State state = LocalFields.random(size, new SplittableRandom(seed));
    moves.set(state);
    double[] gain = gains(form, state);
    Adjacency rows = Adjacency.of(form);
    double largest = 0;
    for (int i = 0; i < size; i++) {
      largest = Math.max(largest, rows.magnitude(i));
    }
    double unit = 1 / MoveRows.of(form).inUnits(1);
    for (int i = 0; i < size; i++) {
      assertEquals(gain[i], moves.gain(i) * unit, largest * size * 0x1p-26);
    }
  }

  @Test
  void amongEqualMovesEachIsChosenAtTimes() {
    Moves moves = new Moves(MoveRows.of(Qubo.builder(300).build()));
    SplittableRandom random = new SplittableRandom(5);
    BitSet chosen = new BitSet();
    for (int k = 0; k < 5000; k++) {
      chosen.set(moves.best(random));
    }
    // A move of 300 is missed 5000 times with probability (299/300)^5000 = 6e-8 if all are alike.
    assertEquals(300, chosen.cardinality());
  }
}
