package dev.couplet.bench.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.PublishedData;
import dev.couplet.bench.instances.PublishedData.Published;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class SolveCommandTest {
  private static final String CUT = "3 3\n1 2 1\n2 3 2\n1 3 -4\n";

  @TempDir Path folder;

  @Test
  void theHeaderIsTheDesigns() {
    assertEquals(
        "instance n pairs method seed seconds value hit_seconds bound gap proof",
        String.join(" ", Outcome.COLUMNS));
  }

  /** By hand: 2 alone against 1 and 3 cuts 1 + 2; every other cut has the edge of weight -4. */
  @Test
  void aMaximumIsProved() throws IOException {
    CommandRun run = CommandRun.of("solve", write("small.mc", CUT), "--method", "enumeration");
    assertEquals(0, run.status());
    assertEquals(List.of(), run.err());
    Map<String, String> row = run.row();
    assertEquals("small", row.get("instance"));
    assertEquals("3", row.get("n"));
    assertEquals("3", row.get("pairs"));
    assertEquals("enumeration", row.get("method"));
    assertEquals("1", row.get("seed"));
    assertEquals("3", row.get("value"));
    assertEquals("3", row.get("bound"));
    assertEquals("0", row.get("gap"));
    assertEquals("optimal", row.get("proof"));
    assertTrue(run.number("hit_seconds") <= run.number("seconds"));
  }

  /** x = 1 gives -3, both give -3.5 + 1.25 - 0.1 off the diagonal twice: worked out by hand. */
  @Test
  void aMinimumStaysOne() throws IOException {
    String text =
        "%%MatrixMarket matrix coordinate real symmetric\n%couplet constant 10\n"
            + "2 2 3\n1 1 -3\n2 2 -0.5\n2 1 0.1\n";
    CommandRun run =
        CommandRun.of("solve", write("small.mtx", text), "--method", "enumeration", "--seed", "5");
    // 10 - 3 - 0.5 + 2 * 0.1
    assertEquals("6.7", run.row().get("value"));
    assertEquals("5", run.row().get("seed"));
    assertEquals("optimal", run.row().get("proof"));
  }

  /** The bound of a maximum lies above the value, and apart from it by the gap. */
  @Test
  void aBoundIsGivenToMethodsWithoutOne() {
    CommandRun run =
        CommandRun.of("solve", "seeded:60:100:3", "--seconds", "0.2", "--method", "annealing");
    assertEquals(0, run.status());
    assertTrue(run.number("bound") >= run.number("value"), run.toString());
    assertEquals(run.number("bound") - run.number("value"), run.number("gap"));
    assertEquals(run.number("gap") == 0 ? "optimal" : "none", run.row().get("proof"));
    assertTrue(run.number("seconds") >= 0.2, run.toString());
  }

  @Test
  void aTargetThatIsReachedEndsTheRun() throws IOException {
    CommandRun run =
        CommandRun.of(
            "solve",
            write("small.mc", CUT),
            "--target",
            "3",
            "--seconds",
            "60",
            "--method",
            "annealing");
    assertEquals(0, run.status());
    assertEquals("3", run.row().get("value"));
    assertTrue(run.number("hit_seconds") < 30, run.toString());
  }

  @Test
  void aTargetThatIsNotReachedIsToldByTheStatus() throws IOException {
    CommandRun run =
        CommandRun.of(
            "solve", write("small.mc", CUT), "--target", "3.5", "--method", "enumeration");
    assertEquals(1, run.status());
    assertEquals("3", run.row().get("value"));
    assertEquals("-", run.row().get("hit_seconds"));
  }

  /** A target below what can be, of either sign, is an option's value and no option. */
  @Test
  void aNegativeTargetIsRead() throws IOException {
    CommandRun run =
        CommandRun.of("solve", write("small.mc", CUT), "--target", "-7", "--method", "annealing");
    assertEquals(0, run.status());
  }

  @Test
  void oneProblemOfSeveralIsPicked() throws IOException {
    String file = write("two.txt", "2\n2 1\n1 2 3\n2 1\n1 2 -7\n");
    CommandRun run = CommandRun.of("solve", file, "--item", "1", "--method", "enumeration");
    assertEquals("two#1", run.row().get("instance"));
    assertEquals("6", run.row().get("value"));
  }

  /** Published optima of the OR-Library (Beasley 1998), with the method that is the default. */
  @Test
  void everyPublishedOptimumOfFiftyVariablesIsReached() {
    List<Published> rows =
        PublishedData.of("bqp").stream().filter(row -> row.size() == 50).toList();
    assertEquals(5, rows.size());
    for (Published row : rows) {
      CommandRun run =
          CommandRun.of("solve", row.path().toString(), "--target", Double.toString(row.best()));
      assertEquals(0, run.status(), run.toString());
      assertEquals(row.best(), run.number("value"), row.name());
      assertTrue(run.number("bound") >= row.best(), row.name());
    }
  }

  private String write(String name, String text) throws IOException {
    return Files.writeString(folder.resolve(name), text).toString();
  }
}
