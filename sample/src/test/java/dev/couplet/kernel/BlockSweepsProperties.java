package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Structure;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.List;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;

class BlockSweepsProperties {
  /** Sparse enough for blocks of 32 variables and more. */
  private static Qubo sparse(int size, int range, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Qubo.Builder form = Qubo.builder(size).addConstant(3);
    for (int i = 0; i < size; i++) {
      form.addLinear(i, random.nextInt(-range, range + 1));
      form.addPair(i, (i + 1 + random.nextInt(size - 1)) % size, random.nextInt(-range, range + 1));
    }
    return form.build();
  }

  @Property(tries = 60)
  void sweepsLikeItsSlowTwin(
      @ForAll @IntRange(min = 200, max = 400) int size,
      @ForAll @IntRange(min = 1, max = 9) int range,
      @ForAll @DoubleRange(min = 0, max = 1) double inverseTemperature,
      @ForAll long seed) {
    Qubo form = sparse(size, range, seed);
    SweepOrder order = SweepOrder.of(Adjacency.of(form), Pace.free());
    assertTrue(order.inBlocks());
    LocalFields fields = new LocalFields(order.rows());
    State state = LocalFields.random(size, new SplittableRandom(seed));
    fields.set(state);
    Metropolis kernel = new Metropolis(fields, order);
    SplittableRandom own = new SplittableRandom(seed + 1);
    SplittableRandom same = new SplittableRandom(seed + 1);
    for (int sweep = 0; sweep < 3; sweep++) {
      assertTrue(kernel.sweep(inverseTemperature, own, Pace.free()));
      state = slowSweep(form, order, state, inverseTemperature, same);
      assertEquals(state, fields.state());
      assertEquals(form.value(state), fields.energy());
    }
  }

  /**
   * Flip by flip, with energies from the form. The number u that decides a flip has its first byte
   * from a word for eight flips; where that leaves it open, the rest comes from a word of its own.
   */
  private static State slowSweep(
      Qubo form, SweepOrder order, State begin, double inverse, SplittableRandom random) {
    State state = begin;
    for (int b = 0; b + 1 < order.bounds().length; b++) {
      int from = order.bounds()[b];
      long word = 0;
      for (int p = from; p < order.bounds()[b + 1]; p++) {
        word = (p - from) % 8 == 0 ? random.nextLong() : word;
        int first = (int) (word >>> 8 * ((p - from) % 8)) & 255;
        State flipped = state.flipped(order.rows().variable(p));
        double x = (form.value(flipped) - form.value(state)) * inverse;
        boolean surely = x < -StrictMath.log((first + 1) / 256.0);
        boolean perhaps = x < (first == 0 ? 44.4 : -StrictMath.log(first / 256.0));
        if (surely || (perhaps && rest(first, random) < StrictMath.exp(-x))) {
          state = flipped;
        }
      }
    }
    return state;
  }

  private static double rest(int first, SplittableRandom random) {
    return (first + (random.nextLong() >>> 11) * 0x1p-53) / 256;
  }

  @Property(tries = 60)
  void blocksHoldEachVariableOnceAndNoPair(
      @ForAll @IntRange(min = 64, max = 3000) int size, @ForAll long seed) {
    Qubo form = sparse(size, 3, seed);
    Adjacency plain = Adjacency.of(form);
    SweepOrder order = SweepOrder.of(plain, Pace.free());
    Adjacency rows = order.rows();
    BitSet seen = new BitSet();
    for (int p = 0; p < size; p++) {
      int i = rows.variable(p);
      assertFalse(seen.get(i));
      seen.set(i);
      assertEquals(form.linear(i), rows.linear()[p]);
      assertEquals(plain.degree(i), rows.degree(p));
      for (int k = rows.start()[p]; k < rows.start()[p + 1]; k++) {
        assertEquals(form.pair(i, rows.variable(rows.neighbour()[k])), rows.weight()[k]);
      }
    }
    int[] bounds = order.bounds();
    for (int b = 0; b + 1 < bounds.length; b++) {
      for (int p = bounds[b]; p < bounds[b + 1]; p++) {
        for (int k = rows.start()[p]; k < rows.start()[p + 1]; k++) {
          int other = rows.neighbour()[k];
          assertFalse(other >= bounds[b] && other < bounds[b + 1]);
        }
      }
    }
  }

  /** Sets are named by variables, whose rows stand elsewhere: 60 sets of three, one bit each. */
  @Test
  void movesWithinSetsFindTheirRows() {
    Qubo.Builder form = Qubo.builder(180);
    SplittableRandom random = new SplittableRandom(6);
    List<List<Integer>> sets = new ArrayList<>();
    for (int s = 0; s < 60; s++) {
      List<Integer> set = List.of(s, 60 + s, 120 + s);
      sets.add(set);
      set.forEach(bit -> form.addLinear(bit, random.nextInt(10) - 50));
      form.addPair(s, 60 + s, 100).addPair(s, 120 + s, 100).addPair(60 + s, 120 + s, 100);
    }
    SweepOrder order = order(form.build());
    assertTrue(order.inBlocks());
    LocalFields fields = new LocalFields(order.rows());
    boolean[] first = new boolean[180];
    Arrays.fill(first, 0, 60, true);
    fields.set(State.of(first));
    Reassignment moves = new Reassignment(fields, Structure.exactlyOne(sets));
    assertTrue(moves.sweep(0.01, random, Pace.free()));
    State moved = fields.state();
    assertTrue(moved.distance(State.of(first)) > 20);
    for (List<Integer> set : sets) {
      assertEquals(1, set.stream().filter(moved::get).count());
    }
    assertEquals(form.build().value(moved), fields.energy());
  }

  @Test
  void denseFormsAndSmallOnesStayAsTheyAre() {
    assertFalse(order(Forms.integers(300, 0.5, 9, 1)).inBlocks());
    assertFalse(order(Forms.integers(20, 0.05, 9, 1)).inBlocks());
    assertFalse(order(Forms.integers(300, 0.5, 9, 1)).rows().rearranged());
    assertTrue(order(Forms.spinGlass(8, 1)).inBlocks());
  }

  private static SweepOrder order(Qubo form) {
    return SweepOrder.of(Adjacency.of(form), Pace.free());
  }
}
