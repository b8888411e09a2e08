package dev.couplet.solve;

import dev.couplet.exact.Enumeration;
import dev.couplet.form.Qubo;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import java.time.Duration;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Solves a form without a model: enumeration where that is cheap, else a try at a proof, a bound,
 * and draws.
 */
final class FormSolver {
  private static final int FEW_BITS = 24;

  private FormSolver() {}

  static Draws sample(Qubo form, Run run) {
    run.requireFit(form.size());
    if (enumerable(form, run)) {
      return Enumeration.standard().sample(form, run);
    }
    Course course = new Course(run.effort(), run.watch());
    Optional<Draws> proof = ProofStage.run(form, run.starts(), course);
    if (proof.isPresent() && (proof.get().proved() || course.vigil().over())) {
      Draws known = proof.get();
      OptionalDouble best = OptionalDouble.of(known.best().energy());
      course.vigil().report(OptionalDouble.of(1), best, known.bound());
      return known.end(endOf(known, course));
    }
    return drawn(form, run, proof, course);
  }

  /** A proof that came in time is all the work there is; else what ended the run counts. */
  private static End endOf(Draws proof, Course course) {
    OptionalDouble target = course.effort().target();
    if (target.isPresent() && proof.best().energy() <= target.getAsDouble()) {
      return End.TARGET;
    }
    return proof.proved() ? End.DONE : course.vigil().reason();
  }

  private static Draws drawn(Qubo form, Run run, Optional<Draws> proof, Course course) {
    double ofProof =
        proof
            .map(Draws::bound)
            .filter(OptionalDouble::isPresent)
            .map(OptionalDouble::getAsDouble)
            .orElse(Double.NEGATIVE_INFINITY);
    double bound = Math.max(ofProof, BoundStage.byForm(form, course));
    OptionalDouble target = run.effort().target();
    Draws draws = DrawStage.run(form, run.starts(), run.structure(), bound, target, 100, course);
    End end = DrawStage.end(draws, target);
    boolean better = proof.isPresent() && proof.get().best().energy() < draws.best().energy();
    Draws best = (better ? proof.get() : draws).end(end);
    return bound == Double.NEGATIVE_INFINITY
        ? best
        : best.bound(Math.min(bound, best.best().energy()));
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
