package dev.couplet.embed;

import dev.couplet.host.CompactGraph;
import dev.couplet.host.Host;
import java.util.ArrayDeque;
import java.util.BitSet;
import java.util.Deque;
import java.util.Optional;

/** The definition of an embedding read off plainly, apart from the checks of its constructor. */
final class PlainCheck {
  private PlainCheck() {}

  /** What is wrong with an embedding, if anything; O(n^2) times the sizes of the branch sets. */
  static Optional<String> fault(Guest guest, Host host, Embedding embedding) {
    if (embedding.sets().size() != guest.vertices()) {
      return Optional.of("there are " + embedding.sets().size() + " branch sets");
    }
    BitSet used = new BitSet();
    for (BranchSet set : embedding.sets()) {
      for (int v : set.toArray()) {
        if (!host.present(v) || used.get(v)) {
          return Optional.of("host vertex " + v + " is missing or used twice");
        }
        used.set(v);
      }
      if (!connected(set, host.graph())) {
        return Optional.of("the branch set of " + set.guest() + " is empty or not connected");
      }
    }
    return notCarried(guest, host, embedding);
  }

  private static boolean connected(BranchSet set, CompactGraph graph) {
    if (set.size() == 0) {
      return false;
    }
    BitSet reached = new BitSet();
    Deque<Integer> waiting = new ArrayDeque<>();
    reached.set(set.vertex(0));
    waiting.add(set.vertex(0));
    while (!waiting.isEmpty()) {
      int u = waiting.remove();
      for (int v : set.toArray()) {
        if (!reached.get(v) && graph.adjacent(u, v)) {
          reached.set(v);
          waiting.add(v);
        }
      }
    }
    return reached.cardinality() == set.size();
  }

  private static Optional<String> notCarried(Guest guest, Host host, Embedding embedding) {
    for (int g = 0; g < guest.vertices(); g++) {
      for (int h : guest.graph().neighbours(g)) {
        if (!meet(embedding.set(g), embedding.set(h), host.graph())) {
          return Optional.of("guest edge (" + g + ", " + h + ") is not carried");
        }
      }
    }
    return Optional.empty();
  }

  private static boolean meet(BranchSet one, BranchSet other, CompactGraph graph) {
    for (int u : one.toArray()) {
      for (int v : other.toArray()) {
        if (graph.adjacent(u, v)) {
          return true;
        }
      }
    }
    return false;
  }
}
