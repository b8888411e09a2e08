package dev.couplet.bench.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.MatrixMarket;
import dev.couplet.form.Qubo;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class LowerCommandTest {
  /** By hand: x1 = x3 by the second constraint, and x2 alone is cheapest: 2. */
  private static final String COVER =
      """
      * #variable= 3 #constraint= 2
      min: +3 x1 +2 x2 +1 x3 -2 x2 x3 ;
      +1 x1 +1 x2 >= 1 ;
      +1 x1 +1 ~x3 = 1 ;
      """;

  @TempDir Path folder;

  private String write(String name, String text) throws IOException {
    return Files.writeString(folder.resolve(name), text).toString();
  }

  @Test
  void theHeaderIsTheDesigns() {
    assertEquals(
        "instance bits aux pairs max_abs min_abs seconds", String.join(" ", LowerCommand.COLUMNS));
  }

  /**
   * By hand: the objective lies between -2 and 6, so that rules weigh 6 + 2 + 1 = 9; {@code x1 + x2
   * >= 1} is 1 - x1 - x2 + x1 x2 and {@code x1 = x3} is x1 + x3 - 2 x1 x3.
   */
  @Test
  void aTextBecomesAForm() throws IOException {
    Path out = folder.resolve("cover.mtx");
    CommandRun run = CommandRun.of("lower", write("cover.opb", COVER), "--out", out.toString());
    assertEquals(0, run.status(), run.toString());
    Map<String, String> row = run.row();
    assertEquals("cover", row.get("instance"));
    assertEquals("3", row.get("bits"));
    assertEquals("0", row.get("aux"));
    assertEquals("3", row.get("pairs"));
    assertEquals("18", row.get("max_abs"));
    assertEquals("2", row.get("min_abs"));
    Qubo expected =
        Qubo.builder(3)
            .addConstant(9)
            .addLinear(0, 3)
            .addLinear(1, 2 - 9)
            .addLinear(2, 1 + 9)
            .addPair(0, 1, 9)
            .addPair(0, 2, -18)
            .addPair(1, 2, -2)
            .build();
    assertEquals(expected, MatrixMarket.read(out));
    CommandRun solved = CommandRun.of("solve", out.toString(), "--method", "enumeration");
    assertEquals("2", solved.row().get("value"));
  }

  @Test
  void auxiliaryBitsAreCounted() throws IOException {
    String text = "+1 x1 +1 x2 +1 x3 +1 x4 >= 2 ;\n";
    Map<String, String> row = CommandRun.of("lower", write("some.opb", text)).row();
    // The slack runs from 0 to 2: two bits.
    assertEquals("6", row.get("bits"));
    assertEquals("2", row.get("aux"));
    assertEquals("15", row.get("pairs"));
  }

  @Test
  void aFormIsPassedOn() throws IOException {
    Map<String, String> row = CommandRun.of("lower", write("two.mc", "2 1\n1 2 4\n")).row();
    assertEquals("2", row.get("bits"));
    assertEquals("0", row.get("aux"));
    assertEquals("8", row.get("max_abs"));
    assertEquals("4", row.get("min_abs"));
  }

  @Test
  void whatIsNotThereIsADash() throws IOException {
    Map<String, String> row = CommandRun.of("lower", write("none.opb", "min: ;\n")).row();
    assertEquals("0", row.get("bits"));
    assertEquals("-", row.get("max_abs"));
    assertEquals("-", row.get("min_abs"));
  }

  @Test
  void faultsInTheTextArePointedAt() throws IOException {
    CommandRun run = CommandRun.of("lower", write("bad.opb", "1 x1 >= 1\n1 x2 >= 1 ;\n"));
    assertEquals(2, run.status());
    assertTrue(run.err().get(0).contains("bad.opb:2:1: expected ';'"), run.toString());
  }

  /** The value is the file's own, whatever the energies of the form are. */
  @Test
  void solveReadsTheTextToo() throws IOException {
    String file = write("cover.opb", COVER);
    for (String method : new String[] {"solver", "enumeration", "annealing"}) {
      CommandRun run = CommandRun.of("solve", file, "--method", method, "--seconds", "0.2");
      assertEquals("2", run.row().get("value"), run.toString());
      assertEquals("cover", run.row().get("instance"));
      assertEquals("3", run.row().get("n"));
    }
    CommandRun proved = CommandRun.of("solve", file, "--as", "opb");
    assertEquals("optimal", proved.row().get("proof"));
    String maximum =
        "* #variable= 2 #constraint= 1\n*couplet decimals 1\n*couplet maximize\n"
            + "min: -15 x1 -25 x2 ;\n-1 x1 -1 x2 >= -1 ;\n";
    CommandRun maximised = CommandRun.of("solve", write("max.opb", maximum), "--target", "2.5");
    assertEquals(0, maximised.status());
    assertEquals("2.5", maximised.row().get("value"));
  }
}
