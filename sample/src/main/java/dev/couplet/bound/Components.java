package dev.couplet.bound;

import java.util.Arrays;

/**
 * The strongly connected components of what is left of an implication network, in an order in which
 * every arc with room leads to the same or a lower number (Tarjan 1972). An arc has room if it or
 * its mirror image has: that is the flow averaged with its mirror image.
 */
final class Components {
  private final Implications network;
  private final int[] number;
  private final int[] low;
  private final int[] component;
  private final int[] stack;
  private final int[] caller;
  private final int[] next;
  private int top;
  private int count;
  private int components;

  private Components(Implications network) {
    int nodes = network.nodes;
    this.network = network;
    number = new int[nodes];
    low = new int[nodes];
    component = new int[nodes];
    stack = new int[nodes];
    caller = new int[nodes];
    next = Arrays.copyOf(network.start, nodes);
    Arrays.fill(component, -1);
  }

  /** The component of every node. */
  static int[] of(Implications network) {
    Components components = new Components(network);
    for (int v = 0; v < network.nodes; v++) {
      if (components.number[v] == 0) {
        components.visit(v);
      }
    }
    return components.component;
  }

  private void visit(int root) {
    caller[root] = -1;
    enter(root);
    int v = root;
    while (v >= 0) {
      int child = unvisitedChild(v);
      if (child >= 0) {
        caller[child] = v;
        enter(child);
        v = child;
      } else {
        leave(v);
        v = caller[v];
      }
    }
  }

  private void enter(int v) {
    number[v] = ++count;
    low[v] = count;
    stack[top++] = v;
  }

  private int unvisitedChild(int v) {
    while (next[v] < network.start[v + 1]) {
      int a = network.arc[next[v]++];
      if (network.room[a] > 0 || network.room[a ^ 2] > 0) {
        int to = network.head[a];
        if (number[to] == 0) {
          return to;
        }
        if (component[to] < 0) {
          low[v] = Math.min(low[v], number[to]);
        }
      }
    }
    return -1;
  }

  private void leave(int v) {
    if (low[v] == number[v]) {
      int w;
      do {
        w = stack[--top];
        component[w] = components;
      } while (w != v);
      components++;
    }
    if (caller[v] >= 0) {
      low[caller[v]] = Math.min(low[caller[v]], low[v]);
    }
  }
}
