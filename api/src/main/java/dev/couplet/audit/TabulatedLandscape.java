package dev.couplet.audit;

import java.util.Arrays;

/** A landscape over few of the decision bits, worked out once for all their patterns. */
final class TabulatedLandscape extends Landscape {
  private final double[] table;
  private final int[] own;

  /** For each decision bit its place in the table's index, as a mask; 0 if it does not matter. */
  private final int[] place;

  private int index;

  TabulatedLandscape(GroupedLandscape of, int[] own, int decisionBits) {
    this.own = own;
    this.place = new int[decisionBits];
    this.table = new double[1 << own.length];
    for (int k = 0; k < own.length; k++) {
      place[own[k]] = 1 << k;
    }
    for (int k = 0; k < table.length; k++) {
      long pattern = 0;
      for (int b = 0; b < own.length; b++) {
        pattern |= (k >>> b & 1L) << own[b];
      }
      of.reset(pattern);
      table[k] = of.value();
    }
  }

  @Override
  public void reset(long pattern) {
    index = Arrays.stream(own).map(bit -> (pattern >>> bit & 1) != 0 ? place[bit] : 0).sum();
  }

  @Override
  public void flip(int bit, long pattern) {
    index ^= place[bit];
  }

  @Override
  double value() {
    return table[index];
  }

  @Override
  int effort(int bit) {
    return 1;
  }
}
