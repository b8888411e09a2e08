package dev.couplet.bench.models;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.Instance;
import dev.couplet.bench.instances.InstanceReader;
import dev.couplet.bench.instances.PublishedData;
import dev.couplet.bench.models.Reference.Answer;
import dev.couplet.bench.models.Reference.Verdict;
import dev.couplet.model.Statement;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Watch;
import dev.couplet.solve.Proof;
import dev.couplet.solve.Solver;
import java.io.IOException;
import java.nio.file.Path;
import java.time.Duration;
import java.util.OptionalDouble;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Small published instances, stated by our models: a general-purpose solver that knows nothing of
 * quadratic forms comes to the published optimum, and so does ours, with a proof.
 *
 * <p>Values: the data folder's table. Chromatic and clique numbers by construction: Mycielski
 * graphs, queens of five, Hamming and Johnson graphs.
 */
class ReferenceTest {
  private static final int SECONDS = 60;

  private static Statement read(String file, String kind, int item) throws IOException {
    Path path = PublishedData.folder().resolve(file);
    return ((Instance.OfModel) InstanceReader.standard().as(kind).item(item).read(path))
        .statement();
  }

  private static void assertProved(double optimum, Statement statement) {
    Effort effort = Effort.within(Duration.ofSeconds(SECONDS)).seed(1);
    var ours = Solver.standard().solve(statement, effort, Watch.none());
    assertTrue(ours.plan().feasible(), ours.toString());
    assertEquals(optimum, ours.value(), 1e-9);
    assertEquals(Proof.OPTIMAL, ours.proof(), ours.toString());
  }

  @ParameterizedTest
  @CsvSource({
    "mknap/mknap1.txt, knapsack, 1, 3800",
    "mknap/mknap1.txt, knapsack, 2, 8706.1",
    "mknap/mknap1.txt, knapsack, 3, 4015",
    "mknap/mknap1.txt, knapsack, 4, 6120",
    "mknap/mknap1.txt, knapsack, 5, 12400",
    "colour/myciel3.col, colour:4, 1, 0",
    "colour/myciel4.col, colour:5, 1, 0",
    "colour/queen5_5.col, colour:5, 1, 0",
    "colour/huck.col.gz, colour:11, 1, 0",
    "colour/jean.col.gz, colour:10, 1, 0",
    "clique/johnson8-2-4.clq, clique, 1, 4",
    "clique/hamming6-4.clq.gz, clique, 1, 4",
    "clique/MANN_a9.clq.gz, clique, 1, 16",
  })
  void optimaAreThePublished(String file, String kind, int item, double optimum)
      throws IOException {
    Statement statement = read(file, kind, item);
    Answer reference = Reference.solve(statement, SECONDS);
    assertEquals(Verdict.OPTIMAL, reference.verdict());
    assertEquals(optimum, reference.value().orElseThrow(), 1e-9);
    assertProved(optimum, statement);
  }

  /** What the reference takes longer to prove than a test may; the optima are published. */
  @ParameterizedTest
  @CsvSource({
    "gap/gap1.txt, gap, 1, 336",
    "gap/gap1.txt, gap, 2, 327",
    "gap/gap1.txt, gap, 3, 339",
    "gap/gap1.txt, gap, 4, 341",
    "gap/gap1.txt, gap, 5, 326",
    "clique/hamming6-2.clq.gz, clique, 1, 32",
    "mknap/mknap1.txt, knapsack, 6, 10618",
    "mknap/mknap1.txt, knapsack, 7, 16537",
  })
  void ourSolverProvesMore(String file, String kind, int item, double optimum) throws IOException {
    assertProved(optimum, read(file, kind, item));
  }

  /** One colour fewer than the chromatic number. */
  @ParameterizedTest
  @CsvSource({
    "colour/myciel3.col, colour:3",
    "colour/myciel4.col, colour:4",
    "colour/queen5_5.col, colour:4",
  })
  void oneColourFewerIsProvedImpossible(String file, String kind) throws IOException {
    Statement statement = read(file, kind, 1);
    assertEquals(
        new Answer(Verdict.INFEASIBLE, OptionalDouble.empty()),
        Reference.solve(statement, SECONDS));
    Effort effort = Effort.within(Duration.ofSeconds(SECONDS)).seed(1);
    assertEquals(
        Proof.INFEASIBLE, Solver.standard().solve(statement, effort, Watch.none()).proof());
  }
}
