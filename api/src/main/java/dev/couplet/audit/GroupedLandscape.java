package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;

/**
 * A landscape walked along: the terms of decision bits alone, and the other bits in groups that
 * share no pair, each group minimised by itself.
 */
final class GroupedLandscape extends Landscape {
  private final Running ofDecisions;
  private final AuxiliaryGroup[] groups;
  private final AuxiliaryGroup[][] groupsOf;
  private double ofGroups;

  GroupedLandscape(Polynomial form, int decisionBits) {
    Polynomial.Builder decisions = Polynomial.builder(decisionBits);
    form.forEachTerm(
        (coefficient, variables) -> {
          if (variables.length == 0 || variables[variables.length - 1] < decisionBits) {
            decisions.add(coefficient, variables);
          }
        });
    ofDecisions = new Running(decisions.build());
    groups =
        groups(form, decisionBits).stream()
            .map(members -> new AuxiliaryGroup(form, decisionBits, members))
            .toArray(AuxiliaryGroup[]::new);
    groupsOf = new AuxiliaryGroup[decisionBits][];
    for (int bit = 0; bit < decisionBits; bit++) {
      List<AuxiliaryGroup> touched = new ArrayList<>();
      for (AuxiliaryGroup group : groups) {
        if (group.touches(bit)) {
          touched.add(group);
        }
      }
      groupsOf[bit] = touched.toArray(new AuxiliaryGroup[0]);
    }
  }

  /** The connected components of the pairs among auxiliary bits; unused bits are left out. */
  private static List<List<Integer>> groups(Polynomial form, int decisionBits) {
    BitSet used = new BitSet();
    List<BitSet> neighbours = new ArrayList<>();
    for (int bit = 0; bit < form.size(); bit++) {
      neighbours.add(new BitSet());
    }
    form.forEachTerm(
        (coefficient, variables) -> {
          for (int variable : variables) {
            used.set(variable, variable >= decisionBits);
          }
          if (variables.length == 2 && variables[0] >= decisionBits) {
            neighbours.get(variables[0]).set(variables[1]);
            neighbours.get(variables[1]).set(variables[0]);
          }
        });
    List<List<Integer>> groups = new ArrayList<>();
    for (int bit = used.nextSetBit(0); bit >= 0; bit = used.nextSetBit(0)) {
      groups.add(component(bit, neighbours, used));
    }
    return groups;
  }

  /** The bits that hang together with the first one; takes them out of those left. */
  private static List<Integer> component(int first, List<BitSet> neighbours, BitSet left) {
    List<Integer> members = new ArrayList<>(List.of(first));
    left.clear(first);
    for (int k = 0; k < members.size(); k++) {
      BitSet next = (BitSet) neighbours.get(members.get(k)).clone();
      next.and(left);
      next.stream().forEach(members::add);
      left.andNot(next);
    }
    return members;
  }

  @Override
  public void reset(long pattern) {
    ofDecisions.reset(pattern);
    ofGroups = 0;
    for (AuxiliaryGroup group : groups) {
      group.reset(pattern);
      ofGroups += group.lowest();
    }
  }

  @Override
  public void flip(int bit, long pattern) {
    ofDecisions.flip(bit, pattern);
    for (AuxiliaryGroup group : groupsOf[bit]) {
      double before = group.lowest();
      group.flip(bit, pattern);
      ofGroups += group.lowest() - before;
    }
  }

  @Override
  double value() {
    return ofDecisions.value() + ofGroups;
  }

  @Override
  int effort(int bit) {
    return ofDecisions.termsOf(bit) + 8 * groupsOf[bit].length;
  }
}
