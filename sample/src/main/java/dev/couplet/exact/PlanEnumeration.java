package dev.couplet.exact;

import dev.couplet.model.Decision;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Looks at every plan of a model: every combination of one literal of each group and any value of
 * the others, far fewer than the patterns of the bits that the model is lowered to.
 *
 * <p>The result needs no weights and no lowering: the best feasible plan is optimal, and if there
 * is none, no plan keeps all rules. Plans are walked so that one of these moves by one a step;
 * objective and rules are updated by the terms that speak of it.
 *
 * <p>Time O(plans x terms that a literal occurs in). Immutable and thread-safe.
 */
public final class PlanEnumeration {
  private static final int LOOK_EVERY = 1 << 12;

  private PlanEnumeration() {}

  /** An enumeration; it has no settings. */
  public static PlanEnumeration standard() {
    return new PlanEnumeration();
  }

  /**
   * What an enumeration found.
   *
   * @param best the best feasible plan among those looked at; the first of the walk among equals
   * @param looked how many plans were looked at
   * @param complete whether these were all
   */
  public record Found(Optional<Plan> best, long looked, boolean complete) {}

  /** The number of plans of a statement; the largest long if it is larger than that. */
  public long plans(Statement statement) {
    long plans = 1;
    for (int values : radixes(statement)) {
      if (plans > Long.MAX_VALUE / values) {
        return Long.MAX_VALUE;
      }
      plans *= values;
    }
    return plans;
  }

  /** The sizes of the groups of which one literal holds, and 2 for every literal in none. */
  private static List<Integer> radixes(Statement statement) {
    List<Integer> radixes = new ArrayList<>();
    for (Decision decision : statement.decisions()) {
      List<List<Integer>> groups = statement.exactlyOne(decision);
      groups.forEach(group -> radixes.add(group.size()));
      statement.free(decision).forEach(literal -> radixes.add(2));
    }
    return radixes;
  }

  /** Looks at all plans, or at as many as the vigil allows. */
  public Found search(Statement statement, Vigil vigil) {
    Walk walk = new Walk(statement);
    double plans = plans(statement);
    for (long looked = 0; ; ) {
      if (looked % LOOK_EVERY == 0 && vigil.over()) {
        return new Found(walk.best, looked, false);
      }
      walk.look();
      looked++;
      if (!walk.step()) {
        return new Found(walk.best, looked, true);
      }
      if (looked % LOOK_EVERY == 0) {
        OptionalDouble share = OptionalDouble.of(looked / plans);
        vigil.report(share, walk.bestValue(), OptionalDouble.empty());
      }
    }
  }

  /** A plan that moves by one group or literal at a time. */
  private static final class Walk {
    private final Statement statement;
    private final int[] first;
    private final boolean[] grouped;
    private final MixedRadix digits;
    private final PlanScore score;
    private final int[] before;
    private Optional<Plan> best = Optional.empty();
    private double lowest = Double.POSITIVE_INFINITY;

    Walk(Statement statement) {
      this.statement = statement;
      this.score = new PlanScore(statement);
      List<int[]> moving = new ArrayList<>();
      for (Decision decision : statement.decisions()) {
        List<List<Integer>> groups = statement.exactlyOne(decision);
        for (List<Integer> group : groups) {
          score.turnOn(group.get(0));
          moving.add(new int[] {group.get(0), group.size(), 1});
        }
        for (int literal : statement.free(decision)) {
          moving.add(new int[] {literal, 2, 0});
        }
      }
      moving.removeIf(one -> one[1] == 1);
      this.first = moving.stream().mapToInt(one -> one[0]).toArray();
      this.digits = new MixedRadix(moving.stream().mapToInt(one -> one[1]).toArray());
      this.grouped = new boolean[first.length];
      for (int d = 0; d < first.length; d++) {
        grouped[d] = moving.get(d)[2] == 1;
      }
      this.before = new int[first.length];
    }

    /** Keeps the plan the walk stands at if it is feasible and better than the best so far. */
    void look() {
      if (!score.feasible() || score.cost() >= lowest + score.error()) {
        return;
      }
      Plan plan = statement.plan(score.state());
      double cost = statement.sense().sign() * plan.value();
      if (plan.feasible() && cost < lowest) {
        best = Optional.of(plan);
        lowest = cost;
      }
    }

    /** Moves one group or literal by one; false if every plan has been seen. */
    boolean step() {
      int moved = digits.step();
      if (moved < 0) {
        return false;
      }
      int to = digits.digit(moved);
      if (grouped[moved]) {
        score.turnOff(first[moved] + before[moved]);
        score.turnOn(first[moved] + to);
      } else if (to == 1) {
        score.turnOn(first[moved]);
      } else {
        score.turnOff(first[moved]);
      }
      before[moved] = to;
      return true;
    }

    OptionalDouble bestValue() {
      return best.map(plan -> OptionalDouble.of(plan.value())).orElse(OptionalDouble.empty());
    }
  }
}
