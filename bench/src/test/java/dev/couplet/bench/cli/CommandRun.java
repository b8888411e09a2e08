package dev.couplet.bench.cli;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import picocli.CommandLine;

/**
 * What one call of the command line gave.
 *
 * @param status the exit status
 * @param out the lines on standard output
 * @param err the lines on standard error
 */
record CommandRun(int status, List<String> out, List<String> err) {
  static CommandRun of(String... arguments) {
    StringWriter out = new StringWriter();
    StringWriter err = new StringWriter();
    CommandLine line = Main.commandLine();
    line.setOut(new PrintWriter(out, true));
    line.setErr(new PrintWriter(err, true));
    int status = Main.execute(line, arguments);
    return new CommandRun(status, out.toString().lines().toList(), err.toString().lines().toList());
  }

  /** The only row of the table, by the names of its columns. */
  Map<String, String> row() {
    if (out.size() != 2) {
      throw new AssertionError("a header and a row were expected: " + this);
    }
    List<String> header = cells(out.get(0));
    List<String> cells = cells(out.get(1));
    Map<String, String> row = new TreeMap<>();
    for (int k = 0; k < header.size(); k++) {
      row.put(header.get(k), cells.get(k));
    }
    return row;
  }

  double number(String column) {
    return Double.parseDouble(row().get(column));
  }

  private static List<String> cells(String line) {
    return Arrays.asList(line.split("\t", -1));
  }
}
