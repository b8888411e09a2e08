package dev.couplet.form;

import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.Deque;

/**
 * Pairs with their coefficients in the order of arrival, until they are compressed into rows.
 *
 * <p>They wait in blocks, so that nothing is copied as they grow: 16 bytes a pair. Compressing
 * takes 12 more; it counts the pairs of each row and puts them in their places, and lets go of each
 * block when it is done with. Pairs that did not arrive in order go through the same once more by
 * their columns first; both times stably, so that sums over equal pairs follow the order of
 * arrival.
 */
final class PairLog {
  private static final int FIRST_BLOCK = 16;
  private static final int LARGEST_BLOCK = 1 << 16;

  /**
   * Rows of pairs, compressed: those of row i lie from {@code start[i]} to {@code start[i + 1]}.
   */
  static final class Rows {
    final int[] start;
    final int[] column;
    final double[] value;

    Rows(int[] start, int[] column, double[] value) {
      this.start = start;
      this.column = column;
      this.value = value;
    }
  }

  private static final class Block {
    final int[] rows;
    final int[] columns;
    final double[] values;
    int count;

    Block(int[] rows, int[] columns, double[] values, int count) {
      this.rows = rows;
      this.columns = columns;
      this.values = values;
      this.count = count;
    }

    Block(int length) {
      this(new int[length], new int[length], new double[length], 0);
    }

    static Block of(Rows merged) {
      int[] rows = new int[merged.column.length];
      for (int i = 0; i + 1 < merged.start.length; i++) {
        Arrays.fill(rows, merged.start[i], merged.start[i + 1], i);
      }
      return new Block(rows, merged.column, merged.value, rows.length);
    }
  }

  private final int size;
  private final Deque<Block> full = new ArrayDeque<>();
  private Block last = new Block(FIRST_BLOCK);
  private Rows merged;
  private long count;
  private boolean ordered = true;
  private int lastRow;
  private int lastColumn;

  PairLog(int size) {
    this.size = size;
    this.merged = new Rows(new int[size + 1], new int[0], new double[0]);
  }

  /** Adds a pair with {@code row < column}. */
  void add(int row, int column, double value) {
    Block block = last;
    if (block.count == block.rows.length) {
      block = grow();
    }
    ordered &= lastRow < row || (lastRow == row && lastColumn <= column);
    lastRow = row;
    lastColumn = column;
    block.rows[block.count] = row;
    block.columns[block.count] = column;
    block.values[block.count++] = value;
  }

  private Block grow() {
    count += last.count;
    int wanted = Math.min(LARGEST_BLOCK, 2 * last.rows.length);
    Check.entries(count + merged.column.length + wanted);
    full.add(last);
    last = new Block(wanted);
    return last;
  }

  /**
   * All pairs, those of one place added up, sums of zero left out. The log goes on from there; the
   * arrays are not written to any more.
   */
  Rows compress() {
    if (last.count > 0) {
      if (merged.column.length > 0) {
        full.addFirst(Block.of(merged));
      }
      full.add(last);
      int total = full.stream().mapToInt(block -> block.count).sum();
      last = new Block(FIRST_BLOCK);
      merged = summed(ordered ? inOrder(total) : sorted(total));
      count = 0;
      ordered = true;
      setLast();
    }
    return merged;
  }

  /** What comes next is in order if it comes after the last of what is merged. */
  private void setLast() {
    int pairs = merged.column.length;
    lastRow = 0;
    lastColumn = 0;
    if (pairs > 0) {
      lastRow = size - 1;
      while (merged.start[lastRow] == pairs) {
        lastRow--;
      }
      lastColumn = merged.column[pairs - 1];
    }
  }

  private Rows inOrder(int total) {
    int[] start = new int[size + 1];
    int[] column = new int[total];
    double[] value = new double[total];
    int filled = 0;
    while (!full.isEmpty()) {
      Block block = full.remove();
      for (int p = 0; p < block.count; p++) {
        start[block.rows[p] + 1]++;
      }
      System.arraycopy(block.columns, 0, column, filled, block.count);
      System.arraycopy(block.values, 0, value, filled, block.count);
      filled += block.count;
    }
    accumulate(start);
    return new Rows(start, column, value);
  }

  private Rows sorted(int total) {
    int[] rowsByColumn = new int[total];
    double[] valuesByColumn = new double[total];
    int[] end = byColumn(rowsByColumn, valuesByColumn);
    int[] start = new int[size + 1];
    for (int row : rowsByColumn) {
      start[row + 1]++;
    }
    accumulate(start);
    int[] next = start.clone();
    int[] column = new int[total];
    double[] value = new double[total];
    int p = 0;
    for (int c = 0; c < size; c++) {
      for (; p < end[c]; p++) {
        int place = next[rowsByColumn[p]]++;
        column[place] = c;
        value[place] = valuesByColumn[p];
      }
    }
    return new Rows(start, column, value);
  }

  /** Fills in rows and values by columns; returns where each column ends. */
  private int[] byColumn(int[] rows, double[] values) {
    int[] next = new int[size + 1];
    for (Block block : full) {
      for (int p = 0; p < block.count; p++) {
        next[block.columns[p] + 1]++;
      }
    }
    accumulate(next);
    while (!full.isEmpty()) {
      Block block = full.remove();
      for (int p = 0; p < block.count; p++) {
        int place = next[block.columns[p]]++;
        rows[place] = block.rows[p];
        values[place] = block.values[p];
      }
    }
    return next;
  }

  private static void accumulate(int[] counts) {
    for (int k = 1; k < counts.length; k++) {
      counts[k] += counts[k - 1];
    }
  }

  /** Adds up the neighbours that are of one place, and leaves out sums of zero. */
  private static Rows summed(Rows rows) {
    int[] start = rows.start;
    int[] column = rows.column;
    double[] value = rows.value;
    int kept = 0;
    for (int i = 0, p = 0; i + 1 < start.length; i++) {
      int end = start[i + 1];
      start[i] = kept;
      while (p < end) {
        int place = column[p];
        double sum = 0;
        while (p < end && column[p] == place) {
          sum += value[p++];
        }
        if (sum != 0) {
          column[kept] = place;
          value[kept++] = sum;
        }
      }
    }
    start[start.length - 1] = kept;
    return kept == column.length
        ? rows
        : new Rows(start, Arrays.copyOf(column, kept), Arrays.copyOf(value, kept));
  }
}
