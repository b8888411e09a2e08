package dev.couplet.bound;

import dev.couplet.sampling.Vigil;
import java.util.Arrays;

/**
 * The implication network of a form, and a maximum flow through it (Boros, Hammer and Tavares,
 * Preprocessing of unconstrained quadratic binary optimization, 2006).
 *
 * <p>The form is written as a constant plus positive multiples of products of two literals. Node 2i
 * is the literal x_i, node 2i + 1 its negation; the last two nodes are the constant true (the
 * source) and false (the sink). A term c u v becomes two arcs of capacity c, from u to not v and
 * from v to not u; a linear term has "true" as its second literal. Half the maximum flow, added to
 * the constant, is the roof dual.
 *
 * <p>Arcs come in fours: arc a, its reverse a ^ 1, its mirror image a ^ 2, and the mirror's
 * reverse. All capacities are whole numbers. The flow is found by Dinic's algorithm (1970), with
 * distances to the sink: in the end the nodes with a distance are those that still reach it.
 */
final class Implications {
  static final int UNREACHED = Integer.MAX_VALUE;

  final int nodes;
  final int source;
  final int sink;

  /** The arcs of node v are {@code arc[start[v]] .. arc[start[v + 1] - 1]}. */
  final int[] start;

  final int[] arc;
  final int[] head;
  final long[] room;

  /** Steps to the sink over arcs with room, once the flow is a maximum. */
  final int[] distance;

  private final int[] current;
  private final int[] queue;
  private final int[] path;
  private final long constant;
  private long flow;
  private int work;

  Implications(ScaledForm form) {
    int size = form.size;
    nodes = 2 * size + 2;
    source = 2 * size;
    sink = 2 * size + 1;
    long[] linear = form.linear.clone();
    long sum = form.constant;
    int[] tails = new int[4 * (form.pair.length + size)];
    head = new int[tails.length];
    room = new long[tails.length];
    int arcs = 0;
    for (int p = 0; p < form.pair.length; p++) {
      long value = form.pair[p];
      int u = 2 * form.first[p];
      int v = 2 * form.second[p];
      if (value < 0) {
        // b x y = b x - b x (1 - y)
        linear[form.first[p]] += value;
        v++;
      }
      arcs = addTerm(tails, arcs, u, v, Math.abs(value));
    }
    for (int i = 0; i < size; i++) {
      int u = linear[i] < 0 ? 2 * i + 1 : 2 * i;
      sum += Math.min(0, linear[i]);
      arcs = addTerm(tails, arcs, u, source, Math.abs(linear[i]));
    }
    constant = sum;
    start = new int[nodes + 1];
    arc = byTail(tails, start);
    distance = new int[nodes];
    current = new int[nodes];
    queue = new int[nodes];
    path = new int[nodes];
  }

  private int addTerm(int[] tails, int at, int u, int v, long value) {
    tails[at] = u;
    head[at] = v ^ 1;
    room[at] = value;
    tails[at + 1] = v ^ 1;
    head[at + 1] = u;
    tails[at + 2] = v;
    head[at + 2] = u ^ 1;
    room[at + 2] = value;
    tails[at + 3] = u ^ 1;
    head[at + 3] = v;
    return at + 4;
  }

  private static int[] byTail(int[] tails, int[] start) {
    for (int tail : tails) {
      start[tail + 1]++;
    }
    for (int v = 1; v < start.length; v++) {
      start[v] += start[v - 1];
    }
    int[] next = Arrays.copyOf(start, start.length - 1);
    int[] arc = new int[tails.length];
    for (int a = 0; a < tails.length; a++) {
      arc[next[tails[a]]++] = a;
    }
    return arc;
  }

  /** Twice the lower bound that the flow proves so far, in the form's whole numbers. */
  long twiceBound() {
    return 2 * constant + flow;
  }

  /** Sends as much flow as fits along shortest paths, until none is left; false if cut short. */
  boolean maximise(Vigil vigil) {
    while (measure()) {
      if (!saturate(vigil)) {
        return false;
      }
    }
    return true;
  }

  /** Distances to the sink; whether the source has one. */
  boolean measure() {
    Arrays.fill(distance, UNREACHED);
    distance[sink] = 0;
    queue[0] = sink;
    int end = 1;
    for (int q = 0; q < end; q++) {
      int v = queue[q];
      for (int k = start[v]; k < start[v + 1]; k++) {
        int u = head[arc[k]];
        if (distance[u] == UNREACHED && room[arc[k] ^ 1] > 0) {
          distance[u] = distance[v] + 1;
          queue[end++] = u;
        }
      }
    }
    work += arc.length;
    return distance[source] != UNREACHED;
  }

  /** Blocks every shortest path. */
  private boolean saturate(Vigil vigil) {
    System.arraycopy(start, 0, current, 0, nodes);
    int depth = 0;
    int v = source;
    while (true) {
      if (++work >= Vigil.STEPS / 4) {
        work = 0;
        if (vigil.over()) {
          return false;
        }
      }
      if (v == sink) {
        depth = push(depth);
        v = head[path[depth] ^ 1];
        continue;
      }
      int next = advance(v);
      if (next >= 0) {
        path[depth++] = next;
        v = head[next];
      } else if (depth == 0) {
        return true;
      } else {
        depth--;
        v = head[path[depth] ^ 1];
        current[v]++;
      }
    }
  }

  /** The next arc of a node that leads one step nearer to the sink, or -1. */
  private int advance(int v) {
    int end = start[v + 1];
    for (int k = current[v]; k < end; k++) {
      int a = arc[k];
      if (room[a] > 0 && distance[head[a]] == distance[v] - 1) {
        current[v] = k;
        return a;
      }
    }
    current[v] = end;
    return -1;
  }

  /** Sends what fits along the path; returns where its first full arc is. */
  private int push(int depth) {
    long most = Long.MAX_VALUE;
    for (int d = 0; d < depth; d++) {
      most = Math.min(most, room[path[d]]);
    }
    int full = depth;
    for (int d = depth - 1; d >= 0; d--) {
      int a = path[d];
      room[a] -= most;
      room[a ^ 1] += most;
      if (room[a] == 0) {
        full = d;
      }
    }
    work += 2 * depth;
    flow += most;
    return full;
  }
}
