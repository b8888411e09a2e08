package dev.couplet.kernel;

import dev.couplet.form.State;
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
  private record Entry(int number, State state, double energy) {}

  private static final Comparator<Entry> BY_ENERGY =
      Comparator.comparingDouble(Entry::energy).thenComparingInt(Entry::number);

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

  /** Keeps as many states as fit into 2^24 words, 1,024 at least and 2^20 at most. */
  static Kept within(int size) {
    int words = 1 + size / 64;
    return new Kept(Math.min(1 << 20, Math.max(1 << 10, (1 << 24) / words)));
  }

  synchronized void finished(int number, State state, double energy) {
    finished.add(new Entry(number, state, energy));
    total++;
    best = Math.min(best, energy);
    if (finished.size() >= capacity) {
      finished.sort(BY_ENERGY);
      finished = new ArrayList<>(finished.subList(0, capacity / 2));
    }
  }

  synchronized void cutShort(int number, State state, double energy) {
    Entry entry = new Entry(number, state, energy);
    if (cutShort == null || BY_ENERGY.compare(entry, cutShort) < 0) {
      cutShort = entry;
    }
    best = Math.min(best, energy);
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
   * The states of the draws up to a number, in order of their numbers; one that was cut short is
   * among them only if it is lower than every other.
   */
  synchronized List<State> upTo(int last) {
    List<Entry> kept = new ArrayList<>(finished);
    kept.removeIf(entry -> entry.number > last);
    kept.sort(Comparator.comparingInt(Entry::number));
    Entry extra = cutShort;
    if (extra != null
        && extra.number <= last
        && kept.stream().allMatch(entry -> extra.energy < entry.energy)) {
      kept.add(extra);
    }
    return kept.stream().map(Entry::state).toList();
  }
}
