package dev.couplet.exact;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.List;

/**
 * Objective and rules of a statement, kept up to date while literals are turned on and off.
 *
 * <p>Invariant: {@code missing[t]} is the number of literals of term t that do not hold, and {@code
 * sum[o]} the sum of the coefficients of owner o's terms with none missing; owner 0 is the
 * objective, brought to minimising, owner p + 1 is part p of all rules. Sums of rules are whole and
 * exact.
 */
final class PlanScore {
  private final List<Rule.Part> parts = new ArrayList<>();
  private final boolean[] required;
  private final boolean[] holds;
  private final int[][] termsOf;
  private final int[] owner;
  private final double[] coefficient;
  private final int[] missing;
  private final double[] sum;
  private final double[] costOf;
  private final double error;
  private int broken;
  private double preferredCost;

  PlanScore(Statement statement) {
    List<Boolean> mustHold = new ArrayList<>();
    for (Rule rule : statement.rules()) {
      parts.addAll(rule.parts());
      rule.parts().forEach(part -> mustHold.add(rule.required()));
    }
    this.required = new boolean[parts.size()];
    for (int p = 0; p < required.length; p++) {
      required[p] = mustHold.get(p);
    }
    this.holds = new boolean[statement.literals()];
    List<Polynomial> owned = new ArrayList<>();
    owned.add(statement.objective().times(statement.sense().sign()));
    parts.forEach(part -> owned.add(part.terms()));
    int terms = owned.stream().mapToInt(Polynomial::terms).sum();
    this.owner = new int[terms];
    this.coefficient = new double[terms];
    this.missing = new int[terms];
    this.sum = new double[owned.size()];
    this.costOf = new double[parts.size()];
    this.termsOf = index(owned, statement.literals());
    this.error = error(owned.get(0), statement);
    for (int p = 0; p < parts.size(); p++) {
      score(p, 1);
    }
  }

  private int[][] index(List<Polynomial> owned, int literals) {
    List<List<Integer>> lists = new ArrayList<>();
    for (int literal = 0; literal < literals; literal++) {
      lists.add(new ArrayList<>());
    }
    int[] next = {0};
    for (int o = 0; o < owned.size(); o++) {
      int own = o;
      owned
          .get(o)
          .forEachTerm(
              (value, variables) -> {
                int term = next[0]++;
                owner[term] = own;
                coefficient[term] = value;
                missing[term] = variables.length;
                sum[own] += variables.length == 0 ? value : 0;
                for (int variable : variables) {
                  lists.get(variable).add(term);
                }
              });
    }
    return lists.stream()
        .map(list -> list.stream().mapToInt(Integer::intValue).toArray())
        .toArray(int[][]::new);
  }

  /** How far an updated sum can be from the true one; 0 where all numbers are whole. */
  private static double error(Polynomial objective, Statement statement) {
    double[] magnitude = {0};
    boolean[] whole = {true};
    objective.forEachTerm(
        (value, variables) -> {
          magnitude[0] += Math.abs(value);
          whole[0] &= value == Math.rint(value);
        });
    for (Rule rule : statement.rules()) {
      magnitude[0] += rule.largestCost();
      for (Rule.Part part : rule.parts()) {
        double unitCost = part.cost(1);
        whole[0] &= unitCost == Math.rint(unitCost);
      }
    }
    return whole[0] && magnitude[0] < 0x1p51 ? 0 : magnitude[0] * 0x1p-30;
  }

  void turnOn(int literal) {
    holds[literal] = true;
    for (int term : termsOf[literal]) {
      if (--missing[term] == 0) {
        add(owner[term], coefficient[term]);
      }
    }
  }

  void turnOff(int literal) {
    holds[literal] = false;
    for (int term : termsOf[literal]) {
      if (missing[term]++ == 0) {
        add(owner[term], -coefficient[term]);
      }
    }
  }

  private void add(int own, double amount) {
    if (own == 0) {
      sum[0] += amount;
      return;
    }
    score(own - 1, -1);
    sum[own] += amount;
    score(own - 1, 1);
  }

  /** Counts a part of a rule in, or out again. */
  private void score(int p, int sign) {
    double violation = parts.get(p).violation(sum[p + 1]);
    if (violation == 0) {
      costOf[p] = 0;
    } else if (required[p]) {
      broken += sign;
    } else {
      costOf[p] = sign > 0 ? parts.get(p).cost(violation) : costOf[p];
      preferredCost += sign * costOf[p];
    }
  }

  /** Whether every required rule is kept. */
  boolean feasible() {
    return broken == 0;
  }

  /** The value, brought to minimising. */
  double cost() {
    return sum[0] + preferredCost;
  }

  /** How far {@link #cost} can be from the true one. */
  double error() {
    return error;
  }

  State state() {
    return State.of(holds);
  }
}
