package dev.couplet.exact;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * One variable that is eliminated: a table of the best it and the variables before it can do, for
 * every assignment of the variables in its scope.
 *
 * <p>Bit k of a table's index is the value of {@code scope[k]}; the scope is in the order of
 * elimination, so that bit 0 belongs to the bucket that takes the table in.
 */
final class Bucket {
  /** Index bits that are walked together. */
  static final int LOW = 10;

  final int variable;
  final int[] scope;

  private final List<int[]> lowOffset = new ArrayList<>();
  private final List<int[]> highOffset = new ArrayList<>();
  private final double[] lowPairs;
  private final double[] highPairs;

  /**
   * A bucket that has taken in nothing.
   *
   * @param pair what the pair of the variable with {@code scope[k]} adds if both are 1
   */
  Bucket(int variable, int[] scope, double[] pair) {
    this.variable = variable;
    this.scope = scope;
    int low = Math.min(LOW, scope.length);
    lowPairs = sums(Arrays.copyOf(pair, low));
    highPairs = sums(Arrays.copyOfRange(pair, low, scope.length));
  }

  private static double[] sums(double[] terms) {
    double[] sums = new double[1 << terms.length];
    for (int k = 0; k < terms.length; k++) {
      for (int s = 1 << k; s < 2 << k; s++) {
        sums[s] = sums[s - (1 << k)] + terms[k];
      }
    }
    return sums;
  }

  /**
   * Takes in the table of a bucket whose scope begins with this variable.
   *
   * @param position where each variable of this scope stands in it
   */
  void takeIn(int[] sourceScope, int[] position) {
    int[] bit = new int[scope.length];
    for (int k = 1; k < sourceScope.length; k++) {
      bit[position[sourceScope[k]]] = 1 << k;
    }
    int low = Math.min(LOW, scope.length);
    lowOffset.add(offsets(Arrays.copyOf(bit, low)));
    highOffset.add(offsets(Arrays.copyOfRange(bit, low, scope.length)));
  }

  private static int[] offsets(int[] bits) {
    int[] offsets = new int[1 << bits.length];
    for (int k = 0; k < bits.length; k++) {
      for (int s = 1 << k; s < 2 << k; s++) {
        offsets[s] = offsets[s - (1 << k)] + bits[k];
      }
    }
    return offsets;
  }

  /** The number of blocks of {@code 2^LOW} (or fewer) entries. */
  int blocks() {
    return highPairs.length;
  }

  int blockSize() {
    return lowPairs.length;
  }

  long entries() {
    return 1L << scope.length;
  }

  int[] lowOffset(int source) {
    return lowOffset.get(source);
  }

  int highOffset(int source, int block) {
    return highOffset.get(source)[block];
  }

  double[] lowPairs() {
    return lowPairs;
  }

  double highPairs(int block) {
    return highPairs[block];
  }
}
