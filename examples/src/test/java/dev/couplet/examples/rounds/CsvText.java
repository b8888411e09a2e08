package dev.couplet.examples.rounds;

import java.util.List;
import java.util.function.UnaryOperator;

/** CSV files as their text says, without the example's own reader. */
record CsvText(UnaryOperator<String> text) {
  /** The fields of each line below the one that names the columns. */
  List<String[]> rows(String file) {
    return text.apply(file)
        .lines()
        .filter(line -> !line.startsWith("#"))
        .skip(1)
        .map(line -> line.split(","))
        .toList();
  }

  String[] village(String name) {
    return rows("villages.csv").stream()
        .filter(row -> row[0].equals(name))
        .findFirst()
        .orElseThrow();
  }

  /** The mean of a column of the villages. */
  double mean(int column) {
    return rows("villages.csv").stream()
        .mapToLong(row -> Long.parseLong(row[column]))
        .average()
        .orElseThrow();
  }

  SlowTwin slowTwin() {
    return new SlowTwin(
        text.apply("villages.csv"),
        text.apply("vans.csv"),
        text.apply("wishes.csv"),
        text.apply("together.csv"),
        text.apply("apart.csv"));
  }
}
