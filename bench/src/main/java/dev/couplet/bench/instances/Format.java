package dev.couplet.bench.instances;

import dev.couplet.form.FormatException;
import java.io.IOException;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** One kind of text that holds instances. A new kind is one new class and a line in the reader. */
interface Format {
  /** The name of the kind, for the option {@code --as}. */
  String kind();

  /** This kind, if it is meant by a name; with the number in it, if the kind has one. */
  default Optional<Format> named(String kind) {
    return kind.equals(kind()) ? Optional.of(this) : Optional.empty();
  }

  /**
   * Whether a text that begins like this is of the kind.
   *
   * @param head the first lines that are not blank
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

  /**
   * Whether a line begins a row of so many numbers: it holds all of them, or more than three and
   * the rest stands on further lines. Rows of three are left to the kinds that list triples.
   */
  static boolean numberRow(String line, int count) {
    String[] words = line.strip().split("\\s+", -1);
    return words.length > 3 && words.length <= count && Stream.of(words).allMatch(Format::isNumber);
  }

  /** The first word of a line as a whole number from 1 to a highest; 0 if it is none. */
  static int firstNumber(String line, int highest) {
    String word = line.strip().split("\\s+", 2)[0];
    int number = word.matches("\\d{1,9}") ? Integer.parseInt(word) : 0;
    return number <= highest ? number : 0;
  }

  /** The last word of a line as a whole number from 1 to a highest; 0 if it is none. */
  static int lastNumber(String line, int highest) {
    return firstNumber(line.strip().replaceFirst(".*\\s", ""), highest);
  }

  private static boolean isNumber(String word) {
    return word.matches("[-+]?(\\d+\\.?\\d*|\\.\\d+)([eE][-+]?\\d+)?");
  }
}
