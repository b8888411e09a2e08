package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.TreeMap;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

/** Logs of pairs against a sorted map that adds up in the order of arrival. */
class PairLogProperties {
  private static final Comparator<List<Integer>> BY_ROW =
      Comparator.<List<Integer>>comparingInt(pair -> pair.get(0))
          .thenComparingInt(pair -> pair.get(1));

  private final Map<List<Integer>, Double> slow = new TreeMap<>(BY_ROW);

  private void add(PairLog log, int row, int column, double value) {
    log.add(row, column, value);
    slow.merge(List.of(row, column), value, Double::sum);
  }

  /** Reals, whose sums depend on the order; some cancel. */
  private void addRandom(PairLog log, SplittableRandom random, int size, int count, boolean sort) {
    List<List<Integer>> places = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      int row = random.nextInt(size - 1);
      places.add(List.of(row, random.nextInt(row + 1, size)));
    }
    if (sort) {
      places.sort(BY_ROW);
    }
    for (List<Integer> place : places) {
      double value = random.nextInt(4) == 0 ? random.nextInt(-1, 2) : random.nextDouble(-1, 1);
      add(log, place.get(0), place.get(1), value);
    }
  }

  private void assertAgrees(PairLog.Rows rows, int size) {
    slow.values().removeIf(sum -> sum == 0);
    int[] start = new int[size + 1];
    slow.keySet().forEach(pair -> start[pair.get(0) + 1]++);
    for (int i = 0; i < size; i++) {
      start[i + 1] += start[i];
    }
    assertArrayEquals(start, rows.start);
    assertArrayEquals(slow.keySet().stream().mapToInt(pair -> pair.get(1)).toArray(), rows.column);
    assertArrayEquals(slow.values().stream().mapToDouble(sum -> sum).toArray(), rows.value);
  }

  @Property
  void pairsAreAddedUpInTheOrderOfArrival(
      @ForAll long seed,
      @ForAll @IntRange(min = 2, max = 9) int size,
      @ForAll @IntRange(max = 120) int count,
      @ForAll boolean sort) {
    slow.clear();
    PairLog log = new PairLog(size);
    addRandom(log, new SplittableRandom(seed), size, count, sort);
    assertAgrees(log.compress(), size);
  }

  /** In order after what was compressed, and out of it; each time from there on. */
  @Property
  void aLogGoesOn(@ForAll long seed, @ForAll @IntRange(min = 2, max = 9) int size) {
    slow.clear();
    SplittableRandom random = new SplittableRandom(seed);
    PairLog log = new PairLog(size);
    for (int round = 0; round < 4; round++) {
      if (random.nextBoolean()) {
        add(log, size - 2, size - 1, 1);
      } else {
        addRandom(log, random, size, random.nextInt(40), random.nextBoolean());
      }
      PairLog.Rows rows = log.compress();
      assertAgrees(rows, size);
      assertSame(rows, log.compress());
    }
  }

  /** What was handed out does not change when the log goes on. */
  @Example
  void rowsStayAsTheyAre() {
    PairLog log = new PairLog(3);
    log.add(0, 2, 1);
    log.add(0, 1, 2);
    PairLog.Rows first = log.compress();
    log.add(0, 1, 3);
    assertEquals(2, log.compress().value.length);
    assertArrayEquals(new int[] {0, 2, 2, 2}, first.start);
    assertArrayEquals(new int[] {1, 2}, first.column);
    assertArrayEquals(new double[] {2, 1}, first.value);
  }

  /** Several blocks of the largest size, in order and not. */
  @Example
  void manyBlocks() {
    for (boolean sort : new boolean[] {true, false}) {
      slow.clear();
      PairLog log = new PairLog(700);
      addRandom(log, new SplittableRandom(1), 700, 300_000, sort);
      assertAgrees(log.compress(), 700);
    }
  }

  @Example
  void tooManyEntriesAreRefused() {
    Check.entries(Integer.MAX_VALUE - 8L);
    assertThrows(IllegalArgumentException.class, () -> Check.entries(Integer.MAX_VALUE - 7L));
  }
}
