package dev.couplet.bench.cli;

import java.io.PrintWriter;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;

/** Rows under one header line, cells separated by tabs. An empty cell is written as a dash. */
final class Table {
  /** What stands in a cell without a content. */
  static final String NOTHING = "-";

  private final PrintWriter out;
  private final int columns;

  /** Begins a table: writes its header. */
  Table(PrintWriter out, List<String> header) {
    this.out = out;
    this.columns = header.size();
    write(header);
  }

  /** Writes one row. */
  void row(List<String> cells) {
    if (cells.size() != columns) {
      throw new IllegalStateException(
          "a row of " + cells.size() + " cells under " + columns + " columns: " + cells);
    }
    write(cells);
  }

  private void write(List<String> cells) {
    out.print(String.join("\t", cells.stream().map(cell -> cell.replaceAll("\\s", " ")).toList()));
    out.print('\n');
    out.flush();
  }

  /** A number with so many decimals. */
  static String fixed(double number, int decimals) {
    return String.format(Locale.ROOT, "%." + decimals + "f", number);
  }

  /** A number with so many decimals, if there is one. */
  static String fixed(OptionalDouble number, int decimals) {
    return number.isPresent() ? fixed(number.getAsDouble(), decimals) : NOTHING;
  }

  /** A value in its own units: whole numbers as such, others with fifteen digits. */
  static String value(double number) {
    if (number == Math.rint(number) && Math.abs(number) < 0x1p53) {
      return Long.toString((long) number);
    }
    return new BigDecimal(number).round(new MathContext(15)).stripTrailingZeros().toString();
  }

  /** A value in its own units, if there is one. */
  static String value(OptionalDouble number) {
    return number.isPresent() ? value(number.getAsDouble()) : NOTHING;
  }
}
