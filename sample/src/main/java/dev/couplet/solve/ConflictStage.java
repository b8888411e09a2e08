package dev.couplet.solve;

import dev.couplet.exact.plans.Conflict;
import dev.couplet.exact.plans.PlanSearch;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Effort;
import java.util.Optional;

/**
 * Names rules that cannot hold together, once it is proved that no plan keeps all: with the time
 * that is left; or, where nothing but draws are counted, over so many nodes.
 */
final class ConflictStage {
  private static final long NODES = 100_000;

  private ConflictStage() {}

  static Optional<Conflict> run(Statement statement, Course course) {
    PlanSearch method = PlanSearch.standard();
    if (!method.fits(statement)) {
      return Optional.empty();
    }
    Effort effort = course.left().withoutTarget();
    PlanSearch limited = effort.limit().isPresent() ? method : method.nodes(NODES);
    Optional<Conflict> conflict = limited.conflict(statement, effort, course.quietly());
    course.finished("conflict", conflict.map(ConflictStage::outcome).orElse("none singled out"));
    return conflict;
  }

  private static String outcome(Conflict conflict) {
    String none = conflict.minimal() ? ", none of which can be left out" : "";
    return conflict.rules().size() + " rules that cannot hold together" + none;
  }
}
