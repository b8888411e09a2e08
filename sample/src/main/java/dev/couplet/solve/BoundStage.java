package dev.couplet.solve;

import dev.couplet.bound.Rounding;
import dev.couplet.bound.SplitBound;
import dev.couplet.form.Polynomial;
import dev.couplet.form.Qubo;
import dev.couplet.lower.Lowered;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import java.time.Duration;
import java.util.Locale;

/**
 * Bounds what every feasible plan costs from below: by the range of the objective over plans, and
 * by the bound of the whole form, whose penalties vanish on feasible plans.
 */
final class BoundStage {
  private static final int SHARE_OF_TIME = 10;

  private BoundStage() {}

  static double run(Lowered lowered, Course course) {
    double bound = Math.max(byRange(lowered.statement()), byForm(lowered.qubo(), course));
    course.finished("bound", shown(lowered.valueOf(bound)));
    return bound;
  }

  private static String shown(double value) {
    boolean whole = value == Math.rint(value) && Math.abs(value) < 0x1p53;
    return whole ? Long.toString((long) value) : String.format(Locale.ROOT, "%.6g", value);
  }

  /** Preferred rules cost nothing at the least. */
  static double byRange(Statement statement) {
    Polynomial minimised = statement.objective().times(statement.sense().sign());
    return statement.range(minimised).lowest();
  }

  static double byForm(Qubo form, Course course) {
    // A counted effort gets the method's own rounds, so that no clock decides what is returned.
    Effort counted = Effort.draws(1);
    Effort effort =
        course.left().limit().map(BoundStage::share).map(counted::limit).orElse(counted);
    Run run = Run.of(effort).watch(course.quietly());
    return SplitBound.standard().below(form, run) - Rounding.ofEnergy(form);
  }

  private static Duration share(Duration left) {
    Duration share = left.dividedBy(SHARE_OF_TIME);
    return share.isZero() ? left : share;
  }
}
