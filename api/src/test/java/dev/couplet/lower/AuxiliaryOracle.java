package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.List;

/**
 * The plain slow way to minimise a quadratic form over its auxiliary bits: all their patterns,
 * component by component of those that are coupled.
 */
final class AuxiliaryOracle {
  private final Polynomial form;
  private final int decisionBits;
  private final List<List<Integer>> components = new ArrayList<>();

  AuxiliaryOracle(Polynomial form, int decisionBits) {
    this.form = form;
    this.decisionBits = decisionBits;
    boolean[] seen = new boolean[form.size()];
    for (int bit = decisionBits; bit < form.size(); bit++) {
      if (!seen[bit]) {
        components.add(component(bit, seen));
      }
    }
  }

  private List<Integer> component(int bit, boolean[] seen) {
    List<Integer> members = new ArrayList<>(List.of(bit));
    seen[bit] = true;
    for (int k = 0; k < members.size(); k++) {
      for (int other = decisionBits; other < form.size(); other++) {
        if (!seen[other] && form.coefficient(members.get(k), other) != 0) {
          seen[other] = true;
          members.add(other);
        }
      }
    }
    return members;
  }

  int largestComponent() {
    return components.stream().mapToInt(List::size).max().orElse(0);
  }

  /** The lowest value under a pattern of the decision bits. */
  double lowest(long pattern) {
    boolean[] bits = State.ofWords(form.size(), pattern).toBooleans();
    double base = form.value(State.of(bits));
    double sum = base;
    for (List<Integer> members : components) {
      double lowest = base;
      for (long others = 1; others < 1L << members.size(); others++) {
        for (int k = 0; k < members.size(); k++) {
          bits[members.get(k)] = (others >>> k & 1) != 0;
        }
        lowest = Math.min(lowest, form.value(State.of(bits)));
      }
      members.forEach(member -> bits[member] = false);
      sum += lowest - base;
    }
    return sum;
  }

  /** The value with the auxiliary bits as the completions set them. */
  static double completed(Polynomial form, BitTable table, long pattern) {
    boolean[] bits = State.ofWords(form.size(), pattern).toBooleans();
    table.completions().forEach(completion -> completion.complete(bits));
    return form.value(State.of(bits));
  }
}
