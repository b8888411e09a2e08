package dev.couplet.solve;

import dev.couplet.exact.plans.Conflict;
import dev.couplet.exact.plans.PlanSearch;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Effort;
import java.time.Duration;
import java.util.Optional;

/**
 * Names rules that cannot hold together, once it is proved that no plan keeps all: with twice the
 * time that the proof took, at least a twentieth of what is left; or, where nothing but draws are
 * counted, over so many nodes.
 */
final class ConflictStage {
  private static final long NODES = 100_000;
  private static final int LEAST_SHARE = 20;

  private ConflictStage() {}

  static Optional<Conflict> run(Statement statement, Course course) {
    PlanSearch method = PlanSearch.standard();
    if (!method.fits(statement)) {
      return Optional.empty();
    }
    Effort left = course.left().withoutTarget();
    Duration twice = course.vigil().elapsed().multipliedBy(2);
    Effort effort = left.limit().map(time -> left.limit(share(time, twice))).orElse(left);
    PlanSearch limited = effort.limit().isPresent() ? method : method.nodes(NODES);
    Optional<Conflict> conflict = limited.conflict(statement, effort, course.quietly());
    course.finished("conflict", conflict.map(ConflictStage::outcome).orElse("none singled out"));
    return conflict;
  }

  private static Duration share(Duration left, Duration wanted) {
    Duration least = left.dividedBy(LEAST_SHARE).plusNanos(1);
    Duration share = wanted.compareTo(least) < 0 ? least : wanted;
    return share.compareTo(left) < 0 ? share : left;
  }

  private static String outcome(Conflict conflict) {
    String none = conflict.minimal() ? ", none of which can be left out" : "";
    return conflict.rules().size() + " rules that cannot hold together" + none;
  }
}
