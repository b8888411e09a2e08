package dev.couplet.embed.path;

import java.util.Arrays;

/**
 * The branch sets while they are still being sought: one tree of host vertices a guest vertex.
 * Trees may overlap.
 *
 * <p>A node is one host vertex in one tree. It knows its parent, how many children it has, and how
 * many guest edges touch it: at a node of either tree, adjacent to each other or, while trees
 * overlap, on the same host vertex. A node without children and touches serves nothing and is
 * pruned, unless it is the last of its tree.
 *
 * <p>Nodes of a tree and nodes on a host vertex form doubly linked lists; freed nodes are used
 * again. All operations take constant time but those that say otherwise.
 */
final class Trees {
  static final int NONE = -1;

  /** By guest vertex: the first node, the root, and the number of nodes of its tree. */
  final int[] first;

  final int[] root;
  final int[] size;

  /** By host vertex: its first node. */
  final int[] firstAt;

  /** By node. */
  int[] host = new int[64];

  int[] tree = new int[64];
  int[] next = new int[64];
  int[] nextAt = new int[64];
  private int[] previous = new int[64];
  private int[] previousAt = new int[64];
  private int[] parent = new int[64];
  private int[] children = new int[64];
  private int[] touches = new int[64];

  private int free = NONE;
  private int made;
  private final Prices prices;

  Trees(int guests, int hosts, Prices prices) {
    first = new int[guests];
    root = new int[guests];
    size = new int[guests];
    firstAt = new int[hosts];
    this.prices = prices;
    Arrays.fill(first, NONE);
    Arrays.fill(root, NONE);
    Arrays.fill(firstAt, NONE);
  }

  /** A new node under a parent, or a new root of an empty tree. */
  int add(int guest, int hostVertex, int under) {
    int node = take();
    host[node] = hostVertex;
    tree[node] = guest;
    parent[node] = under;
    children[node] = 0;
    touches[node] = 0;
    if (under == NONE) {
      root[guest] = node;
    } else {
      children[under]++;
    }
    link(node);
    size[guest]++;
    prices.enter(hostVertex);
    return node;
  }

  private int take() {
    if (free != NONE) {
      int node = free;
      free = next[node];
      return node;
    }
    if (made == host.length) {
      grow(2 * made);
    }
    return made++;
  }

  private void grow(int length) {
    host = Arrays.copyOf(host, length);
    tree = Arrays.copyOf(tree, length);
    next = Arrays.copyOf(next, length);
    nextAt = Arrays.copyOf(nextAt, length);
    previous = Arrays.copyOf(previous, length);
    previousAt = Arrays.copyOf(previousAt, length);
    parent = Arrays.copyOf(parent, length);
    children = Arrays.copyOf(children, length);
    touches = Arrays.copyOf(touches, length);
  }

  private void link(int node) {
    int g = tree[node];
    int h = host[node];
    next[node] = first[g];
    previous[node] = NONE;
    if (first[g] != NONE) {
      previous[first[g]] = node;
    }
    first[g] = node;
    nextAt[node] = firstAt[h];
    previousAt[node] = NONE;
    if (firstAt[h] != NONE) {
      previousAt[firstAt[h]] = node;
    }
    firstAt[h] = node;
  }

  private void remove(int node) {
    int g = tree[node];
    int h = host[node];
    if (previous[node] == NONE) {
      first[g] = next[node];
    } else {
      next[previous[node]] = next[node];
    }
    if (next[node] != NONE) {
      previous[next[node]] = previous[node];
    }
    if (previousAt[node] == NONE) {
      firstAt[h] = nextAt[node];
    } else {
      nextAt[previousAt[node]] = nextAt[node];
    }
    if (nextAt[node] != NONE) {
      previousAt[nextAt[node]] = previousAt[node];
    }
    size[g]--;
    prices.leave(h);
    next[node] = free;
    free = node;
  }

  /** Removes a whole tree; linear in its size. */
  void clear(int guest) {
    while (first[guest] != NONE) {
      remove(first[guest]);
    }
    root[guest] = NONE;
  }

  /** One more guest edge touches a node. */
  void touch(int node) {
    touches[node]++;
  }

  /** One guest edge less touches a node; prunes what has become useless. */
  void release(int node) {
    touches[node]--;
    prune(node);
  }

  /** Takes a node away if it serves nothing, then its parent, and so on. */
  void prune(int from) {
    int node = from;
    while (touches[node] == 0 && size[tree[node]] > 1) {
      int above = parent[node];
      if (above == NONE) {
        if (children[node] > 1) {
          return;
        }
        above = onlyChild(node);
        parent[above] = NONE;
        root[tree[node]] = above;
      } else if (children[node] > 0) {
        return;
      } else {
        children[above]--;
      }
      remove(node);
      node = above;
    }
  }

  /** Linear in the size of the tree. */
  private int onlyChild(int node) {
    int child = first[tree[node]];
    while (parent[child] != node) {
      child = next[child];
    }
    return child;
  }

  /** The node of a tree on a host vertex where it has one; linear in the trees there. */
  int nodeAt(int guest, int hostVertex) {
    int node = firstAt[hostVertex];
    while (tree[node] != guest) {
      node = nextAt[node];
    }
    return node;
  }

  /** The host vertices of a tree; a new array. */
  int[] vertices(int guest) {
    int[] vertices = new int[size[guest]];
    int k = 0;
    for (int node = first[guest]; node != NONE; node = next[node]) {
      vertices[k++] = host[node];
    }
    return vertices;
  }
}
