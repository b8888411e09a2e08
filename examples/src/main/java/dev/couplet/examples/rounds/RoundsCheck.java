package dev.couplet.examples.rounds;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Collections;
import java.util.Deque;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/** Refuses data that no plan can satisfy for a reason that can be named without a search. */
final class RoundsCheck {
  private final RoundsData data;

  private RoundsCheck(RoundsData data) {
    this.data = data;
  }

  /**
   * Insists that the data makes sense as a whole.
   *
   * @throws BadInput naming the crates or the villages at fault
   */
  static void check(RoundsData data) {
    RoundsCheck check = new RoundsCheck(data);
    check.requireRoomForAll();
    check.requireNoContradiction();
    check.requireRoomForGroups();
    check.requireTwoVansForApart();
  }

  private void requireRoomForAll() {
    if (data.crates() > data.capacity()) {
      throw new BadInput(
          "the villages of "
              + RoundsReader.VILLAGES
              + " get "
              + data.crates()
              + " crates in total, but the vans of "
              + RoundsReader.VANS
              + " carry only "
              + data.capacity()
              + " in total");
    }
  }

  private void requireNoContradiction() {
    for (Pair pair : data.apart()) {
      Map<Village, Village> cameFrom = reached(pair.one());
      if (cameFrom.containsKey(pair.other())) {
        throw new BadInput(
            pair
                + " must not share a van by "
                + RoundsReader.APART
                + ", but must by "
                + RoundsReader.TOGETHER
                + ": "
                + chain(cameFrom, pair.other()));
      }
    }
  }

  /** The pairs that lead from the start of a search to a village. */
  private static String chain(Map<Village, Village> cameFrom, Village end) {
    List<String> pairs = new ArrayList<>();
    Village village = end;
    for (Village before = before(cameFrom, village);
        !before.equals(village);
        before = before(cameFrom, village)) {
      pairs.add(before + " with " + village);
      village = before;
    }
    Collections.reverse(pairs);
    return String.join(", ", pairs);
  }

  private static Village before(Map<Village, Village> cameFrom, Village village) {
    return cameFrom.getOrDefault(village, village);
  }

  /**
   * The villages that must share a van with one, each with the village it was reached from; the
   * start is reached from itself. Breadth first, so that chains are short.
   */
  private Map<Village, Village> reached(Village start) {
    Map<Village, Village> cameFrom = new LinkedHashMap<>();
    cameFrom.put(start, start);
    Deque<Village> waiting = new ArrayDeque<>(List.of(start));
    while (!waiting.isEmpty()) {
      Village village = waiting.remove();
      for (Pair pair : data.together()) {
        if (pair.one().equals(village) || pair.other().equals(village)) {
          Village next = pair.one().equals(village) ? pair.other() : pair.one();
          if (cameFrom.putIfAbsent(next, village) == null) {
            waiting.add(next);
          }
        }
      }
    }
    return cameFrom;
  }

  private void requireRoomForGroups() {
    int largest = data.vans().stream().mapToInt(Van::capacity).max().orElse(0);
    for (Village village : data.villages()) {
      List<Village> group = List.copyOf(reached(village).keySet());
      long crates = group.stream().mapToLong(Village::crates).sum();
      if (crates > largest) {
        throw new BadInput(tooMuchForOneVan(group, crates) + largest);
      }
    }
  }

  private static String tooMuchForOneVan(List<Village> group, long crates) {
    String names = group.stream().map(Village::name).collect(Collectors.joining(", "));
    String who =
        group.size() == 1
            ? names + " of " + RoundsReader.VILLAGES + " gets "
            : names + " must share a van by " + RoundsReader.TOGETHER + " and get ";
    return who + crates + " crates, but no van of " + RoundsReader.VANS + " carries more than ";
  }

  private void requireTwoVansForApart() {
    if (data.vans().size() == 1 && !data.apart().isEmpty()) {
      throw new BadInput(
          data.apart().get(0)
              + " must not share a van by "
              + RoundsReader.APART
              + ", but "
              + RoundsReader.VANS
              + " lists only one");
    }
  }
}
