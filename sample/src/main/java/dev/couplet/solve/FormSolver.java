package dev.couplet.solve;

import dev.couplet.exact.Enumeration;
import dev.couplet.form.Qubo;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Run;
import java.time.Duration;
import java.util.OptionalDouble;

/** Solves a form without a model: enumeration where that is cheap, else a bound and draws. */
final class FormSolver {
  private static final int FEW_BITS = 24;

  private FormSolver() {}

  static Draws sample(Qubo form, Run run) {
    run.requireFit(form.size());
    if (enumerable(form, run)) {
      return Enumeration.standard().sample(form, run);
    }
    Course course = new Course(run.effort(), run.watch());
    double bound = BoundStage.byForm(form, course);
    OptionalDouble target = run.effort().target();
    Draws draws = DrawStage.run(form, run.starts(), run.structure(), bound, target, course);
    Draws ended = draws.end(DrawStage.end(draws, target));
    return ended.bound(Math.min(bound, draws.best().energy()));
  }

  /** A state takes about a nanosecond; half the time may go into a proof. */
  private static boolean enumerable(Qubo form, Run run) {
    if (form.size() > Enumeration.MOST_BITS) {
      return false;
    }
    Duration states = Duration.ofNanos(1L << form.size());
    return run.effort()
        .limit()
        .map(limit -> states.compareTo(limit.dividedBy(2)) <= 0)
        .orElse(form.size() <= FEW_BITS);
  }
}
