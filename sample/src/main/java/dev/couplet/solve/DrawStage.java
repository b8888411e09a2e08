package dev.couplet.solve;

import dev.couplet.anneal.Annealing;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Structure;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Draws states of a form until the effort is spent, or an energy at the bound leaves no more to
 * win.
 */
final class DrawStage {
  private DrawStage() {}

  static Draws run(
      Qubo form,
      List<State> starts,
      Structure structure,
      double bound,
      OptionalDouble target,
      Course course) {
    Effort effort = course.left();
    double stopAt = Math.max(bound, target.orElse(Double.NEGATIVE_INFINITY));
    Run run = new Run(effort.target(stopAt), course.watch(), starts, structure);
    Draws draws = Annealing.standard().sample(form, run);
    course.finished("draws", draws.total() + " draws, " + draws.rows().size() + " different");
    return draws;
  }

  /** Why the run ended as the caller sees it: reaching the bound is not a target of theirs. */
  static End end(Draws draws, OptionalDouble target) {
    boolean ownTarget = target.isPresent() && draws.best().energy() <= target.getAsDouble();
    return draws.end() == End.TARGET && !ownTarget ? End.DONE : draws.end();
  }
}
