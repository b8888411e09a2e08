package dev.couplet.bench.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FitCommandTest {
  @TempDir Path folder;

  private static CommandRun fit(String arguments) {
    return CommandRun.of(("fit " + arguments).split(" "));
  }

  @Test
  void theHeaderIsTheDesigns() {
    assertEquals(
        "guest host method seed fits vertices longest mean_length seconds",
        String.join(" ", FitCommand.COLUMNS));
  }

  /** A triangle on one cell takes four vertices, one set of two among them (common practice). */
  @Test
  void aTriangleTakesFourVerticesOfACell() {
    CommandRun run = fit("--guest complete:3 --host cells:4@1x1 --method path --seed 3");
    assertEquals(0, run.status());
    assertEquals(List.of(), run.err());
    assertEquals("complete:3", run.row().get("guest"));
    assertEquals("cells:4@1x1", run.row().get("host"));
    assertEquals("path", run.row().get("method"));
    assertEquals("3", run.row().get("seed"));
    assertEquals("yes", run.row().get("fits"));
    assertEquals("4", run.row().get("vertices"));
    assertEquals("2", run.row().get("longest"));
    assertEquals("1.333", run.row().get("mean_length"));
    assertTrue(run.number("seconds") < 10, run.toString());
  }

  /**
   * The triangle template takes m + 1 vertices a set on m x m cells (published figures of the
   * template, found by construction too); the best method does not need more.
   */
  @ParameterizedTest
  @CsvSource({"complete:40, cells:4@10x10, 440, 11", "complete:72, cells:4@18x18, 1368, 19"})
  void completeGuestsFitByTemplate(String guest, String host, int vertices, int longest) {
    CommandRun template = fit("--guest " + guest + " --host " + host + " --method template");
    assertEquals(0, template.status(), template.toString());
    assertEquals(vertices, template.number("vertices"));
    assertEquals(longest, template.number("longest"));
    assertEquals(longest, template.number("mean_length"));
    CommandRun best = fit("--guest " + guest + " --host " + host);
    assertTrue(best.number("vertices") <= vertices, best.toString());
  }

  @Test
  void theBestMethodIsTheStandardOne() {
    assertEquals("best", fit("--guest cycle:4 --host square:2x2").row().get("method"));
  }

  @Test
  void aGuestThatCannotFitIsSaidToBeImpossible() {
    CommandRun run = fit("--guest complete:5 --host square:2x2");
    assertEquals(1, run.status());
    assertEquals("impossible", run.row().get("fits"));
    assertEquals("-", run.row().get("vertices"));
    assertEquals("-", run.row().get("longest"));
    assertEquals("-", run.row().get("mean_length"));
    assertEquals(1, run.err().size());
    assertTrue(run.err().get(0).startsWith("no embedding exists: "), run.err().get(0));
  }

  /** Forty vertices do fit there, but not in a hundredth of a second and by paths. */
  @Test
  void whatWasNotFoundIsNotCalledImpossible() {
    CommandRun run = fit("--guest complete:40 --host cells:4@10x10 --method path --seconds 0.01");
    assertEquals(1, run.status());
    assertEquals("no", run.row().get("fits"));
    assertEquals("-", run.row().get("vertices"));
  }

  @Test
  void faultsAreNamedWithTheHost() {
    CommandRun run = fit("--guest cycle:4 --host square:5x5 --faults 0.2 --seed 2");
    assertEquals(0, run.status(), run.toString());
    assertEquals("square:5x5 faults:0.2", run.row().get("host"));
  }

  @Test
  void withEveryVertexMissingNothingFits() {
    CommandRun run = fit("--guest complete:1 --host square:5x5 --faults 1");
    assertEquals(1, run.status());
    assertEquals("impossible", run.row().get("fits"));
  }

  @Test
  void filesAreRead() throws IOException {
    Path guest = Files.writeString(folder.resolve("path.txt"), "3 2\n1 2\n2 3\n");
    Path host = Files.writeString(folder.resolve("ring.txt"), "4 4\n1 2\n2 3\n3 4\n4 1\n");
    CommandRun run = CommandRun.of("fit", "--guest", guest.toString(), "--host", host.toString());
    assertEquals(0, run.status(), run.toString());
    assertEquals("path", run.row().get("guest"));
    assertEquals("ring", run.row().get("host"));
    assertEquals("3", run.row().get("vertices"));
  }
}
