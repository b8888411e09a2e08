package dev.couplet.exact;

import dev.couplet.form.State;
import dev.couplet.model.Decision;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;

/** Passes every plan of a statement to a listener, each worked out from scratch. */
final class EveryPlan {
  private static final int LOOK_EVERY = 64;

  private EveryPlan() {}

  /** Passes all of them; false if the vigil ended first. */
  static boolean of(Statement statement, Consumer<Plan> listener, Vigil vigil) {
    List<int[]> groups = new ArrayList<>();
    for (Decision decision : statement.decisions()) {
      groups.addAll(groups(statement, decision));
    }
    int[] moving = groups.stream().mapToInt(EveryPlan::values).toArray();
    boolean[] literals = new boolean[statement.literals()];
    int[] digit = new int[moving.length];
    for (int d = 0; d < moving.length; d++) {
      put(groups.get(d), 0, literals);
    }
    for (long looked = 0; ; looked++) {
      if (looked % LOOK_EVERY == 0 && vigil.over()) {
        return false;
      }
      listener.accept(statement.plan(State.of(literals)));
      int d = 0;
      for (; d < digit.length && digit[d] == moving[d] - 1; d++) {
        digit[d] = 0;
        put(groups.get(d), 0, literals);
      }
      if (d == digit.length) {
        return true;
      }
      put(groups.get(d), ++digit[d], literals);
    }
  }

  /** The literals of which one holds at a time; a single one stands for itself. */
  private static List<int[]> groups(Statement statement, Decision decision) {
    List<int[]> groups = new ArrayList<>();
    List<List<Integer>> exactlyOne = statement.exactlyOne(decision);
    exactlyOne.forEach(g -> groups.add(g.stream().mapToInt(Integer::intValue).toArray()));
    for (int literal : statement.free(decision)) {
      groups.add(new int[] {-1, literal});
    }
    return groups;
  }

  private static int values(int[] group) {
    return group.length;
  }

  private static void put(int[] group, int value, boolean[] literals) {
    for (int k = 0; k < group.length; k++) {
      if (group[k] >= 0) {
        literals[group[k]] = k == value;
      }
    }
  }
}
