package dev.couplet.reduce;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/** What was removed, in order, and how to bring it back. */
final class History {
  private final List<Undo> steps = new ArrayList<>();
  private final Map<Removal, Integer> counts = new EnumMap<>(Removal.class);
  private final boolean exact;

  History(boolean exact) {
    this.exact = exact;
  }

  /** Whether the form's sums are not rounded. */
  boolean exact() {
    return exact;
  }

  void fixed(Removal rule, int i, boolean value) {
    add(rule, new Undo.Fixed(i, value));
  }

  void copied(int i, int j, boolean negated) {
    add(Removal.COPY, new Undo.Copied(i, j, negated));
  }

  void leaf(int i, double a, int y, double b) {
    add(Removal.LEAF, new Undo.Leaf(i, a, y, b));
  }

  void chain(int i, double a, int y, double b, int z, double c) {
    add(Removal.CHAIN, new Undo.Chain(i, a, y, b, z, c));
  }

  private void add(Removal rule, Undo step) {
    steps.add(step);
    counts.merge(rule, 1, Integer::sum);
  }

  /** Sets all removed bits, given the others. */
  void undo(boolean[] values) {
    for (int s = steps.size() - 1; s >= 0; s--) {
      steps.get(s).apply(values);
    }
  }

  Map<Removal, Integer> counts() {
    return counts;
  }
}
