package dev.couplet.solve;

import dev.couplet.exact.PlanEnumeration;
import dev.couplet.exact.PlanEnumeration.Found;
import dev.couplet.model.Statement;
import java.time.Duration;

/** Looks at every plan where there are few enough of them for that to be the cheapest proof. */
final class PlanStage {
  private static final long MOST_PLANS = 1L << 22;

  /** A cautious figure for one plan; only decides whether the stage is begun at all. */
  private static final Duration A_PLAN = Duration.ofNanos(250);

  private PlanStage() {}

  static boolean fits(Statement statement, Course course) {
    long plans = PlanEnumeration.standard().plans(statement);
    if (plans > MOST_PLANS) {
      return false;
    }
    Duration expected = A_PLAN.multipliedBy(plans);
    return course.left().limit().map(left -> expected.compareTo(left) <= 0).orElse(true);
  }

  static Found run(Statement statement, Course course) {
    Found found = PlanEnumeration.standard().search(statement, course.vigil());
    String outcome = found.looked() + (found.complete() ? " plans, all there are" : " plans");
    course.finished("every plan", outcome);
    return found;
  }
}
