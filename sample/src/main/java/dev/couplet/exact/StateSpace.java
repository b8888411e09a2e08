package dev.couplet.exact;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;

/**
 * The tables from which all energies of a form are built up.
 *
 * <p>The variables fall into three: {@code low} variables 0, 1, ... whose assignments number the
 * lanes of a block; the next one, whose two values are looked at together; and the upper ones,
 * whose assignments number the blocks. A state's number has variable i as bit i.
 */
final class StateSpace {
  private static final int LOW = 10;

  final Qubo form;
  final int low;
  final int upper;

  /** The energy of each lane with all other variables 0. */
  final double[] base;

  /** {@code step[k][j]}: what the pairs between lane j and variable {@code low + k} add. */
  final double[][] step;

  private final double[] linear;
  private final double[][] pair;

  StateSpace(Qubo form) {
    this.form = form;
    int size = form.size();
    low = Math.max(0, Math.min(LOW, size - 1));
    upper = Math.max(0, size - low - 1);
    linear = new double[size];
    pair = new double[size][size];
    for (int i = 0; i < size; i++) {
      linear[i] = form.linear(i);
    }
    form.forEachPair(
        (i, j, value) -> {
          pair[i][j] = value;
          pair[j][i] = value;
        });
    base = new double[1 << low];
    base[0] = form.constant();
    for (int i = 0; i < low; i++) {
      double[] own = sums(i);
      for (int j = 1 << i; j < 2 << i; j++) {
        int rest = j - (1 << i);
        base[j] = base[rest] + (linear[i] + own[rest]);
      }
    }
    step = new double[size - low][];
    for (int k = 0; k < step.length; k++) {
      step[k] = sums(low + k);
    }
  }

  /** Sums of the pairs of a variable over every subset of the low ones. */
  private double[] sums(int variable) {
    double[] sum = new double[1 << low];
    for (int i = 0; i < low; i++) {
      for (int j = 1 << i; j < 2 << i; j++) {
        sum[j] = sum[j - (1 << i)] + pair[variable][i];
      }
    }
    return sum;
  }

  /** The number of blocks: assignments of the upper variables. */
  long blocks() {
    return 1L << upper;
  }

  /**
   * The linear coefficient of variable {@code low + k}, with pairs to the upper ones of a block.
   */
  double field(int k, long block) {
    double[] row = pair[low + k];
    double sum = linear[low + k];
    for (long rest = block; rest != 0; rest &= rest - 1) {
      sum += row[low + 1 + Long.numberOfTrailingZeros(rest)];
    }
    return sum;
  }

  /** The number of the state in a lane of a block, the middle variable 0 or 1. */
  long number(long block, int lane, int middle) {
    return (block << (low + 1)) | ((long) middle << low) | lane;
  }

  State state(long number) {
    return form.size() == 0 ? State.zeros(0) : State.ofWords(form.size(), number);
  }

  double energy(long number) {
    return form.value(state(number));
  }
}
