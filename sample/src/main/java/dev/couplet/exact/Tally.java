package dev.couplet.exact;

import java.util.Arrays;

/**
 * The lowest energy levels met so far, how many states each has, and the first states of the
 * lowest. One thread.
 */
final class Tally {
  private final int levels;
  private final int keep;
  private double[] energy = new double[4];
  private long[] count = new long[4];
  private int size;
  private long[] kept = new long[4];
  private int keptSize;

  Tally(int levels, int keep) {
    this.levels = levels;
    this.keep = keep;
  }

  /** Energies above this change nothing. */
  double threshold() {
    return size < levels ? Double.POSITIVE_INFINITY : energy[size - 1];
  }

  void add(double value, long state) {
    count(value, 1);
    if (value == energy[0] && keptSize < keep) {
      remember(state);
    }
  }

  /** Adds what another tally found in states that come after those of this one. */
  void addAll(Tally later) {
    for (int l = 0; l < later.size; l++) {
      count(later.energy[l], later.count[l]);
    }
    if (later.size > 0 && later.energy[0] == energy[0]) {
      for (int k = 0; k < later.keptSize && keptSize < keep; k++) {
        remember(later.kept[k]);
      }
    }
  }

  private void count(double value, long states) {
    // Never with a negative zero, which a binary search tells apart: sums start from a plain zero.
    int at = Arrays.binarySearch(energy, 0, size, value);
    if (at >= 0) {
      count[at] += states;
    } else if (-at - 1 < levels) {
      insert(-at - 1, value, states);
    }
  }

  private void insert(int at, double value, long states) {
    if (size == levels) {
      size--;
    } else if (size == energy.length) {
      energy = Arrays.copyOf(energy, 2 * size);
      count = Arrays.copyOf(count, 2 * size);
    }
    System.arraycopy(energy, at, energy, at + 1, size - at);
    System.arraycopy(count, at, count, at + 1, size - at);
    energy[at] = value;
    count[at] = states;
    size++;
    if (at == 0) {
      keptSize = 0;
    }
  }

  private void remember(long state) {
    if (keptSize == kept.length) {
      kept = Arrays.copyOf(kept, 2 * keptSize);
    }
    kept[keptSize++] = state;
  }

  int size() {
    return size;
  }

  double energy(int level) {
    return energy[level];
  }

  long count(int level) {
    return count[level];
  }

  /** The first states of the lowest level, in the order they came. */
  long[] kept() {
    return Arrays.copyOf(kept, keptSize);
  }
}
