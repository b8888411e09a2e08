package dev.couplet.model;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Statement.Range;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.IntFunction;
import java.util.function.IntPredicate;

/**
 * Bounds what a polynomial over literals can be worth when every choice is exactly one of its
 * options.
 *
 * <p>Terms are grouped by the decisions they speak of. Two terms of one group name different
 * options of some choice, so that at most one of them holds; the extremes of the group are those of
 * its coefficients, and 0 unless the group covers every combination. Sums of groups bound the
 * whole, and are exact for linear polynomials.
 */
final class Ranges {
  private static final class Group {
    double lowest = Double.POSITIVE_INFINITY;
    double highest = Double.NEGATIVE_INFINITY;
    long terms;
    long combinations;
  }

  private final IntPredicate grouped;
  private final IntFunction<Decision> decisionOf;
  private final Map<List<Integer>, Group> groups = new LinkedHashMap<>();
  private double lowest;
  private double highest;
  private double magnitude;
  private boolean whole = true;
  private long terms;

  private Ranges(IntPredicate grouped, IntFunction<Decision> decisionOf) {
    this.grouped = grouped;
    this.decisionOf = decisionOf;
  }

  /**
   * The range of a polynomial over literals.
   *
   * @param grouped whether exactly one of a group that a literal belongs to holds
   * @param decisionOf the decision that a literal belongs to
   */
  static Range of(Polynomial polynomial, IntPredicate grouped, IntFunction<Decision> decisionOf) {
    Ranges ranges = new Ranges(grouped, decisionOf);
    polynomial.forEachTerm(ranges::take);
    ranges.groups.values().forEach(ranges::close);
    return outward(ranges.lowest, ranges.highest, ranges.whole, ranges.magnitude, ranges.terms);
  }

  /** The range of a polynomial over literals of which every pattern is a plan. */
  static Range ofFree(Polynomial polynomial) {
    return outward(
        polynomial.lowest(),
        polynomial.highest(),
        polynomial.whole(),
        polynomial.magnitude(),
        polynomial.terms());
  }

  private void take(double coefficient, int[] literals) {
    magnitude += Math.abs(coefficient);
    whole &= coefficient == Math.rint(coefficient);
    terms++;
    boolean free = true;
    for (int literal : literals) {
      free &= !grouped.test(literal);
    }
    if (literals.length == 0) {
      lowest += coefficient;
      highest += coefficient;
    } else if (free) {
      lowest += Math.min(0, coefficient);
      highest += Math.max(0, coefficient);
    } else if (possible(literals)) {
      collect(coefficient, literals);
    }
  }

  /** Two literals of one group never hold together. */
  private boolean possible(int[] literals) {
    for (int k = 1; k < literals.length; k++) {
      Decision decision = decisionOf.apply(literals[k]);
      if (decision == decisionOf.apply(literals[k - 1])) {
        Slot slot = Slot.of(decision);
        if (slot.groups() > 0 && slot.groupOf(literals[k]) == slot.groupOf(literals[k - 1])) {
          return false;
        }
      }
    }
    return true;
  }

  private void collect(double coefficient, int[] literals) {
    List<Integer> key = new ArrayList<>(literals.length);
    long combinations = 1;
    for (int literal : literals) {
      Slot slot = Slot.of(decisionOf.apply(literal));
      if (slot.groups() > 0) {
        key.add(slot.groupOf(literal));
        combinations = Math.min(Long.MAX_VALUE / slot.groupSize(), combinations) * slot.groupSize();
      } else {
        key.add(literal);
        combinations = Long.MAX_VALUE / Integer.MAX_VALUE;
      }
    }
    Group group = groups.computeIfAbsent(key, k -> new Group());
    group.combinations = combinations;
    group.terms++;
    group.lowest = Math.min(group.lowest, coefficient);
    group.highest = Math.max(group.highest, coefficient);
  }

  private void close(Group group) {
    boolean covered = group.terms == group.combinations;
    lowest += covered ? group.lowest : Math.min(0, group.lowest);
    highest += covered ? group.highest : Math.max(0, group.highest);
  }

  /**
   * Whole numbers below 2^51 were added without rounding; other sums are widened by their error.
   */
  private static Range outward(
      double lowest, double highest, boolean whole, double magnitude, long terms) {
    if (whole && magnitude < 0x1p51) {
      return new Range(lowest, highest);
    }
    double error = Math.ulp(magnitude) * (terms + 1);
    return new Range(lowest - error, highest + error);
  }
}
