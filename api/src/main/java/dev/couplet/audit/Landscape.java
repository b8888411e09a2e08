package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import java.util.BitSet;

/** A quadratic form as a function of its decision bits alone: every other bit is at its best. */
abstract class Landscape implements Flips {
  private static final int MOST_TABULATED = 12;

  /** The value at the pattern walked to. */
  abstract double value();

  /** About how many numbers a flip of the bit reads. */
  abstract int effort(int bit);

  /** The landscape of a form of degree 2: a table if few decision bits matter. */
  static Landscape of(Polynomial form, int decisionBits) {
    BitSet used = new BitSet();
    form.forEachTerm(
        (coefficient, variables) -> {
          for (int variable : variables) {
            used.set(variable);
          }
        });
    GroupedLandscape grouped = new GroupedLandscape(form, decisionBits);
    int[] own = used.stream().filter(bit -> bit < decisionBits).toArray();
    return own.length <= MOST_TABULATED && own.length < decisionBits
        ? new TabulatedLandscape(grouped, own, decisionBits)
        : grouped;
  }
}
