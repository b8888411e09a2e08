package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Structure;
import dev.couplet.sampling.Vigil;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.function.Function;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/**
 * What is built before the first draw asks whether to go on as often as a draw does. The steps of
 * each are counted by hand: how often it goes over the variables and over the places of the rows.
 */
class SettingUpTest {
  private static final int SIZE = 1 << 19;

  /** 2^19 variables, 2^20 pairs. */
  private static final Qubo WIDE = Forms.ring(SIZE);

  /** Counts how often it is asked, and says so from one time on. */
  private static final class Asked {
    private final int last;
    private int asked;
    private int late;

    Asked(int last) {
      this.last = last;
    }

    Pace pace() {
      return new Pace(this::over);
    }

    private boolean over() {
      late += asked >= last ? 1 : 0;
      return ++asked >= last;
    }
  }

  private static void askedOftenEnough(long steps, Function<Pace, Boolean> whole) {
    Asked never = new Asked(Integer.MAX_VALUE);
    assertTrue(whole.apply(never.pace()));
    assertTrue(never.asked >= steps / Vigil.STEPS, "asked " + never.asked + " times");
    for (int last = 1; last <= never.asked; last += 1 + never.asked / 7) {
      Asked at = new Asked(last);
      boolean done = whole.apply(at.pace());
      assertEquals(last, at.asked);
      assertEquals(0, at.late, "it was asked again after it was over");
      assertTrue(!done || last == never.asked, "it went on though it was over at " + last);
    }
  }

  @Test
  void rowsByNeighbours() {
    // The pairs are counted, then filled in; two passes over the variables.
    askedOftenEnough(2L * SIZE + 2L * WIDE.pairs(), pace -> Adjacency.of(WIDE, pace).isPresent());
  }

  @Test
  void rowsOfMoves() {
    // The scale takes two passes over the pairs, the rows two, and one over their places.
    askedOftenEnough(6L * WIDE.pairs(), pace -> MoveRows.of(WIDE, pace).isPresent());
    Qubo dense = Forms.integers(1500, 1, 9, 3);
    askedOftenEnough(3L * dense.pairs(), pace -> MoveRows.of(dense, pace).isPresent());
  }

  @Test
  void rowsOfReplicas() {
    Adjacency rows = Adjacency.of(WIDE);
    // Common divisor, largest gain, colours and blocks: each once over the places.
    askedOftenEnough(8L * WIDE.pairs(), pace -> ReplicaRows.of(rows, pace).isPresent());
  }

  @Test
  void movesWithinSets() {
    LocalFields fields = new LocalFields(Adjacency.of(WIDE));
    int length = 1 << 10;
    Structure sets =
        Structure.exactlyOne(
            IntStream.range(0, 4)
                .mapToObj(s -> IntStream.range(s * length, (s + 1) * length).boxed().toList())
                .toList());
    Asked never = new Asked(Integer.MAX_VALUE);
    Reassignment all = new Reassignment(fields, sets, never.pace());
    assertTrue(never.asked >= 4L * length * length / Vigil.STEPS);
    Asked soon = new Asked(2);
    Reassignment few = new Reassignment(fields, sets, soon.pace());
    assertEquals(2, soon.asked);
    assertTrue(!all.idle() && !few.idle());
  }

  @Test
  void fieldsOfAState() {
    LocalFields fields = new LocalFields(Adjacency.of(WIDE));
    State state = LocalFields.random(SIZE, new SplittableRandom(1));
    askedOftenEnough(SIZE + 2L * WIDE.pairs(), pace -> fields.set(state, pace));
    Moves moves = new Moves(MoveRows.of(WIDE));
    askedOftenEnough(state.ones() * 5L, pace -> moves.set(state, pace));
  }

  @Test
  void theRowsAreThoseOfAnUnwatchedBuild() {
    Qubo form = Forms.integers(70, 0.3, 9, 8);
    Optional<Adjacency> watched = Adjacency.of(form, Pace.free());
    assertArrayEquals(Adjacency.of(form).neighbour(), watched.orElseThrow().neighbour());
    assertArrayEquals(Adjacency.of(form).weight(), watched.orElseThrow().weight());
  }

  /**
   * What is still done for a draw that was told to end: of the flips of a whole descent, about half
   * a million steps' worth. A flip takes the steps of its four neighbours, itself and its attempt.
   */
  @Test
  void theLastDescentOfAnEndedDrawIsShort() {
    LocalFields fields = new LocalFields(Adjacency.of(WIDE));
    State state = LocalFields.random(SIZE, new SplittableRandom(2));
    fields.set(state);
    new Descent(fields).close();
    int flips = state.distance(fields.state());
    assertTrue(flips > 0 && 6L * flips <= Vigil.STEPS, "flips: " + flips);
    new Descent(fields).run(Pace.free());
    assertTrue(state.distance(fields.state()) > flips + flips / 10);
  }
}
