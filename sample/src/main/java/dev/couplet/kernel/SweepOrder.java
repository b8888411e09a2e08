package dev.couplet.kernel;

import java.util.Arrays;
import java.util.Optional;

/**
 * The rows of a form in an order to sweep over them. Shared by the threads of a run.
 *
 * <p>A sparse form is arranged in blocks without pairs among them, so that all attempts of a block
 * can be decided before any flip is made; others stay as they are. Block b are the places {@code
 * bounds[b] <= p < bounds[b + 1]} of the arranged rows.
 */
public final class SweepOrder {
  /** The longest block: its decisions stay in the nearest cache. */
  static final int BLOCK = 1 << 10;

  /** Blocks shorter than this on average are not worth their overhead. */
  private static final int SHORT = 32;

  private final Adjacency rows;
  private final int[] bounds;

  private SweepOrder(Adjacency rows, int[] bounds) {
    this.rows = rows;
    this.bounds = bounds;
  }

  /** Variable after variable, without blocks. */
  static SweepOrder natural(Adjacency rows) {
    return new SweepOrder(rows, new int[0]);
  }

  /**
   * Arranges a form in blocks if its pairs are few enough for long ones; leaves others as they are,
   * and all if the pace ends before. O(n + m) time and memory.
   */
  public static SweepOrder of(Adjacency rows, Pace pace) {
    return rows.size() < SHORT
        ? natural(rows)
        : Colouring.order(rows, pace)
            .flatMap(order -> arranged(rows, order, pace))
            .orElseGet(() -> natural(rows));
  }

  private static Optional<SweepOrder> arranged(Adjacency rows, int[] order, Pace pace) {
    int[] bounds = bounds(rows, order, pace);
    boolean shorter = (long) bounds.length * SHORT > order.length;
    return shorter || pace.lookBefore(12L * rows.neighbour().length)
        ? Optional.empty()
        : rows.arranged(order, pace).map(arranged -> new SweepOrder(arranged, bounds));
  }

  private static int[] bounds(Adjacency rows, int[] order, Pace pace) {
    int[] seen = new int[order.length];
    int[] bounds = new int[16];
    int count = 0;
    for (int from = 0; from < order.length && !pace.ended(); ) {
      if (count + 2 > bounds.length) {
        bounds = Arrays.copyOf(bounds, 2 * bounds.length);
      }
      bounds[count++] = from;
      int next = from + Colouring.independent(rows, order, from, BLOCK, seen);
      long steps = 0;
      for (; from < next; from++) {
        steps += 1 + rows.degree(order[from]);
      }
      if (pace.after(steps)) {
        break;
      }
    }
    bounds[count] = order.length;
    return Arrays.copyOf(bounds, count + 1);
  }

  /** The rows, arranged. */
  public Adjacency rows() {
    return rows;
  }

  /** Whether variables are to be swept in blocks. */
  boolean inBlocks() {
    return bounds.length > 0;
  }

  /** Where blocks begin and end. */
  int[] bounds() {
    return bounds;
  }
}
