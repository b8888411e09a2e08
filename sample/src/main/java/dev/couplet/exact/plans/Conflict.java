package dev.couplet.exact.plans;

import java.util.List;

/**
 * Rules that no plan can keep together. Immutable.
 *
 * @param rules their names, in the order of the model; none if the decisions alone have no plan
 * @param minimal whether it is proved that leaving out any one of them leaves a plan
 */
public record Conflict(List<String> rules, boolean minimal) {
  /** Copies the list of names. */
  public Conflict {
    rules = List.copyOf(rules);
  }
}
