package dev.couplet.embed.path;

import dev.couplet.host.CompactGraph;
import dev.couplet.host.Host;
import java.util.Arrays;
import java.util.SplittableRandom;

/**
 * Takes one guest vertex off the host, and lays its tree anew along the cheapest paths to its
 * neighbours' trees.
 *
 * <p>The tree grows from the best root, always to the neighbour that is nearest to what has grown.
 * Each path is shared between the two trees it joins, so that their sizes come out alike; without
 * that the search soon freezes, each tree held where it is by those around it.
 *
 * <p>Invariant between calls: for each guest edge between two trees that have nodes, {@code
 * contact} names a node of either, and both count the edge among what touches them.
 */
final class Router {
  private final Trees trees;
  private final Prices prices;
  private final Spread spread;
  private final RootFinder roots;
  private final Homes homes;
  private final Pace pace;
  private final SplittableRandom random;
  private final int[] hostStart;
  private final int[] hostTarget;

  /** The guest's rows; entry k of the row of v stands for the edge from v to its neighbour. */
  private final int[] rowStart;

  private final int[] neighbour;

  /** Where the same edge stands in the neighbour's row. */
  private final int[] reverse;

  /** The node of the row's own tree that the edge touches. */
  private final int[] contact;

  /** By guest vertex: the entry through which the tree being laid must still reach it, or NONE. */
  private final int[] wanted;

  private final int[] towards;
  private final int[] path;

  Router(
      CompactGraph guest,
      Host host,
      Trees trees,
      Prices prices,
      Homes homes,
      Pace pace,
      SplittableRandom random) {
    this.trees = trees;
    this.prices = prices;
    this.homes = homes;
    this.pace = pace;
    this.random = random;
    this.hostStart = host.graph().offsets();
    this.hostTarget = host.graph().targets();
    this.spread = new Spread(hostStart, hostTarget);
    this.roots = new RootFinder(guest.vertices(), trees, prices, spread, pace, random);
    this.rowStart = guest.offsets();
    this.neighbour = guest.targets();
    this.reverse = reverse(rowStart, neighbour);
    this.contact = new int[neighbour.length];
    Arrays.fill(contact, Trees.NONE);
    this.wanted = new int[guest.vertices()];
    Arrays.fill(wanted, Trees.NONE);
    this.towards = new int[guest.maxDegree()];
    this.path = new int[host.vertices()];
  }

  /** Rows are ascending, so the entries of a row come up in the order in which they are met. */
  private static int[] reverse(int[] start, int[] target) {
    int[] reverse = new int[target.length];
    int[] next = start.clone();
    for (int v = 0; v + 1 < start.length; v++) {
      for (int k = start[v]; k < start[v + 1]; k++) {
        if (target[k] > v) {
          int back = next[target[k]]++;
          reverse[k] = back;
          reverse[back] = k;
        }
      }
    }
    return reverse;
  }

  /** Removes a guest vertex's tree, and what its neighbours' trees held only to touch it. */
  void lift(int v) {
    for (int k = rowStart[v]; k < rowStart[v + 1]; k++) {
      int theirs = contact[reverse[k]];
      if (theirs != Trees.NONE) {
        contact[reverse[k]] = Trees.NONE;
        contact[k] = Trees.NONE;
        trees.release(theirs);
      }
    }
    trees.clear(v);
  }

  /** Lays the tree of a guest vertex that has none; false if the run is over. */
  boolean lay(int v) {
    int count = 0;
    for (int k = rowStart[v]; k < rowStart[v + 1]; k++) {
      if (trees.size[neighbour[k]] > 0) {
        towards[count++] = neighbour[k];
        wanted[neighbour[k]] = k;
      }
    }
    int root = count == 0 ? cheapest(v) : roots.find(v, towards, count);
    if (root == RootFinder.NONE) {
      return false;
    }
    int unused = trees.add(v, root, Trees.NONE);
    for (int left = count; left > 0; ) {
      int reached = grow(v);
      if (reached == 0) {
        return false;
      }
      left -= reached;
    }
    trees.prune(trees.root[v]);
    return true;
  }

  /** One of the cheapest host vertices where a guest vertex may live. */
  private int cheapest(int v) {
    int best = RootFinder.NONE;
    int ties = 0;
    for (int h = 0; h < prices.cost.length; h++) {
      if (homes.allows(v, h)) {
        if (best == RootFinder.NONE || prices.cost[h] < prices.cost[best]) {
          best = h;
          ties = 1;
        } else if (prices.cost[h] == prices.cost[best] && random.nextInt(++ties) == 0) {
          best = h;
        }
      }
    }
    return best;
  }

  /**
   * Joins the tree to all wanted neighbours that it touches already, or else to the nearest; tells
   * how many that was, 0 if the run is over.
   */
  private int grow(int v) {
    spread.begin();
    for (int node = trees.first[v]; node != Trees.NONE; node = trees.next[node]) {
      spread.source(trees.host[node]);
    }
    int joined = 0;
    int h = spread.settle(prices.cost, Long.MAX_VALUE);
    for (; h >= 0; h = spread.settle(prices.cost, Long.MAX_VALUE)) {
      if (spread.distance[h] > 0 && joined > 0) {
        return joined;
      }
      joined += joinAround(v, h);
      if (pace.over(spread.degree(h) + 1)) {
        return 0;
      }
    }
    return joined;
  }

  /** Joins wanted neighbours on or beside h; only one if a path must be laid to h. */
  private int joinAround(int v, int h) {
    int joined = join(v, h, h);
    for (int k = hostStart[h]; k < hostStart[h + 1]; k++) {
      if (joined > 0 && spread.distance[h] > 0) {
        return joined;
      }
      joined += join(v, h, hostTarget[k]);
    }
    return joined;
  }

  private int join(int v, int h, int at) {
    int joined = 0;
    int node = trees.firstAt[at];
    while (node != Trees.NONE) {
      int u = trees.tree[node];
      if (wanted[u] != Trees.NONE && u != v) {
        layPath(v, h, u, node);
        joined++;
        if (spread.distance[h] > 0) {
          return joined;
        }
      }
      node = trees.nextAt[node];
    }
    return joined;
  }

  /** Lays the path back from h to the tree of v, and shares it with u, whose node h meets. */
  private void layPath(int v, int h, int u, int nodeOfU) {
    int length = 0;
    int end = h;
    while (spread.from[end] != end) {
      path[length++] = end;
      end = spread.from[end];
    }
    int shareOfU = share(trees.size[v], trees.size[u], length);
    int mine = trees.nodeAt(v, end);
    for (int p = length - 1; p >= shareOfU; p--) {
      mine = trees.add(v, path[p], mine);
    }
    int theirs = nodeOfU;
    for (int p = 0; p < shareOfU; p++) {
      theirs = trees.add(u, path[p], theirs);
    }
    int k = wanted[u];
    wanted[u] = Trees.NONE;
    contact[k] = mine;
    contact[reverse[k]] = theirs;
    trees.touch(mine);
    trees.touch(theirs);
  }

  /** How much of a path goes to u so that both trees come out as nearly alike as can be. */
  private static int share(int sizeOfV, int sizeOfU, int length) {
    int even = (sizeOfV + length - sizeOfU) / 2;
    return Math.max(0, Math.min(length, even));
  }
}
