package dev.couplet.solve;

import dev.couplet.exact.plans.PlanSearch;
import dev.couplet.exact.plans.PlanSearch.Found;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Effort;
import java.util.Locale;
import java.util.Optional;

/**
 * Branches over the decisions of the model: with a share of the time that is left; or, where
 * nothing but draws are counted, over so many nodes.
 */
final class SearchStage {
  private static final long FEW_NODES = 5000;

  private SearchStage() {}

  /**
   * What a search came to.
   *
   * @param share the part of the time left that it may take, in hundredths
   */
  static Found run(Statement statement, Optional<Plan> start, int share, Course course) {
    Effort effort = course.left(share);
    PlanSearch method = PlanSearch.standard();
    PlanSearch limited = effort.limit().isPresent() ? method : method.nodes(FEW_NODES);
    Found found = limited.search(statement, start, effort, course.watch());
    course.finished("search", outcome(found));
    return found;
  }

  private static String outcome(Found found) {
    String value =
        found
            .best()
            .map(plan -> String.format(Locale.ROOT, "value %.12g, ", plan.value()))
            .orElse("no plan, ");
    String bound =
        found.complete() ? "proved" : String.format(Locale.ROOT, "bound %.12g", found.bound());
    String alike = found.alike().isEmpty() ? "" : ", alike: " + String.join("; ", found.alike());
    return value + bound + ", " + found.nodes() + " nodes" + alike;
  }
}
