package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Rule;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** A share of few bits, looked at under every pattern of them. */
final class ShareTable {
  /** What the parts say of a pattern, and what the form says. */
  @FunctionalInterface
  interface Visitor {
    void visit(boolean decided, boolean codesHold, double violationOrCost, double value);
  }

  private final Share share;
  private final CodedUnits units;
  private final Set<Integer> coded = new LinkedHashSet<>();
  private final List<int[]> groups = new ArrayList<>();
  private final boolean[] wholeGroup;
  private final BitSet holds = new BitSet();

  ShareTable(Share share, CodedUnits units) {
    this.share = share;
    this.units = units;
    Map<Integer, List<Integer>> byUnit = new LinkedHashMap<>();
    for (int k = 0; k < share.bits().length; k++) {
      CodedUnit unit = units.ofBit(share.bits()[k]);
      byUnit.computeIfAbsent(unit.firstLiteral(), u -> new ArrayList<>()).add(k);
    }
    List<Boolean> whole = new ArrayList<>();
    byUnit.forEach(
        (first, own) -> {
          CodedUnit unit = units.ofLiteral(first);
          if (!unit.plain()) {
            coded.add(first);
          } else if (unit.grouped()) {
            groups.add(own.stream().mapToInt(k -> k).toArray());
            whole.add(own.size() == unit.literals());
          }
        });
    wholeGroup = new boolean[groups.size()];
    for (int g = 0; g < wholeGroup.length; g++) {
      wholeGroup[g] = whole.get(g);
    }
  }

  /** Passes every pattern; with {@code costs} what missing the parts costs, else by how much. */
  void forEach(boolean costs, Visitor visitor) {
    int n = share.bits().length;
    Polynomial own = share.renumbered();
    Landscape landscape = new GroupedLandscape(own, n);
    new Walk(n, landscape::effort)
        .over(
            List.of(landscape),
            pattern -> {
              boolean codes = decode(pattern);
              boolean decided = codes && groupsDecided(pattern);
              double missed = decided ? missed(costs) : 0;
              visitor.visit(decided, codes, missed, landscape.value());
            });
  }

  private boolean decode(long pattern) {
    holds.clear();
    for (int k = 0; k < share.bits().length; k++) {
      CodedUnit unit = units.ofBit(share.bits()[k]);
      if (unit.plain() && (pattern >>> k & 1) != 0) {
        holds.set(unit.firstLiteral() + share.bits()[k] - unit.firstBit());
      }
    }
    for (int first : coded) {
      CodedUnit unit = units.ofLiteral(first);
      int at = Arrays.binarySearch(share.bits(), unit.firstBit());
      int local = (int) (pattern >>> at & (1L << unit.bits()) - 1);
      if (!unit.valid(local)) {
        return false;
      }
      unit.values().get(local).forEach(holds::set);
    }
    return true;
  }

  private boolean groupsDecided(long pattern) {
    for (int g = 0; g < wholeGroup.length; g++) {
      int ones = 0;
      for (int k : groups.get(g)) {
        ones += (pattern >>> k & 1) != 0 ? 1 : 0;
      }
      if (ones > 1 || (wholeGroup[g] && ones == 0)) {
        return false;
      }
    }
    return true;
  }

  private double missed(boolean costs) {
    double sum = 0;
    for (Rule.Part part : share.parts()) {
      double[] value = {0};
      part.terms()
          .forEachTerm(
              (coefficient, literals) -> {
                boolean all = true;
                for (int literal : literals) {
                  all &= holds.get(literal) || alwaysHolds(literal);
                }
                value[0] += all ? coefficient : 0;
              });
      double violation = part.violation(value[0]);
      sum += costs ? part.cost(violation) : violation;
    }
    return sum;
  }

  /** The literal of a code without bits, whose one value holds. */
  private boolean alwaysHolds(int literal) {
    CodedUnit unit = units.ofLiteral(literal);
    return !unit.plain() && unit.bits() == 0 && unit.values().get(0).contains(literal);
  }

  /** The proof that the share is a penalty of its parts, or what speaks against it. */
  Optional<ShareProof> penalty(double error, List<String> against) {
    double[] kept = {Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY};
    double[] others = {Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY, 0};
    forEach(
        false,
        (decided, codes, missed, value) -> {
          if (decided && missed == 0) {
            kept[0] = Math.min(kept[0], value);
            kept[1] = Math.max(kept[1], value);
          } else if (decided) {
            others[0] = Math.min(others[0], value);
          } else if (codes) {
            others[1] = Math.min(others[1], value);
          }
          others[2] = Math.min(others[2], value);
        });
    if (kept[0] > kept[1]) {
      against.add("no plan keeps it");
    } else if (kept[1] - kept[0] > error) {
      against.add(
          "its penalty is "
              + Numbers.shown(kept[0])
              + " under one plan that keeps it and "
              + Numbers.shown(kept[1])
              + " under another");
    } else if (others[0] <= kept[1] + error) {
      against.add(
          "its penalty is "
              + Numbers.shown(others[0] - kept[1])
              + " under a plan that breaks it, it has to be above 0");
    } else if (others[1] < kept[0] - error) {
      against.add("its penalty is below 0 where all its codes hold");
    } else {
      double lowest = Math.min(0, others[2] - kept[0]);
      return Optional.of(
          new ShareProof(
              kept[0],
              others[0] - kept[1],
              lowest < -error ? lowest : 0,
              "all patterns of " + share.bits().length + " bits"));
    }
    return Optional.empty();
  }
}
