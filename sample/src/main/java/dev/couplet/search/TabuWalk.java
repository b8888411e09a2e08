package dev.couplet.search;

import dev.couplet.form.State;
import dev.couplet.kernel.Moves;
import dev.couplet.kernel.Pace;
import java.util.SplittableRandom;

/**
 * A walk by the best flip that is not blocked; or by a blocked one, if it leads below all that the
 * walk has seen. Belongs to one thread.
 *
 * <p>The best state is copied only when the walk is about to leave it upwards: a descent copies its
 * last state alone.
 */
final class TabuWalk {
  private final Moves moves;
  private final Blocked blocked;
  private final Goal goal;
  private State bestState;
  private long bestEnergy;
  private boolean kept;

  TabuWalk(Moves moves, Goal goal) {
    this.moves = moves;
    this.blocked = new Blocked(moves);
    this.goal = goal;
    this.bestState = State.zeros(moves.size());
  }

  /**
   * Walks from where the moves are, which are all free, until so many iterations have not improved
   * on the best state, or the budget, the pace or the goal ends it; nothing is blocked afterwards.
   */
  void run(long patience, Budget budget, SplittableRandom random, Pace pace) {
    bestEnergy = moves.energy();
    kept = false;
    long idle = 0;
    for (long now = 1; idle < patience && budget.take(); now++) {
      blocked.freeUntil(now);
      idle = step(now, random) ? 0 : idle + 1;
      if (idle == 0 && goal.near(bestEnergy)) {
        keepBest();
      }
      if (pace.after(moves.steps()) || goal.met()) {
        break;
      }
    }
    keepBest();
    blocked.clear();
  }

  /** One iteration; whether it found a new lowest energy. */
  private boolean step(long now, SplittableRandom random) {
    int chosen = moves.best(random);
    long limit = bestEnergy - moves.energy();
    if (chosen >= 0) {
      limit = Math.min(limit, moves.gain(chosen));
    }
    int daring = blocked.bestBelow(limit);
    if (daring >= 0) {
      blocked.remove(daring);
      chosen = daring;
    }
    if (chosen < 0) {
      return false;
    }
    if (moves.gain(chosen) >= 0) {
      keepBest();
    }
    moves.flip(chosen);
    blocked.add(chosen, now, random);
    if (moves.energy() < bestEnergy) {
      bestEnergy = moves.energy();
      kept = false;
      return true;
    }
    return false;
  }

  /** Keeps the present state, if it is the best and not kept yet. */
  private void keepBest() {
    if (!kept && moves.energy() == bestEnergy) {
      bestState = moves.state();
      kept = true;
      goal.look(bestState, bestEnergy);
    }
  }

  /** The best state of the last walk. */
  State bestState() {
    return bestState;
  }

  /** Its energy, in the units of the moves. */
  long bestEnergy() {
    return bestEnergy;
  }
}
