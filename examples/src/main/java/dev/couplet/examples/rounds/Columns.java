package dev.couplet.examples.rounds;

import java.util.ArrayList;
import java.util.List;

/**
 * Lines of a table without rules: columns as wide as they need to be, two spaces between them, the
 * last one wrapped at the page's edge.
 */
final class Columns {
  private static final String BETWEEN = "  ";

  private final String sides;
  private final List<List<String>> rows = new ArrayList<>();

  /**
   * An empty table.
   *
   * @param sides a letter for each column: r sets it flush right, l flush left
   */
  Columns(String sides) {
    this.sides = sides;
  }

  /** Adds a row; one text for each column. */
  Columns row(String... texts) {
    if (texts.length != sides.length()) {
      throw new IllegalArgumentException(
          "a row of " + texts.length + " texts for " + sides.length() + " columns");
    }
    rows.add(List.of(texts));
    return this;
  }

  /** The lines, none longer than the width as long as the last column has room for a word. */
  List<String> lines(int width) {
    List<String> lines = new ArrayList<>();
    for (List<String> row : rows) {
      StringBuilder start = new StringBuilder();
      for (int c = 0; c < row.size() - 1; c++) {
        start.append(padded(row.get(c), c)).append(BETWEEN);
      }
      int last = row.size() - 1;
      String text = sides.charAt(last) == 'r' ? padded(row.get(last), last) : row.get(last);
      for (String piece : Wrap.lines(text, width - start.length())) {
        lines.add((start + piece).stripTrailing());
        start.replace(0, start.length(), " ".repeat(start.length()));
      }
    }
    return lines;
  }

  private String padded(String text, int column) {
    int width = rows.stream().mapToInt(row -> row.get(column).length()).max().orElse(0);
    String space = " ".repeat(width - text.length());
    return sides.charAt(column) == 'r' ? space + text : text + space;
  }
}
