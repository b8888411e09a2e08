package dev.couplet.examples.rounds;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalLong;
import java.util.function.ToLongFunction;

/**
 * The best value by looking at every assignment of villages to vans. Reads the files by itself, and
 * shares no code with the example or the library.
 */
final class SlowTwin {
  private final List<String[]> villages;
  private final List<String[]> vans;
  private final List<String[]> wishes;
  private final List<String[]> together;
  private final List<String[]> apart;
  private final Map<String, Integer> village = new LinkedHashMap<>();
  private final Map<String, Integer> van = new LinkedHashMap<>();

  SlowTwin(String villages, String vans, String wishes, String together, String apart) {
    this.villages = rows(villages);
    this.vans = rows(vans);
    this.wishes = rows(wishes);
    this.together = rows(together);
    this.apart = rows(apart);
    this.villages.forEach(row -> village.put(row[0], village.size()));
    this.vans.forEach(row -> van.put(row[0], van.size()));
  }

  static SlowTwin ofInventedData() {
    return new SlowTwin(
        TestFolder.invented("villages.csv"),
        TestFolder.invented("vans.csv"),
        TestFolder.invented("wishes.csv"),
        TestFolder.invented("together.csv"),
        TestFolder.invented("apart.csv"));
  }

  private static List<String[]> rows(String text) {
    List<String[]> rows = new ArrayList<>();
    for (String line : text.split("\n")) {
      if (!line.startsWith("#")) {
        rows.add(line.split(","));
      }
    }
    rows.remove(0);
    return rows;
  }

  /** The lowest value of all assignments that keep the rules; empty if none does. */
  OptionalLong optimum() {
    return lowest(this::value);
  }

  /** The lowest total of the shortest ways from a library and unmet wishes; empty likewise. */
  OptionalLong shortestWays(long east, long north) {
    long[][] places = villages.stream().map(SlowTwin::place).toArray(long[][]::new);
    HeldKarp ways = new HeldKarp(new long[] {east, north}, places);
    return lowest(by -> ways(by, ways) + unmetWishes(by));
  }

  private long ways(int[] by, HeldKarp ways) {
    int[] sets = new int[vans.size()];
    for (int v = 0; v < by.length; v++) {
      sets[by[v]] |= 1 << v;
    }
    return Arrays.stream(sets).mapToLong(ways::through).sum();
  }

  private OptionalLong lowest(ToLongFunction<int[]> value) {
    int n = villages.size();
    long best = Long.MAX_VALUE;
    int[] by = new int[n];
    int moved = 0;
    while (moved < n) {
      if (allowed(by)) {
        best = Math.min(best, value.applyAsLong(by));
      }
      moved = 0;
      while (moved < n && ++by[moved] == vans.size()) {
        by[moved++] = 0;
      }
    }
    return best == Long.MAX_VALUE ? OptionalLong.empty() : OptionalLong.of(best);
  }

  private boolean allowed(int[] by) {
    int[] load = new int[vans.size()];
    for (int v = 0; v < by.length; v++) {
      load[by[v]] += Integer.parseInt(villages.get(v)[1]);
    }
    for (int k = 0; k < load.length; k++) {
      if (load[k] > Integer.parseInt(vans.get(k)[1])) {
        return false;
      }
    }
    return together.stream().allMatch(pair -> share(by, pair))
        && apart.stream().noneMatch(pair -> share(by, pair));
  }

  private boolean share(int[] by, String[] pair) {
    return by[village.get(pair[0])] == by[village.get(pair[1])];
  }

  private long value(int[] by) {
    long sum = 0;
    for (int v = 0; v < by.length; v++) {
      for (int w = v + 1; w < by.length; w++) {
        sum += by[v] == by[w] ? metres(villages.get(v), villages.get(w)) : 0;
      }
    }
    return sum + unmetWishes(by);
  }

  private long unmetWishes(int[] by) {
    long sum = 0;
    for (String[] wish : wishes) {
      sum += by[village.get(wish[0])] == van.get(wish[1]) ? 0 : Long.parseLong(wish[2]);
    }
    return sum;
  }

  private static long metres(String[] one, String[] other) {
    return HeldKarp.metres(place(one), place(other));
  }

  private static long[] place(String[] village) {
    return new long[] {Long.parseLong(village[2]), Long.parseLong(village[3])};
  }
}
