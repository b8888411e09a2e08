package dev.couplet.bench.instances;

import dev.couplet.form.FormatException;
import java.io.IOException;
import java.util.List;
import java.util.stream.Stream;

/** One kind of text that holds instances. A new kind is one new class and a line in the reader. */
interface Format {
  /** The name of the kind, for the option {@code --as}. */
  String kind();

  /**
   * Whether a text that begins like this is of the kind.
   *
   * @param head the first lines that are not blank, three at the most
   */
  boolean recognises(List<String> head);

  /**
   * Reads the whole text.
   *
   * @throws FormatException with file, line and column of the first fault
   */
  Instance read(Source source) throws IOException;

  /** Whether the first lines are numbers, so many on each; the last line may be missing. */
  static boolean numbersPerLine(List<String> head, int... counts) {
    int lines = Math.min(head.size(), counts.length);
    for (int k = 0; k < lines; k++) {
      String[] words = head.get(k).strip().split("\\s+", -1);
      if (words.length != counts[k] || !Stream.of(words).allMatch(Format::isNumber)) {
        return false;
      }
    }
    return lines >= counts.length - 1;
  }

  private static boolean isNumber(String word) {
    return word.matches("[-+]?(\\d+\\.?\\d*|\\.\\d+)([eE][-+]?\\d+)?");
  }
}
