package dev.couplet.embed.path;

import java.util.Arrays;

/**
 * Shortest paths over host vertices that each cost a small whole number to enter.
 *
 * <p>A vertex is entered for its own cost from wherever it is reached first, so its label is final
 * when it is set: no label is ever lowered and each vertex is queued once. The queue is a ring of
 * buckets, one for every distance within the largest cost of the current one (Dial 1969), with a
 * bit for each bucket that is not empty.
 *
 * <p>Invariant: all queued distances lie in {@code [now, now + LARGEST]}; a vertex v is labelled if
 * {@code seen[v] == round}, and then {@code distance[v]} and {@code from[v]} are valid ({@code
 * from[v] == v} at a source).
 */
final class Spread {
  /** The largest cost of a vertex that can be entered. */
  static final int LARGEST = (1 << 13) - 1;

  /** The cost of a vertex that cannot be entered. */
  static final int BLOCKED = Integer.MAX_VALUE;

  private static final int RING = LARGEST + 1;

  final int[] distance;
  final int[] from;

  private final int[] start;
  private final int[] target;
  private final int[] seen;
  private final int[] next;
  private final int[] bucket = new int[RING];
  private final long[] filled = new long[RING / 64];
  private int round;
  private int queued;
  private int now;

  Spread(int[] start, int[] target) {
    this.start = start;
    this.target = target;
    int n = start.length - 1;
    this.distance = new int[n];
    this.from = new int[n];
    this.seen = new int[n];
    this.next = new int[n];
    Arrays.fill(bucket, -1);
  }

  /** Forgets all labels. */
  void begin() {
    if (queued > 0) {
      Arrays.fill(bucket, -1);
      Arrays.fill(filled, 0);
      queued = 0;
    }
    now = 0;
    if (++round == 0) {
      Arrays.fill(seen, 0);
      round = 1;
    }
  }

  boolean labelled(int vertex) {
    return seen[vertex] == round;
  }

  /** Whether there is a vertex that is labelled and not settled. */
  boolean more() {
    return queued > 0;
  }

  int degree(int vertex) {
    return start[vertex + 1] - start[vertex];
  }

  /** A vertex to start from, at distance 0; before the first call of {@link #settle}. */
  void source(int vertex) {
    if (seen[vertex] != round) {
      label(vertex, vertex, 0);
    }
  }

  private void label(int vertex, int cameFrom, int reached) {
    seen[vertex] = round;
    distance[vertex] = reached;
    from[vertex] = cameFrom;
    int slot = reached & LARGEST;
    next[vertex] = bucket[slot];
    bucket[slot] = vertex;
    filled[slot >> 6] |= 1L << slot;
    queued++;
  }

  /**
   * The nearest vertex not settled yet, now settled and its neighbours labelled; -1 if there is
   * none within the limit.
   */
  int settle(int[] cost, long limit) {
    if (queued == 0) {
      return -1;
    }
    advance();
    if (now > limit) {
      return -1;
    }
    int slot = now & LARGEST;
    int vertex = bucket[slot];
    bucket[slot] = next[vertex];
    if (bucket[slot] < 0) {
      filled[slot >> 6] &= ~(1L << slot);
    }
    queued--;
    for (int k = start[vertex]; k < start[vertex + 1]; k++) {
      int w = target[k];
      if (seen[w] != round && cost[w] != BLOCKED) {
        label(w, vertex, now + cost[w]);
      }
    }
    return vertex;
  }

  /** Moves on to the next distance that has a vertex. */
  private void advance() {
    int slot = now & LARGEST;
    int word = slot >> 6;
    long bits = filled[word] & -1L << slot;
    while (bits == 0) {
      word = (word + 1) % filled.length;
      bits = filled[word];
    }
    int found = (word << 6) + Long.numberOfTrailingZeros(bits);
    now += (found - slot) & LARGEST;
  }
}
