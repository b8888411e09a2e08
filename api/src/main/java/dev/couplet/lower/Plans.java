package dev.couplet.lower;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.model.Plan;
import java.util.Iterator;
import java.util.List;

/**
 * The plans that draws stand for, better ones first: feasible before infeasible, then by value;
 * equal plans merged. At least one. Immutable.
 */
@CheckReturnValue
public final class Plans implements Iterable<Plan> {
  private final List<Plan> ordered;

  Plans(List<Plan> plans) {
    this.ordered = plans.stream().sorted().distinct().toList();
  }

  /** The best plan. */
  public Plan best() {
    return ordered.get(0);
  }

  /** All different plans, better ones first. */
  public List<Plan> all() {
    return ordered;
  }

  /** The feasible plans, better ones first. */
  public List<Plan> feasible() {
    return ordered.stream().filter(Plan::feasible).toList();
  }

  @Override
  public Iterator<Plan> iterator() {
    return ordered.iterator();
  }

  @Override
  public String toString() {
    return "Plans(" + ordered.size() + ", " + feasible().size() + " feasible, best " + best() + ")";
  }
}
