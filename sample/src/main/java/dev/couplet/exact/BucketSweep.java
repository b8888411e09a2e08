package dev.couplet.exact;

import dev.couplet.sampling.Vigil;
import java.util.Arrays;

/**
 * One elimination: computes every bucket's table, in order, for given linear coefficients.
 *
 * <p>A table is let go as soon as it was taken in; what stays is one bit an entry, the bucket's
 * best value, from which the minimum is read off in the end. Entries of a table are computed in
 * blocks, shared out between threads; each is computed in the same way whatever the thread.
 */
final class BucketSweep {
  private static final int PART = 64;

  private final BucketTree tree;
  private final boolean counting;
  private final Vigil vigil;
  private final int threads;
  private final double[][] table;
  private final double[][] count;
  private final long[][] choice;

  BucketSweep(BucketTree tree, boolean counting, int threads, Vigil vigil) {
    this.tree = tree;
    this.counting = counting;
    this.threads = threads;
    this.vigil = vigil;
    table = new double[tree.buckets.length][];
    count = new double[tree.buckets.length][];
    choice = new long[tree.buckets.length][];
    for (int k = 0; k < choice.length; k++) {
      choice[k] = new long[(int) ((tree.buckets[k].entries() + 63) / 64)];
    }
  }

  /** Computes all tables; false if cut short. */
  boolean run(double[] linear) {
    for (int k = 0; k < tree.buckets.length; k++) {
      Bucket bucket = tree.buckets[k];
      table[k] = new double[(int) bucket.entries()];
      count[k] = counting ? new double[(int) bucket.entries()] : new double[0];
      Arrays.fill(choice[k], 0);
      int at = k;
      int parts = (bucket.blocks() + PART - 1) / PART;
      Crew.run(threads, parts, part -> fill(at, part, linear[bucket.variable]), vigil);
      if (vigil.over()) {
        return false;
      }
      for (int source : tree.sources(k)) {
        table[source] = new double[0];
        count[source] = new double[0];
      }
    }
    return true;
  }

  private void fill(int at, int part, double linear) {
    Bucket bucket = tree.buckets[at];
    double[] zero = new double[bucket.blockSize()];
    double[] one = new double[bucket.blockSize()];
    int end = Math.min(bucket.blocks(), (part + 1) * PART);
    for (int block = part * PART; block < end && !vigil.over(); block++) {
      add(at, block, linear, zero, one);
      if (counting) {
        settleCounts(at, block, zero, one);
      }
      settle(at, block, zero, one);
    }
  }

  /** The best of everything before the bucket, with its variable 0 and 1. */
  private void add(int at, int block, double linear, double[] zero, double[] one) {
    Bucket bucket = tree.buckets[at];
    double[] pairs = bucket.lowPairs();
    double field = linear + bucket.highPairs(block);
    for (int s = 0; s < zero.length; s++) {
      zero[s] = 0;
      one[s] = field + pairs[s];
    }
    int[] sources = tree.sources(at);
    for (int k = 0; k < sources.length; k++) {
      double[] taken = table[sources[k]];
      int[] offset = bucket.lowOffset(k);
      int from = bucket.highOffset(k, block);
      for (int s = 0; s < zero.length; s++) {
        int index = from + offset[s];
        zero[s] += taken[index];
        one[s] += taken[index + 1];
      }
    }
  }

  private void settle(int at, int block, double[] zero, double[] one) {
    double[] own = table[at];
    long[] bits = choice[at];
    int from = block * zero.length;
    for (int s = 0; s < zero.length; s++) {
      own[from + s] = Math.min(zero[s], one[s]);
    }
    for (int s = 0; s < zero.length; s++) {
      if (one[s] < zero[s]) {
        bits[(from + s) >> 6] |= 1L << s;
      }
    }
  }

  private void settleCounts(int at, int block, double[] zero, double[] one) {
    double[] own = count[at];
    for (int s = 0; s < zero.length; s++) {
      double ways = 0;
      if (zero[s] <= one[s]) {
        ways += ways(at, block, s, 0);
      }
      if (one[s] <= zero[s]) {
        ways += ways(at, block, s, 1);
      }
      own[block * zero.length + s] = ways;
    }
  }

  private double ways(int at, int block, int lane, int value) {
    double ways = 1;
    Bucket bucket = tree.buckets[at];
    int[] sources = tree.sources(at);
    for (int k = 0; k < sources.length; k++) {
      int index = bucket.highOffset(k, block) + bucket.lowOffset(k)[lane] + value;
      ways *= count[sources[k]][index];
    }
    return ways;
  }

  /** The lowest energy apart from what the tree does not know of: the sum over all its roots. */
  double minimum() {
    double sum = 0;
    for (int k = 0; k < table.length; k++) {
      if (tree.buckets[k].scope.length == 0) {
        sum += table[k][0];
      }
    }
    return sum;
  }

  /** How many assignments have the lowest energy. */
  double minima() {
    double product = 1;
    for (int k = 0; k < count.length; k++) {
      if (tree.buckets[k].scope.length == 0) {
        product *= count[k][0];
      }
    }
    return product;
  }

  /** Sets the eliminated variables to an assignment of lowest energy. */
  void assign(boolean[] values) {
    for (int k = choice.length - 1; k >= 0; k--) {
      int index = 0;
      int[] scope = tree.buckets[k].scope;
      for (int s = 0; s < scope.length; s++) {
        index |= values[scope[s]] ? 1 << s : 0;
      }
      values[tree.buckets[k].variable] = (choice[k][index >> 6] >>> index & 1) != 0;
    }
  }
}
