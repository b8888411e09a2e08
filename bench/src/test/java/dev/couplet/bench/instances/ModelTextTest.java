package dev.couplet.bench.instances;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.models.NumberTable;
import dev.couplet.form.FormatException;
import dev.couplet.form.TokenReader;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Watch;
import dev.couplet.solve.Answer;
import dev.couplet.solve.Proof;
import dev.couplet.solve.Solver;
import java.io.IOException;
import java.io.OutputStream;
import java.io.StringReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.zip.GZIPOutputStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Texts of problems with rules, small enough to be solved by hand. */
class ModelTextTest {
  private static final String CYCLE_OF_FIVE =
      "c five in a ring, one edge from both ends\np edge 5 6\ne 1 2\ne 2 1\ne 2 3\ne 3 4\ne 4 5\n\n"
          + "c the last\ne 5 1\n";
  private static final String TSP =
      "NAME: four\nTYPE: TSP\nCOMMENT: a rectangle: 3 by 4\nDIMENSION: 4\nEDGE_WEIGHT_TYPE: EUC_2D\n"
          + "NODE_COORD_SECTION\n1 0 0\n 2 3.0 4.0\n4 0 4\n3 3 0\nEOF\n\n";
  private static final String QAP = "3\n0 5 2\n5 0 3\n2 3 0\n\n0 8 15\n8 0 13\n15 13 0\n";
  private static final String GAP =
      "2\n1 4\n1 1 1 1\n1 1 1 1\n4\n\n2 4\n6 5 4 3\n3 4 5 6\n2 2 2 2\n2 2 2 2\n4 4\n";
  private static final String KNAPSACK = "1\n4 2 0\n10.5 6 4 7\n5 4 3 4\n1 1 1 1\n8 2\n";
  private static final String JOBS = "# two jobs\n2 2\n0 3 1 2\n# the other\n1 2 0 1\n";

  @TempDir Path folder;

  private Path write(String name, String text) throws IOException {
    return Files.writeString(folder.resolve(name), text);
  }

  private Answer solved(InstanceReader reader, String text) throws IOException {
    Statement statement = ((Instance.OfModel) reader.read(write("small.txt", text))).statement();
    return Solver.standard().solve(statement, Effort.draws(16).seed(1), Watch.none());
  }

  private static void assertOptimal(double value, Answer answer) {
    assertEquals(Proof.OPTIMAL, answer.proof());
    assertTrue(answer.plan().feasible());
    assertEquals(value, answer.value());
  }

  /** An odd ring takes three colours; its largest clique is an edge. */
  @Test
  void graphsAreReadAsTheCallerSays() throws IOException {
    InstanceReader reader = InstanceReader.standard();
    assertOptimal(0, solved(reader.as("colour:3"), CYCLE_OF_FIVE));
    assertEquals(Proof.INFEASIBLE, solved(reader.as("colour:2"), CYCLE_OF_FIVE).proof());
    assertOptimal(2, solved(reader.as("clique"), CYCLE_OF_FIVE));
    IllegalArgumentException open =
        assertThrows(IllegalArgumentException.class, () -> solved(reader, CYCLE_OF_FIVE));
    assertTrue(open.getMessage().endsWith("say --as, one of colour:K, clique"));
    for (String wrong : new String[] {"colour", "colour:", "colour:0", "colour:-1", "colour:K"}) {
      assertThrows(IllegalArgumentException.class, () -> reader.as(wrong));
    }
  }

  /** Around the rectangle: 3 + 4 + 3 + 4. */
  @Test
  void toursAreToldByTheirKeys() throws IOException {
    assertOptimal(14, solved(InstanceReader.standard(), TSP));
  }

  /** The published cost of the identity, the optimum (worked example 5.4 of Glover et al. 2019). */
  @Test
  void quadraticAssignmentsAreToldByTheirRows() throws IOException {
    assertOptimal(218, solved(InstanceReader.standard(), QAP));
  }

  /** The better two of four to each of two agents: 6 + 5 + 5 + 6. */
  @Test
  void generalisedAssignmentsAreToldByTheirRows() throws IOException {
    assertOptimal(22, solved(InstanceReader.standard().item(2), GAP));
    Path file = write("gap.txt", GAP);
    assertEquals(Optional.of("gap"), InstanceReader.kindOf(file));
    assertThrows(FormatException.class, () -> InstanceReader.standard().read(file));
    assertEquals("gap#2", InstanceReader.standard().item(2).read(file).name());
  }

  /** Items 1 and 3 weigh 8 and are worth 14.5; 2 and 4 weigh 8 and are worth 13. */
  @Test
  void knapsacksAreToldByTheirSizes() throws IOException {
    assertOptimal(14.5, solved(InstanceReader.standard(), KNAPSACK));
  }

  /** The first machine is busy from 0 to 3, then 2 more of that job: 5, all else beside it. */
  @Test
  void jobShopsAreToldByTheirRows() throws IOException {
    assertOptimal(5, solved(InstanceReader.standard(), JOBS));
  }

  @Test
  void gzipIsReadThrough() throws IOException {
    Path file = folder.resolve("packed.tsp.gz");
    try (OutputStream out = new GZIPOutputStream(Files.newOutputStream(file))) {
      out.write(TSP.getBytes(StandardCharsets.UTF_8));
    }
    Instance instance = InstanceReader.standard().read(file);
    assertEquals("packed", instance.name());
    assertEquals(9, ((Instance.OfModel) instance).statement().literals());
  }

  /** Rows of three numbers belong to the quadratic programmes, whose kind is older. */
  @Test
  void triplesAreNoRows() throws IOException {
    assertEquals(
        Optional.of("quadratic"), InstanceReader.kindOf(write("q", "1\n3 3\n1 1 5\n1 3 -2\n")));
    assertEquals(Optional.of("cut"), InstanceReader.kindOf(write("c", "3 3\n1 2 1\n2 3 2\n")));
  }

  @Test
  void explicitDistancesComeInFiveLayouts() throws IOException {
    NumberTable full = matrix("FULL_MATRIX", "0 1 2\n1 0\n 3 2 3 0");
    assertEquals(full, matrix("UPPER_ROW", "1 2 3"));
    assertEquals(full, matrix("LOWER_ROW", "1\n2 3"));
    assertEquals(full, matrix("UPPER_DIAG_ROW", "0 1 2 0 3 0"));
    assertEquals(full, matrix("LOWER_DIAG_ROW", "0 1 0 2 3 0"));
    assertEquals(1, full.at(0, 1));
    assertEquals(2, full.at(0, 2));
    assertEquals(3, full.at(2, 1));
    FormatException uneven =
        assertThrows(FormatException.class, () -> matrix("FULL_MATRIX", "0 1 2 1 0 3 2 4 0"));
    assertTrue(uneven.getMessage().contains("not symmetric"));
  }

  private static NumberTable matrix(String format, String numbers) throws IOException {
    return TspText.read(
        new TokenReader(
            "text",
            new StringReader(
                "TYPE : TSP\nDIMENSION : 3\nEDGE_WEIGHT_TYPE : EXPLICIT\nEDGE_WEIGHT_FORMAT: "
                    + format
                    + "\nDISPLAY_DATA_TYPE: TWOD_DISPLAY\nEDGE_WEIGHT_SECTION\n"
                    + numbers
                    + "\nDISPLAY_DATA_SECTION\n1 0 0\n2 0 0\n3 1 1\nEOF\n")));
  }

  /**
   * Plane distances round to the nearest, halves up; those of ATT are rounded up. Cities at 0, (1,
   * 0.5) and (3, 4): the root of 1.25 is 1.118, of 25 is 5; of 0.125 is 0.354, of 2.5 is 1.58.
   */
  @Test
  void distancesAreRoundedAsPublished() {
    double[] x = {0, 1, 3, 0};
    double[] y = {0, 0.5, 4, 1.5};
    NumberTable plane = TspDistance.EUC_2D.table(x, y);
    assertEquals(1, plane.at(0, 1));
    assertEquals(5, plane.at(0, 2));
    assertEquals(2, plane.at(0, 3), "1.5 to the nearest");
    NumberTable att = TspDistance.ATT.table(x, y);
    assertEquals(1, att.at(1, 0));
    assertEquals(2, att.at(0, 2));
    assertEquals(0, att.at(2, 2));
  }

  /**
   * A quarter of the equator: pi / 2 times the radius is 10,019.1, and one is added before cutting
   * off. 30.30 is thirty and a half degrees.
   */
  @Test
  void distancesOnTheEarth() {
    NumberTable earth = TspDistance.GEO.table(new double[] {0, 0, 0}, new double[] {0, 90, 30.30});
    assertEquals(10_020, earth.at(0, 1));
    assertEquals(Math.floor(6378.388 * StrictMath.PI * 30.5 / 180 + 1), earth.at(0, 2));
  }

  @ParameterizedTest
  @CsvSource({
    // The kind, the text with / for line ends, where the fault is.
    "clique, p edge 3 1/e 1 4, 2, 5",
    "clique, p edge 3 1/e 2 2, 2, 5",
    "clique, p edge 3 1/e 1 2 3, 2, 7",
    "clique, p edge 3 1/a 1 2, 2, 1",
    "clique, p edge 3 2/e 1 2, 3, 1",
    "clique, p edge 3 1/e 1 2/e 1 3, 4, 1",
    "clique, p edge 3, 1, 9",
    "clique, p graph 3 1/e 1 2, 1, 3",
    "clique, c nothing, 2, 1",
    "clique, e 1 2, 1, 1",
    "colour:2, p edge 1000000000 1, 1, 8",
    "qap, 3/0 1 2/1 0, 4, 1",
    "qap, 2/0 1 1 0/0 1 x 0, 3, 5",
    "qap, 2/0 1 1 0/0 1 1 0 9, 3, 9",
    "qap, 2/0 1 1 0/0 1 1 0/9, 4, 1",
    "qap, 0, 1, 1",
    "qap, 16000/0 1, 3, 1",
    "qap, 100000/0 1, 1, 1",
    "gap, 1/0 3, 2, 1",
    "gap, 1/2 2/1 1 1 1/1 1 1 1/4, 6, 1",
    "gap, 1/2 2/1 1 1 1/1 1 1 1/4 4 4, 5, 5",
    "gap, 1/60000 1000000/1, 2, 7",
    "knapsack, 1/2 1 0/1 1/1 1/-, 5, 1",
    "knapsack, 1/2 1/1 1, 2, 4",
    "jobshop, 2 2/0 3 1 2/1 2, 3, 4",
    "jobshop, 1 2/0 3 2 2, 2, 5",
    "jobshop, 1 2/0 3 1 -2, 2, 7",
    "jobshop, 1 1/0 3 1, 2, 5",
    "jobshop, 2 1/0 3, 3, 1",
    "jobshop, 1 1/0 3/0 3, 3, 1",
    "tsp, TYPE: ATSP/DIMENSION: 3/EDGE_WEIGHT_TYPE: EUC_2D/NODE_COORD_SECTION, 4, 1",
    "tsp, TYPE: TSP/DIMENSION: 2/EDGE_WEIGHT_TYPE: EUC_2D/NODE_COORD_SECTION, 4, 1",
    "tsp, TYPE: TSP/DIMENSION: 3/EDGE_WEIGHT_TYPE: XRAY1/NODE_COORD_SECTION, 4, 1",
    "tsp, TYPE: TSP/DIMENSION: 3/EDGE_WEIGHT_TYPE: ATT/EDGE_WEIGHT_SECTION, 4, 1",
    "tsp, TYPE: TSP/COLOUR: red, 2, 1",
    "tsp, TYPE: TSP/TYPE: TSP, 2, 1",
    "tsp, TYPE: TSP/DIMENSION: 3, 3, 1",
    "tsp, TYPE: TSP/DIMENSION: 3/EDGE_WEIGHT_TYPE: ATT/NODE_COORD_SECTION/1 0 0/1 0 1, 6, 1",
    "tsp, TYPE: TSP/DIMENSION: 3/EDGE_WEIGHT_TYPE: ATT/NODE_COORD_SECTION/1 0 0/2 0, 6, 4",
    "tsp, TYPE: TSP/DIMENSION: 3/EDGE_WEIGHT_TYPE: EXPLICIT/EDGE_WEIGHT_SECTION/1, 4, 1",
  })
  void faultsAreLocated(String kind, String text, int line, int column) throws IOException {
    Path file = write("bad.txt", text.replace('/', '\n'));
    FormatException fault =
        assertThrows(FormatException.class, () -> InstanceReader.standard().as(kind).read(file));
    assertEquals(file.toString(), fault.source());
    assertEquals(line + ":" + column, fault.line() + ":" + fault.column(), fault.getMessage());
  }

  @Test
  void aRingOfSixTakesTwoColours() throws IOException {
    String six = "p edge 6 6\ne 1 2\ne 2 3\ne 3 4\ne 4 5\ne 5 6\ne 6 1\n";
    assertOptimal(0, solved(InstanceReader.standard().as("colour:2"), six));
    assertFalse(InstanceReader.kindOf(write("six.col", six)).isPresent());
  }
}
