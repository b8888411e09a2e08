package dev.couplet.bench.models;

import java.util.Arrays;

/**
 * A table of finite numbers, rows and columns counted from 0: distances, flows, profits, weights.
 * Immutable.
 */
public final class NumberTable {
  private final int rows;
  private final int columns;
  private final double[] numbers;

  private NumberTable(int rows, int columns, double[] numbers) {
    this.rows = rows;
    this.columns = columns;
    this.numbers = numbers;
  }

  /**
   * The table of these numbers, row by row.
   *
   * @throws IllegalArgumentException if there are not {@code rows * columns} of them, or one is not
   *     finite
   */
  public static NumberTable of(int rows, int columns, double... numbers) {
    if ((long) rows * columns != numbers.length) {
      throw new IllegalArgumentException(
          numbers.length + " numbers do not fill a table of " + rows + " rows and " + columns);
    }
    for (double number : numbers) {
      if (!Double.isFinite(number)) {
        throw new IllegalArgumentException("a number of the table is " + number);
      }
    }
    return new NumberTable(rows, columns, numbers.clone());
  }

  /** The number of rows. */
  public int rows() {
    return rows;
  }

  /** The number of columns. */
  public int columns() {
    return columns;
  }

  /** One number. */
  public double at(int row, int column) {
    if (row < 0 || row >= rows || column < 0 || column >= columns) {
      throw new IndexOutOfBoundsException(
          "place " + row + ", " + column + " of a table of " + rows + " by " + columns);
    }
    return numbers[row * columns + column];
  }

  /** Whether it is square and every number equals the one mirrored at the diagonal. */
  public boolean symmetric() {
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < i; j++) {
        if (rows != columns || at(i, j) != at(j, i)) {
          return false;
        }
      }
    }
    return rows == columns;
  }

  /**
   * Insists that it has so many rows and columns.
   *
   * @throws IllegalArgumentException if it has not
   */
  void require(String what, int wantedRows, int wantedColumns) {
    if (rows != wantedRows || columns != wantedColumns) {
      throw new IllegalArgumentException(
          what
              + " has "
              + rows
              + " rows and "
              + columns
              + " columns, needed are "
              + wantedRows
              + " and "
              + wantedColumns);
    }
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof NumberTable other
        && rows == other.rows
        && columns == other.columns
        && Arrays.equals(numbers, other.numbers);
  }

  @Override
  public int hashCode() {
    return 31 * columns + Arrays.hashCode(numbers);
  }

  @Override
  public String toString() {
    return "NumberTable(" + rows + " x " + columns + ")";
  }
}
