package dev.couplet.embed.path;

import java.util.Arrays;
import java.util.SplittableRandom;

/**
 * Finds the host vertex from which the cheapest paths to a number of trees cost least together, its
 * own price counted once; among equals, one at random.
 *
 * <p>One spread from each tree adds up the costs, within a limit: somewhat more than the total
 * found when the same guest vertex was laid the last time, then more if that was not enough. A
 * vertex whose costs exceed the limit is out, and a spread ends when it has reached all that are
 * still in; so each is more local than the one before. The answer does not depend on the limit.
 */
final class RootFinder {
  /** Told instead of a host vertex: there is none, or the run is over. */
  static final int NONE = -1;

  private static final long FIRST_LIMIT = 256;
  private static final int OUT = -1;

  private final Trees trees;
  private final Prices prices;
  private final Spread spread;
  private final Pace pace;
  private final SplittableRandom random;
  private final long[] lastTotal;

  /** Of a host vertex: how many spreads have reached it or OUT, and what they cost together. */
  private final int[] reached;

  private final long[] sum;

  /** The host vertices that the first spread reached. */
  private final int[] candidates;

  private int candidateCount;
  private boolean cutOff;
  private long bestTotal;

  RootFinder(
      int guests, Trees trees, Prices prices, Spread spread, Pace pace, SplittableRandom random) {
    this.trees = trees;
    this.prices = prices;
    this.spread = spread;
    this.pace = pace;
    this.random = random;
    this.lastTotal = new long[guests];
    Arrays.fill(lastTotal, FIRST_LIMIT);
    int hosts = prices.cost.length;
    this.reached = new int[hosts];
    this.sum = new long[hosts];
    this.candidates = new int[hosts];
  }

  /** The best root for guest vertex {@code v} towards the first {@code count} of some trees. */
  int find(int v, int[] towards, int count) {
    long limit = lastTotal[v] + lastTotal[v] / 8;
    while (true) {
      int root = findWithin(limit, towards, count);
      if (root != NONE) {
        lastTotal[v] = bestTotal;
        return root;
      }
      if (!cutOff || pace.over(0)) {
        return NONE;
      }
      limit *= 2;
    }
  }

  private int findWithin(long limit, int[] towards, int count) {
    candidateCount = 0;
    cutOff = false;
    int alive = Integer.MAX_VALUE;
    for (int t = 0; t < count && alive > 0; t++) {
      alive = reach(towards[t], t, alive, limit);
    }
    int root = alive > 0 ? best(count) : NONE;
    for (int c = 0; c < candidateCount; c++) {
      reached[candidates[c]] = 0;
    }
    return root;
  }

  /** Spreads from tree number t to all vertices in so far; tells how many are in after it. */
  private int reach(int tree, int t, int before, long limit) {
    spread.begin();
    for (int node = trees.first[tree]; node != Trees.NONE; node = trees.next[node]) {
      spread.source(trees.host[node]);
    }
    int toReach = before;
    int alive = 0;
    while (toReach > 0) {
      int h = spread.settle(prices.cost, limit);
      if (h < 0) {
        break;
      }
      if (reached[h] == t) {
        toReach--;
        alive += add(h, t, limit) ? 1 : 0;
      }
      if (pace.over(spread.degree(h) + 1)) {
        return 0;
      }
    }
    cutOff |= spread.more() && toReach > 0;
    return alive;
  }

  /** Adds a cost and tells whether the vertex is still in; its own price is paid only once. */
  private boolean add(int h, int t, long limit) {
    if (t == 0) {
      candidates[candidateCount++] = h;
      sum[h] = 0;
    }
    int distance = spread.distance[h];
    sum[h] += distance == 0 ? 0 : distance - prices.cost[h];
    boolean in = sum[h] + prices.cost[h] <= limit;
    reached[h] = in ? t + 1 : OUT;
    cutOff |= !in;
    return in;
  }

  private int best(int count) {
    bestTotal = Long.MAX_VALUE;
    int root = NONE;
    int ties = 0;
    for (int c = 0; c < candidateCount; c++) {
      int h = candidates[c];
      if (reached[h] == count) {
        long total = sum[h] + prices.cost[h];
        if (total < bestTotal) {
          bestTotal = total;
          root = h;
          ties = 1;
        } else if (total == bestTotal && random.nextInt(++ties) == 0) {
          root = h;
        }
      }
    }
    return root;
  }
}
