package dev.couplet.audit;

import dev.couplet.lower.Lowered;
import dev.couplet.model.Decision;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * What the statement itself says of a pattern of the decision bits: whether it is a plan, whether
 * that is feasible, and what it is worth; from the rules and objectives alone, without the form.
 */
final class Truth implements Flips {
  /** A part of a rule, the value of its terms, and what its violations cost as far as known. */
  private record Tracked(Rule.Part part, RunningTerms terms, Map<Double, Double> costs) {
    Tracked(Rule.Part part) {
      this(part, new RunningTerms(part.terms()), new HashMap<>());
    }

    boolean broken() {
      double value = terms.value();
      boolean outside = value > part.highest() || value < part.lowest();
      return outside || (part.step() > 1 && (value - part.lowest()) % part.step() != 0);
    }

    double cost() {
      return broken() ? costs.computeIfAbsent(part.violation(terms.value()), part::cost) : 0;
    }
  }

  private final List<DecisionBits> decisions = new ArrayList<>();
  private final DecisionBits[] decisionOf;
  private final int[] groupOf;
  private final int[] held;
  private final boolean[] holds;
  private final List<Tracked> required = new ArrayList<>();
  private final List<Tracked> preferred = new ArrayList<>();
  private final RunningTerms objective;
  private final int sign;
  private int uneven;
  private int undecided;

  Truth(Lowered lowered) {
    Statement statement = lowered.statement();
    decisionOf = new DecisionBits[lowered.decisionBits()];
    holds = new boolean[statement.literals()];
    groupOf = new int[statement.literals()];
    Arrays.fill(groupOf, -1);
    int groups = 0;
    for (Decision decision : statement.decisions()) {
      DecisionBits bits = new DecisionBits(lowered, decision);
      decisions.add(bits);
      Arrays.fill(decisionOf, bits.firstBit(), bits.firstBit() + bits.bits(), bits);
      for (List<Integer> group : statement.exactlyOne(decision)) {
        for (int literal : group) {
          groupOf[literal] = groups;
        }
        groups++;
      }
    }
    held = new int[groups];
    for (Rule rule : statement.rules()) {
      rule.parts().forEach(part -> (rule.required() ? required : preferred).add(new Tracked(part)));
    }
    objective = new RunningTerms(statement.objective());
    sign = statement.sense().sign();
  }

  @Override
  public void reset(long pattern) {
    Arrays.fill(holds, false);
    undecided = 0;
    for (DecisionBits decision : decisions) {
      for (int bit = 0; bit < decision.bits() && decision.isPlain(); bit++) {
        int at = decision.firstBit() + bit;
        holds[decision.literal(at)] = (pattern >>> at & 1) != 0;
      }
      if (!decision.isPlain()) {
        undecided += decision.undecided(pattern) ? 1 : 0;
        for (int literal : decision.holding(pattern)) {
          holds[literal] = true;
        }
      }
    }
    countGroups();
    objective.reset(holds);
    required.forEach(part -> part.terms().reset(holds));
    preferred.forEach(part -> part.terms().reset(holds));
  }

  private void countGroups() {
    Arrays.fill(held, 0);
    for (int literal = 0; literal < holds.length; literal++) {
      if (holds[literal] && groupOf[literal] >= 0) {
        held[groupOf[literal]]++;
      }
    }
    uneven = 0;
    for (int count : held) {
      uneven += count == 1 ? 0 : 1;
    }
  }

  @Override
  public void flip(int bit, long pattern) {
    DecisionBits decision = decisionOf[bit];
    if (decision.isPlain()) {
      change(decision.literal(bit), (pattern >>> bit & 1) != 0);
      return;
    }
    long before = pattern ^ 1L << bit;
    undecided += (decision.undecided(pattern) ? 1 : 0) - (decision.undecided(before) ? 1 : 0);
    for (int literal : decision.holding(before)) {
      change(literal, false);
    }
    for (int literal : decision.holding(pattern)) {
      change(literal, true);
    }
  }

  private void change(int literal, boolean now) {
    holds[literal] = now;
    int group = groupOf[literal];
    if (group >= 0) {
      uneven -= held[group] == 1 ? 0 : 1;
      held[group] += now ? 1 : -1;
      uneven += held[group] == 1 ? 0 : 1;
    }
    objective.change(literal, now);
    for (Tracked part : required) {
      part.terms().change(literal, now);
    }
    for (Tracked part : preferred) {
      part.terms().change(literal, now);
    }
  }

  /** Whether every decision has one value under the pattern walked to last. */
  boolean decided() {
    return uneven == 0 && undecided == 0;
  }

  /** Whether the pattern walked to last is a plan that keeps every required rule. */
  boolean feasible() {
    if (!decided()) {
      return false;
    }
    for (Tracked part : required) {
      if (part.broken()) {
        return false;
      }
    }
    return true;
  }

  /** What the plan is worth, with the sign under which it is minimised. */
  double minimised() {
    double cost = 0;
    for (Tracked part : preferred) {
      cost += part.cost();
    }
    return sign * objective.value() + cost;
  }

  /** About how many numbers a flip of the bit reads. */
  int effort(int bit) {
    DecisionBits decision = decisionOf[bit];
    int literal = decision.isPlain() ? decision.literal(bit) : 0;
    int sum = objective.termsOf(literal);
    for (Tracked part : required) {
      sum += part.terms().termsOf(literal);
    }
    return sum;
  }

  /** The decisions of which some value is stood for by no pattern. */
  List<DecisionBits> incomplete(Statement statement) {
    return decisions.stream()
        .filter(one -> !one.isPlain() && one.values() != wanted(statement, one.decision()))
        .toList();
  }

  /** The number of patterns of literals that are values of a decision. */
  static long wanted(Statement statement, Decision decision) {
    if (statement.isFixed(decision)) {
      return 1;
    }
    List<List<Integer>> groups = statement.exactlyOne(decision);
    long values = 1;
    for (List<Integer> group : groups) {
      values *= group.size();
    }
    return groups.isEmpty() ? decision.values() : values;
  }
}
