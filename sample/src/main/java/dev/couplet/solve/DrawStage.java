package dev.couplet.solve;

import dev.couplet.anneal.Annealing;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Structure;
import dev.couplet.search.Relinking;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Draws states of a form until the effort is spent, or an energy at the bound leaves no more to
 * win.
 */
final class DrawStage {
  private static final int DENSE_DEGREE = 20;
  private static final int LARGE = 100;

  private DrawStage() {}

  static Draws run(
      Qubo form,
      List<State> starts,
      Structure structure,
      double bound,
      OptionalDouble target,
      int share,
      Course course) {
    Effort effort = course.left(share);
    double stopAt = Math.max(bound, target.orElse(Double.NEGATIVE_INFINITY));
    Run run = new Run(effort.target(stopAt), course.watch(), starts, structure);
    Draws draws = method(form, run).sample(form, run);
    course.finished("draws", outcome(draws));
    return draws;
  }

  /** Spelt out, since time is up: linking a first concatenation takes some ten milliseconds. */
  private static String outcome(Draws draws) {
    StringBuilder text = new StringBuilder();
    text.append(draws.total()).append(" draws, ");
    return text.append(draws.rows().size()).append(" different").toString();
  }

  /** Path relinking on large dense forms with time to spend; annealing knows structure. */
  private static Sampler method(Qubo form, Run run) {
    boolean dense = form.pairs() >= DENSE_DEGREE / 2L * form.size();
    boolean plain = run.structure().exactlyOne().isEmpty();
    boolean timed = run.effort().limit().isPresent() && run.effort().draws().isEmpty();
    return dense && plain && timed && form.size() >= LARGE
        ? Relinking.standard()
        : Annealing.standard();
  }

  /** Why the run ended as the caller sees it: reaching the bound is not a target of theirs. */
  static End end(Draws draws, OptionalDouble target) {
    boolean ownTarget = target.isPresent() && draws.best().energy() <= target.getAsDouble();
    return draws.end() == End.TARGET && !ownTarget ? End.DONE : draws.end();
  }
}
