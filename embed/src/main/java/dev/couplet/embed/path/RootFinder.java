package dev.couplet.embed.path;

import java.util.Arrays;
import java.util.SplittableRandom;

/**
 * Finds the host vertex from which the cheapest paths to a number of trees cost least together, its
 * own price counted once; among equals, one at random.
 *
 * <p>One spread from each tree adds up the costs. No vertex further from a tree than the best total
 * can be the best, so spreads stop at a limit: first the total found when the same guest vertex was
 * laid the last time, then more if that was not enough. The answer does not depend on the limit.
 */
final class RootFinder {
  /** Told instead of a host vertex: there is none, or the run is over. */
  static final int NONE = -1;

  private static final long FIRST_LIMIT = 256;

  private final Trees trees;
  private final Prices prices;
  private final Spread spread;
  private final Pace pace;
  private final SplittableRandom random;
  private final long[] lastTotal;

  /** Of a host vertex: how many spreads have reached it, and what they cost together. */
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
    long limit = lastTotal[v];
    while (true) {
      int root = findWithin(limit, towards, count);
      if (root != NONE && bestTotal <= limit) {
        lastTotal[v] = bestTotal;
        return root;
      }
      boolean nowhere = root == NONE && !cutOff;
      if (nowhere || pace.over(0)) {
        return NONE;
      }
      limit = root != NONE ? bestTotal : 2 * limit;
    }
  }

  private int findWithin(long limit, int[] towards, int count) {
    candidateCount = 0;
    cutOff = false;
    int alive = 0;
    for (int t = 0; t < count; t++) {
      alive = reach(towards[t], t, limit);
      if (alive == 0) {
        break;
      }
    }
    int root = alive == 0 ? NONE : best(count);
    for (int c = 0; c < candidateCount; c++) {
      reached[candidates[c]] = 0;
    }
    return root;
  }

  /** Spreads from tree number t; tells how many vertices all spreads so far have reached. */
  private int reach(int tree, int t, long limit) {
    spread.begin();
    for (int node = trees.first[tree]; node != Trees.NONE; node = trees.next[node]) {
      spread.source(trees.host[node]);
    }
    int alive = 0;
    int h = spread.settle(prices.cost, limit);
    for (; h >= 0; h = spread.settle(prices.cost, limit)) {
      if (reached[h] == t) {
        alive++;
        add(h, t);
      }
      if (pace.over(spread.degree(h) + 1)) {
        return 0;
      }
    }
    cutOff |= spread.more();
    return alive;
  }

  /** The vertex's own price is left out, as the root pays it only once. */
  private void add(int h, int t) {
    if (t == 0) {
      candidates[candidateCount++] = h;
      sum[h] = 0;
    }
    reached[h]++;
    int distance = spread.distance[h];
    sum[h] += distance == 0 ? 0 : distance - prices.cost[h];
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
