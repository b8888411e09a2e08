package dev.couplet.bench.instances;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.FormatException;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.model.Statement.Sense;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.zip.GZIPOutputStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class InstanceReaderTest {
  private static final String QUADRATIC = "1\n 3 3\n1 1 5\n1 3 -2\n 2 3 4\n";
  private static final String CUT = "3 3\n1 2 1\n2 3 2\n1 3 -4\n";
  private static final String MATRIX =
      "%%MatrixMarket matrix coordinate real symmetric\n2 2 2\n1 1 -3\n2 1 1\n";

  @TempDir Path folder;

  @Test
  void quadraticProgrammesCountPairsTwiceAndAreMaximised() throws IOException {
    Instance.OfForm instance = read("small.txt", QUADRATIC);
    Qubo expected = Qubo.builder(3).addLinear(0, -5).addPair(0, 2, 4).addPair(1, 2, -8).build();
    assertEquals(new Instance.OfForm("small", expected, Sense.MAXIMIZE), instance);
    // By hand: 5 + 2 (-2) + 2 (4) with all variables at 1.
    assertEquals(9, instance.value(instance.form().value(State.parse("111"))));
    assertEquals(-9, instance.energy(9));
  }

  @Test
  void edgeListsAreMaximumCuts() throws IOException {
    Instance.OfForm instance = read("small.mc", CUT);
    assertEquals("small", instance.name());
    for (int bits = 0; bits < 8; bits++) {
      State state = State.ofWords(3, bits);
      assertEquals(cut(state), instance.value(instance.form().value(state)), state.toString());
    }
  }

  /** Edge by edge, from the text above. */
  private static double cut(State x) {
    double weight = 0;
    weight += x.get(0) != x.get(1) ? 1 : 0;
    weight += x.get(1) != x.get(2) ? 2 : 0;
    weight += x.get(0) != x.get(2) ? -4 : 0;
    return weight;
  }

  @Test
  void matricesAreMinimised() throws IOException {
    Instance.OfForm instance = read("small.mtx", MATRIX);
    Qubo expected = Qubo.builder(2).addLinear(0, -3).addPair(0, 1, 2).build();
    assertEquals(new Instance.OfForm("small", expected, Sense.MINIMIZE), instance);
    assertEquals(-3, instance.value(-3));
  }

  @Test
  void aValueOfZeroHasNoSign() throws IOException {
    assertEquals(0.0, read("small.txt", QUADRATIC).value(0.0));
  }

  @Test
  void gzipIsReadThrough() throws IOException {
    Path file = folder.resolve("packed.7.mc.gz");
    try (OutputStream out = new GZIPOutputStream(Files.newOutputStream(file))) {
      out.write(CUT.getBytes(StandardCharsets.UTF_8));
    }
    Instance.OfForm instance = InstanceReader.standard().readForm(file);
    assertEquals("packed.7", instance.name());
    assertEquals(read("plain.mc", CUT).form(), instance.form());
  }

  @Test
  void brokenGzipIsAnInputFault() throws IOException {
    Path file = folder.resolve("cut-short.gz");
    Files.write(file, new byte[] {0x1f, (byte) 0x8b, 8, 0});
    assertThrows(IOException.class, () -> InstanceReader.standard().read(file));
  }

  @Test
  void severalProblemsNeedAnItem() throws IOException {
    Path file = write("two.txt", "2\n2 1\n1 2 3\n2 1\n1 2 -7\n");
    FormatException open =
        assertThrows(FormatException.class, () -> InstanceReader.standard().read(file));
    assertTrue(open.getMessage().endsWith(":1:1: the file holds 2 problems; pick one with --item"));
    Instance.OfForm second = InstanceReader.standard().item(2).readForm(file);
    assertEquals("two#2", second.name());
    assertEquals(14, second.form().pair(0, 1));
    assertThrows(FormatException.class, () -> InstanceReader.standard().item(3).read(file));
  }

  @Test
  void aFileOfOneProblemHasNoSecondItem() throws IOException {
    Path file = write("one.mc", CUT);
    assertEquals(3, InstanceReader.standard().item(1).readForm(file).form().size());
    assertThrows(
        IllegalArgumentException.class, () -> InstanceReader.standard().item(2).read(file));
  }

  @Test
  void theKindCanBeSaid() throws IOException {
    Path file = write("strange.txt", "2 1 1\n\n2 1 5");
    assertThrows(IllegalArgumentException.class, () -> InstanceReader.standard().read(file));
    // Sizes of a cut are a line of two numbers: told so, the reader says what is wrong.
    FormatException fault =
        assertThrows(FormatException.class, () -> InstanceReader.standard().as("cut").read(file));
    assertEquals(1, fault.line());
    assertEquals(5, fault.column());
  }

  @Test
  void anUnknownKindNamesTheKnown() {
    IllegalArgumentException fault =
        assertThrows(IllegalArgumentException.class, () -> InstanceReader.standard().as("sudoku"));
    assertEquals(
        "there is no kind of file 'sudoku'; the kinds are matrix, quadratic, cut, colour:K, clique,"
            + " tsp, qap, gap, knapsack, jobshop, opb",
        fault.getMessage());
  }

  @Test
  void emptyInstancesAreRead() throws IOException {
    assertEquals(4, read("none.mc", "4 0\n").form().size());
    assertEquals(0, read("none.txt", "1\n0 0\n").form().size());
  }

  @ParameterizedTest
  @CsvSource({
    // The text with / for line ends, the kind, where the fault is.
    "1/3 2/1 1 5/1 4 1, quadratic, 4, 3",
    "1/3 1/2 1 5, quadratic, 3, 3",
    "1/3 2/1 2 5/1 2 6, quadratic, 4, 3",
    "1/3 1/1 2 x, quadratic, 3, 5",
    "1/3 1/1 2 NaN, quadratic, 3, 5",
    "1/3 1/1 2 5/1 3 5, quadratic, 4, 1",
    "1/3 2/1 2 5, quadratic, 4, 1",
    "1/3, quadratic, 2, 2",
    "0/, quadratic, 1, 1",
    "3 2/1 2 1/2 2 1, cut, 3, 3",
    "3 2/1 2 1/2 1 1, cut, 3, 3",
    "3 2/1 2 1/2 0 1, cut, 3, 3",
    "3 2/1 2 1/2 3, cut, 3, 4",
    "3 1/1 2 1 9, cut, 2, 7",
    "3 1/1 2 1e400, cut, 2, 5",
    "3 -1/, cut, 1, 3",
    "2 1/1 2 9007199254740992, cut, 2, 5",
  })
  void faultsAreLocated(String text, String kind, int line, int column) throws IOException {
    Path file = write("bad.txt", text.replace('/', '\n'));
    FormatException fault =
        assertThrows(FormatException.class, () -> InstanceReader.standard().as(kind).read(file));
    assertEquals(file.toString(), fault.source());
    assertEquals(line + ":" + column, fault.line() + ":" + fault.column(), fault.getMessage());
  }

  private Path write(String name, String text) throws IOException {
    return Files.writeString(folder.resolve(name), text);
  }

  private Instance.OfForm read(String name, String text) throws IOException {
    return InstanceReader.standard().readForm(write(name, text));
  }
}
