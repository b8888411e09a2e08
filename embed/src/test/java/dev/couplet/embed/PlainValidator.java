package dev.couplet.embed;

import dev.couplet.host.Host;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;

/** The definition of an embedding on plain sets; shares no code with the library's own checks. */
public final class PlainValidator {
  private PlainValidator() {}

  /** What is wrong with an embedding; empty if nothing is. */
  public static List<String> faults(Embedding embedding) {
    List<int[]> sets = new ArrayList<>();
    for (BranchSet set : embedding.sets()) {
      sets.add(set.toArray());
    }
    return faults(embedding.guest(), embedding.host(), sets);
  }

  /** What is wrong with branch sets; empty if nothing is. */
  public static List<String> faults(Guest guest, Host host, List<int[]> arrays) {
    List<String> faults = new ArrayList<>();
    Set<List<Integer>> edges = new HashSet<>();
    host.graph()
        .forEachEdge(
            (u, v) -> {
              edges.add(List.of(u, v));
              edges.add(List.of(v, u));
            });
    if (arrays.size() != guest.vertices()) {
      faults.add("number of sets");
      return faults;
    }
    Set<Integer> used = new HashSet<>();
    List<Set<Integer>> sets = new ArrayList<>();
    for (int[] array : arrays) {
      Set<Integer> set = new TreeSet<>();
      for (int v : array) {
        if (v < 0 || v >= host.vertices() || !host.present(v)) {
          faults.add("vertex " + v + " is not there");
        } else if (!set.add(v) || !used.add(v)) {
          faults.add("vertex " + v + " is used twice");
        }
      }
      if (!connected(set, edges)) {
        faults.add("set " + sets.size() + " is empty or not connected");
      }
      sets.add(set);
    }
    guest
        .graph()
        .forEachEdge(
            (g, h) -> {
              boolean carried =
                  sets.get(g).stream()
                      .anyMatch(
                          u -> sets.get(h).stream().anyMatch(v -> edges.contains(List.of(u, v))));
              if (!carried) {
                faults.add("edge " + g + " " + h + " is not carried");
              }
            });
    return faults;
  }

  private static boolean connected(Set<Integer> set, Set<List<Integer>> edges) {
    if (set.isEmpty()) {
      return false;
    }
    Set<Integer> reached = new HashSet<>(List.of(set.iterator().next()));
    boolean grew = true;
    while (grew) {
      grew = false;
      for (int v : set) {
        if (!reached.contains(v) && reached.stream().anyMatch(u -> edges.contains(List.of(u, v)))) {
          grew = reached.add(v);
        }
      }
    }
    return reached.size() == set.size();
  }
}
