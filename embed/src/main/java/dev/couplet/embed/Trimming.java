package dev.couplet.embed;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Takes host vertices away that an embedding can do without.
 *
 * <p>Largest set first, it removes vertices that the set's rest is connected without and that are
 * not its only contact to a neighbouring set, until none is left. A removed vertex frees nothing
 * that was needed before, but can make another's contact the only one: so one pass over all sets,
 * each until nothing changes, is enough.
 */
final class Trimming {
  private final Guest guest;
  private final int[] start;
  private final int[] target;
  private final int[] owner;
  private final int[] contacts;
  private final int[] seen;
  private int stamp;

  private Trimming(Embedding embedding) {
    this.guest = embedding.guest();
    this.start = embedding.host().graph().offsets();
    this.target = embedding.host().graph().targets();
    this.owner = new int[embedding.host().vertices()];
    Arrays.fill(owner, -1);
    for (BranchSet set : embedding.sets()) {
      for (int v : set.toArray()) {
        owner[v] = set.guest();
      }
    }
    this.contacts = new int[guest.vertices()];
    this.seen = new int[owner.length];
  }

  static List<int[]> trim(Embedding embedding) {
    Trimming trimming = new Trimming(embedding);
    List<BranchSet> order = new ArrayList<>(embedding.sets());
    order.sort((a, b) -> Integer.compare(b.size(), a.size()));
    int[][] result = new int[order.size()][];
    for (BranchSet set : order) {
      result[set.guest()] = trimming.trim(set);
    }
    return List.of(result);
  }

  private int[] trim(BranchSet set) {
    int[] left = set.toArray();
    for (int next = dispensable(set.guest(), left); next >= 0; ) {
      owner[left[next]] = -1;
      left[next] = left[left.length - 1];
      left = Arrays.copyOf(left, left.length - 1);
      next = dispensable(set.guest(), left);
    }
    return left;
  }

  /** A place in the set whose vertex can be removed, or -1. */
  private int dispensable(int g, int[] set) {
    if (set.length == 1) {
      return -1;
    }
    countContacts(set);
    for (int k = 0; k < set.length; k++) {
      if (!carriesAlone(g, set[k]) && connectedWithout(g, set, set[k])) {
        return k;
      }
    }
    return -1;
  }

  /** For every guest vertex, how many vertices of the set touch its branch set. */
  private void countContacts(int[] set) {
    Arrays.fill(contacts, 0);
    for (int v : set) {
      forEachTouched(v, 1);
    }
  }

  private void forEachTouched(int v, int change) {
    stamp++;
    for (int k = start[v]; k < start[v + 1]; k++) {
      int other = owner[target[k]];
      if (other >= 0 && seen[other] != stamp) {
        seen[other] = stamp;
        contacts[other] += change;
      }
    }
  }

  private boolean carriesAlone(int g, int v) {
    forEachTouched(v, -1);
    boolean alone = false;
    for (int other : guest.graph().neighbours(g)) {
      alone |= contacts[other] == 0;
    }
    forEachTouched(v, 1);
    return alone;
  }

  private boolean connectedWithout(int g, int[] set, int without) {
    int first = set[0] == without ? set[1] : set[0];
    int[] queue = new int[set.length];
    int tail = 0;
    stamp++;
    seen[first] = stamp;
    queue[tail++] = first;
    for (int head = 0; head < tail; head++) {
      int v = queue[head];
      for (int k = start[v]; k < start[v + 1]; k++) {
        int w = target[k];
        if (w != without && owner[w] == g && seen[w] != stamp) {
          seen[w] = stamp;
          queue[tail++] = w;
        }
      }
    }
    return tail == set.length - 1;
  }
}
