package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.BitSet;
import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class ClusterMovesProperties {
  /** The sum of both energies is kept, and what changed is one whole cluster, in both states. */
  @Property(tries = 300)
  void aTradeKeepsTheSumOfEnergiesAndSwapsOneCluster(
      @ForAll @IntRange(min = 1, max = 40) int size,
      @ForAll @IntRange(max = 4) int quarters,
      @ForAll long seed) {
    Qubo form = Forms.integers(size, quarters * quarters / 64.0, 9, seed);
    Adjacency rows = Adjacency.of(form);
    ClusterMoves moves = new ClusterMoves(rows);
    SplittableRandom random = new SplittableRandom(seed);
    LocalFields one = new LocalFields(rows);
    LocalFields two = new LocalFields(rows);
    one.set(LocalFields.random(size, random));
    two.set(LocalFields.random(size, random));
    for (int k = 0; k < 5; k++) {
      State first = one.state();
      State second = two.state();
      long steps = moves.trade(one, two, random);
      assertEquals(
          form.value(first) + form.value(second),
          form.value(one.state()) + form.value(two.state()));
      assertEquals(form.value(one.state()), one.energy());
      BitSet changed = differing(first, one.state());
      assertEquals(changed, differing(second, two.state()));
      assertEquals(steps > 0, !changed.isEmpty());
      if (steps > 0) {
        assertEquals(cluster(form, differing(first, second), changed.nextSetBit(0)), changed);
      }
    }
  }

  private static BitSet differing(State one, State two) {
    BitSet differing = one.toBitSet();
    differing.xor(two.toBitSet());
    return differing;
  }

  /**
   * All that is reached from one variable within a set, by going over all pairs again and again.
   */
  private static BitSet cluster(Qubo form, BitSet within, int from) {
    BitSet reached = new BitSet();
    reached.set(from);
    for (int before = 0; before != reached.cardinality(); ) {
      before = reached.cardinality();
      form.forEachPair(
          (i, j, value) -> {
            boolean both = within.get(i) && within.get(j);
            if (both && (reached.get(i) || reached.get(j))) {
              reached.set(i);
              reached.set(j);
            }
          });
    }
    return reached;
  }

  @Property(tries = 50)
  void equalStatesHaveNothingToTrade(@ForAll @IntRange(max = 40) int size, @ForAll long seed) {
    Adjacency rows = Adjacency.of(Forms.integers(size, 0.2, 9, seed));
    LocalFields one = new LocalFields(rows);
    LocalFields two = new LocalFields(rows);
    State state = LocalFields.random(size, new SplittableRandom(seed));
    one.set(state);
    two.set(state);
    assertEquals(0, new ClusterMoves(rows).trade(one, two, new SplittableRandom(seed)));
    assertTrue(state.equals(one.state()) && state.equals(two.state()));
  }
}
