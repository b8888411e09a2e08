package dev.couplet.bench.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import picocli.CommandLine;
import picocli.CommandLine.Command;

class MainTest {
  @TempDir Path folder;

  @BeforeEach
  void writeFiles() throws IOException {
    Files.writeString(folder.resolve("good.mc"), "3 3\n1 2 1\n2 3 2\n1 3 -4\n");
    Files.writeString(folder.resolve("bad.mc"), "3 2\n1 2 1\n2 4 2\n");
    Files.writeString(folder.resolve("strange.txt"), "what is this\n");
    Files.writeString(folder.resolve("two.txt"), "2\n2 1\n1 2 3\n2 1\n1 2 -7\n");
    Files.write(folder.resolve("broken.gz"), new byte[] {0x1f, (byte) 0x8b, 8, 0, 1});
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '"',
      value = {
        "                             | no verb was given; see couplet-bench --help",
        "dance                        | Unmatched argument at index 0: 'dance'; see couplet-bench --help",
        "solve                        | Missing required parameter: 'FILE'; see couplet-bench solve --help",
        "solve good.mc --speed 3      | Unknown options: '--speed', '3'; see couplet-bench solve --help",
        "solve good.mc --seed x       | Invalid value for option '--seed': 'x' is not a long; see couplet-bench solve --help",
        "solve good.mc --seconds 0    | --seconds is 0.0, it must be above 0 and at most a thousand million",
        "solve good.mc --seconds NaN  | --seconds is NaN, it must be above 0 and at most a thousand million",
        "solve good.mc --threads 0    | the number of threads is 0, it must be 1 or more",
        "solve good.mc --target NaN   | the target is NaN, it must be a number",
        "solve good.mc --as sudoku    | there is no kind of file 'sudoku'; the kinds are matrix, quadratic, cut, colour:K, clique, tsp, qap, gap, knapsack, jobshop, opb",
        "solve good.mc --item 0       | item is 0, items are counted from 1",
        "solve good.mc --item 2       | FOLDER/good.mc: item 2 was asked for, the file holds one problem",
        "solve missing.mc             | FOLDER/missing.mc: there is no such file",
        "solve bad.mc                 | FOLDER/bad.mc:3:3: the second number is '4', it must be a whole number from 1 to 3",
        "solve strange.txt            | FOLDER/strange.txt: the content does not tell what kind of file it is; say --as, one of matrix, quadratic, cut, colour:K, clique, tsp, qap, gap, knapsack, jobshop, opb",
        "solve two.txt                | FOLDER/two.txt:1:1: the file holds 2 problems; pick one with --item",
        "solve seeded:p9.1            | 'p9.1' names no seeded instance; say p3000.1 to p5000.4, or N:DENSITY:SEED",
        "rate --lattice cube:3        | the lattice is 'cube:3'; say torus: and its sides, as in torus:16x16x16",
        "rate --couplings 0           | the largest coupling is 0, it must be 1 to 1000000",
        "rate --draws 0               | the number of draws is 0, it must be 1 or more",
        "fit --host king:2x2          | Missing required option: '--guest=GUEST'; see couplet-bench fit --help",
        "fit --guest complete:2 --host king:2 | 'king:2' is not written like king:RxC",
        "fit --guest complete:2 --host king:2x2 --faults 2 | the share of missing vertices is 2.0, it must be from 0 to 1",
        "fit --guest complete:2 --host king:2x2 --seconds -1 | --seconds is -1.0, it must be above 0 and at most a thousand million",
        "rate --sweeps 0              | the number of sweeps is 0, it must be 1 or more",
      })
  void badUseIsToldInOneLine(String arguments, String line) {
    CommandRun run = CommandRun.of(split(arguments));
    assertEquals(2, run.status());
    assertEquals(List.of(line.replace("FOLDER", folder.toString())), run.err());
    assertEquals(List.of(), run.out());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "solve broken.gz",
        "solve .",
        "solve good.mc --method waiting",
        "rate --method enumeration",
        "solve seeded:40:100:1 --method enumeration"
      })
  void otherBadInputIsToldInOneLine(String arguments) {
    CommandRun run = CommandRun.of(split(arguments));
    assertEquals(2, run.status());
    assertEquals(1, run.err().size(), run.toString());
    assertFalse(run.err().get(0).contains("Exception"), run.toString());
    assertTrue(run.err().get(0).length() > 20, run.toString());
    assertEquals(List.of(), run.out());
  }

  /** Words; those that look like files stand in the test's folder. */
  private String[] split(String arguments) {
    if (arguments == null) {
      return new String[0];
    }
    return List.of(arguments.strip().split("\\s+")).stream()
        .map(word -> word.matches("[a-z]*\\.[a-z]*") ? folder.resolve(word).toString() : word)
        .toArray(String[]::new);
  }

  @Test
  void helpNamesTheVerbs() {
    CommandRun run = CommandRun.of("--help");
    assertEquals(0, run.status());
    String text = String.join("\n", run.out());
    for (String word : List.of("solve", "rate", "fit", "Exit status", "not reached")) {
      assertTrue(text.contains(word), text);
    }
    assertEquals(List.of(), run.err());
  }

  @ParameterizedTest
  @ValueSource(strings = {"solve", "rate", "fit"})
  void helpOfAVerbNamesItsColumnsAndFitsATerminal(String verb) {
    CommandRun run = CommandRun.of(verb, "--help");
    assertEquals(0, run.status());
    String text = String.join("\n", run.out());
    Map<String, List<String>> columns =
        Map.of("solve", Attempt.COLUMNS, "rate", RateCommand.COLUMNS, "fit", FitCommand.COLUMNS);
    for (String column : columns.get(verb)) {
      assertTrue(text.contains(column), column + " in " + text);
    }
    assertTrue(run.out().stream().allMatch(line -> line.length() <= 100), text);
  }

  @Test
  void tooLittleMemoryIsToldInOneLine() {
    @Command
    class Greedy implements Runnable {
      @Override
      public void run() {
        throw new OutOfMemoryError("Java heap space");
      }
    }
    StringWriter err = new StringWriter();
    CommandLine line = new CommandLine(new Greedy()).setErr(new PrintWriter(err, true));
    assertEquals(2, Main.execute(line));
    assertEquals(1, err.toString().lines().count(), err.toString());
  }

  @Test
  void aDefectIsNoBadInput() throws Exception {
    StringWriter err = new StringWriter();
    CommandLine line = Main.commandLine().setErr(new PrintWriter(err, true));
    int status =
        line.getExecutionExceptionHandler()
            .handleExecutionException(new IllegalStateException("impossible"), line, null);
    assertEquals(3, status);
    assertTrue(err.toString().contains("at " + MainTest.class.getName()), err.toString());
  }
}
