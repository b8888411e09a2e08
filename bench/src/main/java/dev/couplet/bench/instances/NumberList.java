package dev.couplet.bench.instances;

import dev.couplet.bench.models.NumberTable;
import dev.couplet.form.TokenReader;
import java.io.IOException;
import java.util.Arrays;
import java.util.List;

/**
 * Numbers that stand in a text one after another, wherever the lines end. Memory grows with what is
 * really there, so that a slip in a size is told of before it exhausts the memory.
 */
final class NumberList {
  private static final int AT_FIRST = 1 << 12;
  private static final int LARGEST = 1 << 28;

  private NumberList() {}

  /** Reads so many numbers. */
  static double[] read(TokenReader text, int count, String what) throws IOException {
    double[] numbers = new double[Math.min(count, AT_FIRST)];
    for (int k = 0; k < count; k++) {
      String place = what + ", number " + (k + 1) + " of " + count + ",";
      text.seekToken(place);
      double number = text.number(place);
      if (k == numbers.length) {
        numbers = Arrays.copyOf(numbers, (int) Math.min(count, 2L * k));
      }
      numbers[k] = number;
    }
    return numbers;
  }

  /** Reads so many numbers and forgets them. */
  static void skip(TokenReader text, int count, String what) throws IOException {
    int read = 0;
    while (read < count) {
      read += read(text, Math.min(count - read, AT_FIRST), what).length;
    }
  }

  /** Reads so many numbers as a list. */
  static List<Double> readList(TokenReader text, int count, String what) throws IOException {
    return Arrays.stream(read(text, count, what)).boxed().toList();
  }

  /** Reads a table, row by row. */
  static NumberTable readTable(TokenReader text, int rows, int columns, String what)
      throws IOException {
    requireRoom(text, (long) rows * columns, what);
    return NumberTable.of(rows, columns, read(text, rows * columns, what));
  }

  /** Insists that so many numbers can be held at all. */
  static void requireRoom(TokenReader text, long numbers, String what) {
    if (numbers > LARGEST) {
      throw text.fault(
          what
              + " would hold "
              + numbers
              + " numbers, more than the "
              + LARGEST
              + " that are read");
    }
  }
}
