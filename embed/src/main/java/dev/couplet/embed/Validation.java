package dev.couplet.embed;

import dev.couplet.host.Host;
import java.util.Arrays;
import java.util.List;

/** Checks branch sets; every fault is an exception that names the vertex or edge. */
final class Validation {
  private final Guest guest;
  private final Host host;
  private final List<int[]> sets;
  private final int[] owner;
  private final int[] start;
  private final int[] target;

  private Validation(Guest guest, Host host, List<int[]> sets) {
    this.guest = guest;
    this.host = host;
    this.sets = sets;
    this.owner = new int[host.vertices()];
    Arrays.fill(owner, -1);
    this.start = host.graph().offsets();
    this.target = host.graph().targets();
  }

  /** The guest vertex of every host vertex, -1 for none, once all checks have passed. */
  static int[] owners(Guest guest, Host host, List<int[]> sets) {
    if (sets.size() != guest.vertices()) {
      throw new IllegalArgumentException(
          sets.size()
              + " branch sets were given for the "
              + guest.vertices()
              + " vertices of "
              + guest.name()
              + "; give one for each");
    }
    Validation validation = new Validation(guest, host, sets);
    validation.claim();
    validation.connected();
    validation.carried();
    return validation.owner;
  }

  private void claim() {
    for (int g = 0; g < sets.size(); g++) {
      if (sets.get(g).length == 0) {
        throw new IllegalArgumentException(
            "the branch set of guest vertex " + g + " is empty; give it a host vertex");
      }
      for (int v : sets.get(g)) {
        claim(g, v);
      }
    }
  }

  private void claim(int g, int v) {
    if (v < 0 || v >= owner.length || !host.present(v)) {
      throw new IllegalArgumentException(
          "the branch set of guest vertex "
              + g
              + " holds host vertex "
              + v
              + ", which is not in host "
              + host.name());
    }
    if (owner[v] >= 0) {
      throw new IllegalArgumentException(
          owner[v] == g
              ? "the branch set of guest vertex " + g + " lists host vertex " + v + " twice"
              : "host vertex "
                  + v
                  + " is in the branch sets of guest vertices "
                  + owner[v]
                  + " and "
                  + g);
    }
    owner[v] = g;
  }

  private void connected() {
    boolean[] reached = new boolean[owner.length];
    int[] queue = new int[owner.length];
    for (int g = 0; g < sets.size(); g++) {
      int[] set = sets.get(g);
      spread(g, set[0], reached, queue);
      for (int v : set) {
        if (!reached[v]) {
          throw new IllegalArgumentException(
              "the branch set of guest vertex "
                  + g
                  + " is not connected: host vertex "
                  + v
                  + " cannot be reached from "
                  + set[0]);
        }
      }
    }
  }

  private void spread(int g, int first, boolean[] reached, int[] queue) {
    int tail = 0;
    queue[tail++] = first;
    reached[first] = true;
    for (int head = 0; head < tail; head++) {
      int v = queue[head];
      for (int k = start[v]; k < start[v + 1]; k++) {
        int w = target[k];
        if (owner[w] == g && !reached[w]) {
          reached[w] = true;
          queue[tail++] = w;
        }
      }
    }
  }

  private void carried() {
    int[] met = new int[sets.size()];
    Arrays.fill(met, -1);
    for (int g = 0; g < sets.size(); g++) {
      for (int v : sets.get(g)) {
        for (int k = start[v]; k < start[v + 1]; k++) {
          if (owner[target[k]] >= 0) {
            met[owner[target[k]]] = g;
          }
        }
      }
      for (int other : guest.graph().neighbours(g)) {
        if (met[other] != g) {
          throw new IllegalArgumentException(
              "no host edge carries guest edge ("
                  + g
                  + ", "
                  + other
                  + "): the two branch sets do not meet");
        }
      }
    }
  }
}
