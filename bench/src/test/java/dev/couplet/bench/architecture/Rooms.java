package dev.couplet.bench.architecture;

import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;

/** The rooms of the house and the arrows between them, as the design states them. */
final class Rooms {
  /** The rooms of the module api. */
  static final List<String> API = List.of("form", "model", "sampling", "lower", "audit");

  /** What each room may import directly; what those may import, it may too. */
  private static final Map<String, List<String>> ARROWS =
      Map.ofEntries(
          Map.entry("form", List.of()),
          Map.entry("model", List.of("form")),
          Map.entry("sampling", List.of("form")),
          Map.entry("lower", List.of("model", "sampling")),
          Map.entry("audit", List.of("lower", "sampling")),
          Map.entry("host", List.of("sampling", "lower")),
          Map.entry("embed", List.of("host")),
          Map.entry("bond", List.of("embed")),
          Map.entry("forecast", List.of("bond")),
          Map.entry("kernel", List.of("sampling", "lower")),
          Map.entry("anneal", List.of("kernel")),
          Map.entry("search", List.of("kernel")),
          Map.entry("bound", List.of("kernel")),
          Map.entry("reduce", List.of("bound")),
          Map.entry("exact", List.of("reduce")),
          Map.entry("solve", List.of("anneal", "search", "exact")),
          Map.entry("bench", List.of("audit", "forecast", "solve")));

  private Rooms() {}

  /** Every room with all the rooms it may import, itself among them. */
  static Map<String, Set<String>> reachable() {
    Map<String, Set<String>> reachable = new TreeMap<>();
    for (String room : ARROWS.keySet()) {
      Set<String> found = new TreeSet<>();
      visit(room, found);
      reachable.put(room, found);
    }
    return reachable;
  }

  private static void visit(String room, Set<String> found) {
    if (found.add(room)) {
      ARROWS.get(room).forEach(next -> visit(next, found));
    }
  }
}
