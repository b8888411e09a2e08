package dev.couplet.kernel;

import dev.couplet.sampling.Draw;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The draws of a run so far. Thread-safe.
 *
 * <p>Draws that were cut short are kept apart, the best only. If the number of draws is open, so
 * that only time ends them, those of highest energy make room when the states outgrow a fixed
 * memory.
 */
final class Kept {
  private record Entry(int number, Draw draw) {
    double energy() {
      return draw.energy();
    }
  }

  private static final Comparator<Entry> BY_ENERGY =
      Comparator.comparingDouble(Entry::energy).thenComparingInt(Entry::number);

  private static final Comparator<Entry> BY_NUMBER = Comparator.comparingInt(Entry::number);

  private final int capacity;
  private List<Entry> finished = new ArrayList<>();
  private @Nullable Entry cutShort;
  private double best = Double.POSITIVE_INFINITY;
  private long total;

  private Kept(int capacity) {
    this.capacity = capacity;
  }

  static Kept all() {
    return new Kept(Integer.MAX_VALUE);
  }

  /**
   * Keeps as many states as fit into 2^24 words, 16 at least and 1,024 at most: more would take too
   * long to sort and merge when time is up.
   */
  static Kept within(int size) {
    int words = 1 + size / 64;
    return new Kept(Math.min(1 << 10, Math.max(16, (1 << 24) / words)));
  }

  synchronized void finished(int number, Draw draw) {
    finished.add(new Entry(number, draw));
    total++;
    best = Math.min(best, draw.energy());
    if (finished.size() >= capacity) {
      finished.sort(BY_ENERGY);
      finished = new ArrayList<>(finished.subList(0, capacity / 2));
    }
  }

  synchronized void cutShort(int number, Draw draw) {
    Entry entry = new Entry(number, draw);
    if (cutShort == null || BY_ENERGY.compare(entry, cutShort) < 0) {
      cutShort = entry;
    }
    best = Math.min(best, draw.energy());
  }

  /** The lowest energy so far, infinite before the first. */
  synchronized double best() {
    return best;
  }

  /** The number of draws finished, those that made room among them. */
  synchronized long total() {
    return total;
  }

  /**
   * The draws up to a number, in order of their numbers; one that was cut short is among them only
   * if it is lower than every other.
   */
  synchronized List<Draw> upTo(int last) {
    List<Entry> kept = new ArrayList<>(finished.size() + 1);
    double lowest = Double.POSITIVE_INFINITY;
    for (Entry entry : finished) {
      if (entry.number <= last) {
        kept.add(entry);
        lowest = Math.min(lowest, entry.energy());
      }
    }
    kept.sort(BY_NUMBER);
    if (cutShort != null
        && cutShort.number <= last
        && (kept.isEmpty() || cutShort.energy() < lowest)) {
      kept.add(cutShort);
    }
    List<Draw> draws = new ArrayList<>(kept.size());
    for (Entry entry : kept) {
      draws.add(entry.draw);
    }
    return draws;
  }
}
