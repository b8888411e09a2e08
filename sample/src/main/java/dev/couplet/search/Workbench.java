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
import dev.couplet.sampling.Vigil;
import java.util.Optional;
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

  /** Whether all coefficients can be gone over several times between two looks at the clock. */
  private final boolean small;

  private final LocalFields fields;
  private final Descent descent;

  private Workbench(Qubo form, MoveRows rows, Adjacency own, Run run) {
    this.moves = new Moves(rows);
    this.goal = new Goal(form, rows, run.effort().target());
    this.walk = new TabuWalk(moves, goal);
    this.exact = rows.exact();
    this.small = form.size() + 2L * form.pairs() <= Vigil.STEPS / 8;
    this.fields = new LocalFields(own);
    this.descent = new Descent(fields);
  }

  /** Makes a bench for each thread of a run, unless the pace ends before what they share is. */
  static Optional<Supplier<Workbench>> of(Qubo form, Run run, Pace pace) {
    return MoveRows.of(form, pace)
        .flatMap(
            rows ->
                byNeighbours(form, rows, pace)
                    .map(own -> () -> new Workbench(form, rows, own, run)));
  }

  /** A dense form with whole coefficients is searched by its moves alone. */
  private static Optional<Adjacency> byNeighbours(Qubo form, MoveRows rows, Pace pace) {
    return rows.dense() && !rows.exact() ? Adjacency.of(form, pace) : Optional.of(rows.adjacency());
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

  /**
   * Goes down from a state, cheaply if the form is sparse; returns how far it came. The moves are
   * there, too, unless the pace ended it.
   */
  State descend(State begin, SplittableRandom random, Pace pace) {
    State from = begin;
    if (fields.size() == moves.size()) {
      if (!fields.set(begin, pace)) {
        return begin;
      }
      descent.run(pace);
      if (pace.ended()) {
        descent.close();
        return fields.state();
      }
      from = fields.state();
    }
    return moves.set(from, pace) ? lowered(random, pace) : from;
  }

  private State lowered(SplittableRandom random, Pace pace) {
    while (!pace.ended()) {
      int best = moves.best(random);
      if (best < 0 || moves.gain(best) >= 0) {
        break;
      }
      moves.flip(best);
      if (pace.after(moves.steps())) {
        break;
      }
    }
    return moves.state();
  }

  /**
   * A local minimum below a state, by the form's own coefficients; once the pace has ended, the
   * state itself if the form is too large to get there soon.
   */
  State polished(State state, SplittableRandom random, Pace pace) {
    if (pace.ended() && !small) {
      return state;
    }
    State lower = descend(state, random, pace.ended() ? Pace.closing() : pace);
    if (exact || (pace.ended() && !small)) {
      return lower;
    }
    if (fields.set(lower, pace.ended() ? Pace.closing() : pace)) {
      descent.run(pace.ended() ? Pace.closing() : pace);
      return fields.state();
    }
    return lower;
  }
}
