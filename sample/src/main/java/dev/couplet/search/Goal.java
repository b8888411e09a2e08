package dev.couplet.search;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.kernel.MoveRows;
import java.util.OptionalDouble;

/**
 * The target of a run, as seen by one walk: whether a state has met it is decided by the form
 * itself, but only for states that come near in the units of the moves.
 */
final class Goal {
  private final Qubo form;
  private final double target;
  private final double nearly;
  private boolean met;

  Goal(Qubo form, MoveRows rows, OptionalDouble target) {
    this.form = form;
    this.target = target.orElse(Double.NEGATIVE_INFINITY);
    double slack = rows.exact() ? 0 : Math.sqrt(1.0 + form.size() + form.pairs());
    this.nearly = rows.inUnits(this.target - form.constant()) + slack;
  }

  /** Before each draw. */
  void begin() {
    met = false;
  }

  /** Whether a state of this energy could meet the target. */
  boolean near(long energy) {
    return energy <= nearly;
  }

  /** Looks at a state whose energy in the units of the moves is known. */
  void look(State state, long energy) {
    met = met || (near(energy) && form.value(state) <= target);
  }

  /** Whether a state that was looked at has met the target. */
  boolean met() {
    return met;
  }
}
