package dev.couplet.bench.instances;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;

/** Answers of published value: those that stand beside the instances, else those kept here. */
final class Answers {
  private Answers() {}

  /** The numbers of one answer; what they mean differs by family. */
  static List<Integer> of(String family, String instance) {
    try (BufferedReader table =
        new BufferedReader(
            new InputStreamReader(
                Answers.class.getResourceAsStream("answers.tsv"), StandardCharsets.UTF_8))) {
      return table
          .lines()
          .map(line -> line.split("\t", -1))
          .filter(cells -> cells[0].equals(family) && cells[1].equals(instance))
          .map(cells -> numbers(cells[2]))
          .findFirst()
          .orElseThrow();
    } catch (IOException unreadable) {
      throw new UncheckedIOException(unreadable);
    }
  }

  /** The permutation of a QAPLIB solution file: size, value, then the permutation. */
  static List<Integer> solutionFile(Path file) {
    try {
      List<Integer> all = numbers(Files.readString(file));
      return all.subList(2, 2 + all.get(0));
    } catch (IOException unreadable) {
      throw new UncheckedIOException(unreadable);
    }
  }

  private static List<Integer> numbers(String text) {
    return Arrays.stream(text.strip().split("\\s+", -1)).map(Integer::valueOf).toList();
  }
}
