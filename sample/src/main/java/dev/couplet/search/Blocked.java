package dev.couplet.search;

import dev.couplet.kernel.Moves;
import java.util.SplittableRandom;

/**
 * The variables that were flipped lately and are not to be flipped back: each for n / 100 + 1 to n
 * / 100 + 10 iterations (Glover, Lü and Hao 2010), fewer in forms of less than thirty variables.
 */
final class Blocked {
  private static final int SPREAD = 10;
  private static final int SHARE = 100;

  private final Moves moves;
  private final int longest;
  private final int[] variable;
  private final long[] until;
  private int count;

  Blocked(Moves moves) {
    this.moves = moves;
    int size = moves.size();
    this.longest =
        Math.min(Math.max(0, size - 1), Math.max(1, Math.min(size / 3, size / SHARE + SPREAD)));
    this.variable = new int[longest + 1];
    this.until = new long[longest + 1];
  }

  void clear() {
    while (count > 0) {
      moves.free(variable[--count]);
    }
  }

  /** Blocks a variable that is flipped in iteration {@code now}. */
  void add(int flipped, long now, SplittableRandom random) {
    int tenure = Math.min(longest, moves.size() / SHARE + 1 + random.nextInt(SPREAD));
    if (tenure > 0) {
      moves.block(flipped);
      variable[count] = flipped;
      until[count++] = now + tenure;
    }
  }

  /** Frees those whose time is up in iteration {@code now}; it is asked in every iteration. */
  void freeUntil(long now) {
    for (int k = 0; k < count; ) {
      if (until[k] < now) {
        moves.free(variable[k]);
        count--;
        variable[k] = variable[count];
        until[k] = until[count];
      } else {
        k++;
      }
    }
  }

  /** The blocked variable of the lowest gain below {@code limit}, or -1. */
  int bestBelow(long limit) {
    long lowest = limit;
    int best = -1;
    for (int k = 0; k < count; k++) {
      int gain = moves.gain(variable[k]);
      if (gain < lowest) {
        lowest = gain;
        best = variable[k];
      }
    }
    return best;
  }

  /** Lets a blocked variable go, since it is flipped all the same. */
  void remove(int flipped) {
    for (int k = 0; k < count; k++) {
      if (variable[k] == flipped) {
        moves.free(flipped);
        count--;
        variable[k] = variable[count];
        until[k] = until[count];
        return;
      }
    }
  }
}
