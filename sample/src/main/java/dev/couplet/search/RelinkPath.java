package dev.couplet.search;

import dev.couplet.form.State;
import dev.couplet.kernel.Moves;
import dev.couplet.kernel.Pace;
import java.util.SplittableRandom;

/**
 * The way from one state towards another, always by the best flip among the variables in which they
 * still differ; stops at the lowest state of the middle third.
 */
final class RelinkPath {
  /** States closer than this are not worth a path. */
  static final int NEAREST = 6;

  private final Moves moves;
  private final int[] flipped;

  RelinkPath(Moves moves) {
    this.moves = moves;
    this.flipped = new int[moves.size()];
  }

  /**
   * Leaves the moves at the lowest state of the middle third, all of them free, unless the pace
   * ends it.
   */
  void walk(State from, State to, Budget budget, SplittableRandom random, Pace pace) {
    int distance = from.distance(to);
    if (!moves.set(from, pace)) {
      return;
    }
    for (int i = 0; i < moves.size(); i++) {
      if (from.get(i) == to.get(i)) {
        moves.block(i);
      }
    }
    int walked = 0;
    int best = 0;
    long lowest = Long.MAX_VALUE;
    while (walked < 2 * distance / 3 && budget.take() && !pace.after(moves.steps())) {
      int next = moves.best(random);
      moves.flip(next);
      moves.block(next);
      flipped[walked++] = next;
      if (walked >= distance / 3 && moves.energy() < lowest) {
        lowest = moves.energy();
        best = walked;
      }
    }
    if (pace.ended()) {
      return;
    }
    while (walked > best) {
      moves.flip(flipped[--walked]);
    }
    for (int i = 0; i < moves.size(); i++) {
      moves.free(i);
    }
  }
}
