package dev.couplet.search;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.kernel.Adjacency;
import dev.couplet.kernel.Descent;
import dev.couplet.kernel.LocalFields;
import dev.couplet.kernel.MoveRows;
import dev.couplet.kernel.Moves;
import dev.couplet.kernel.Pace;
import dev.couplet.sampling.Run;
import java.util.SplittableRandom;
import java.util.function.Supplier;

/**
 * What one thread searches with: the moves, a walk over them, and a descent by the form's own
 * coefficients for what the moves do not resolve.
 */
final class Workbench {
  private final Moves moves;
  private final Goal goal;
  private final TabuWalk walk;
  private final boolean exact;
  private final LocalFields fields;
  private final Descent descent;

  private Workbench(Qubo form, MoveRows rows, Adjacency own, Run run) {
    this.moves = new Moves(rows);
    this.goal = new Goal(form, rows, run.effort().target());
    this.walk = new TabuWalk(moves, goal);
    this.exact = rows.exact();
    this.fields = new LocalFields(own);
    this.descent = new Descent(fields);
  }

  /** Makes a bench for each thread of a run; what they share is made here. */
  static Supplier<Workbench> of(Qubo form, Run run) {
    MoveRows rows = MoveRows.of(form);
    // A dense form with whole coefficients is searched by its moves alone.
    boolean alone = rows.exact() && rows.dense();
    Adjacency own = Adjacency.of(alone ? Qubo.builder(0).build() : form);
    return () -> new Workbench(form, rows, own, run);
  }

  Moves moves() {
    return moves;
  }

  Goal goal() {
    return goal;
  }

  TabuWalk walk() {
    return walk;
  }

  /** Goes down from a state, cheaply if the form is sparse, and leaves the moves there. */
  void descend(State begin, SplittableRandom random, Pace pace) {
    State from = begin;
    if (fields.size() == moves.size()) {
      fields.set(begin);
      descent.run(pace);
      from = fields.state();
    }
    moves.set(from);
    while (!pace.ended()) {
      int best = moves.best(random);
      if (best < 0 || moves.gain(best) >= 0) {
        return;
      }
      moves.flip(best);
      if (pace.after(moves.steps())) {
        return;
      }
    }
  }

  /** A local minimum below a state, by the form's own coefficients. */
  State polished(State state, SplittableRandom random, Pace pace) {
    descend(state, random, pace.ended() ? Pace.closing() : pace);
    if (exact) {
      return moves.state();
    }
    fields.set(moves.state());
    descent.run(pace.ended() ? Pace.closing() : pace);
    return fields.state();
  }
}
