package dev.couplet.examples.rounds;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.embed.Embedding;
import dev.couplet.embed.Fit;
import dev.couplet.lower.Lowered;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Watch;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.stream.Collectors;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.w3c.dom.Document;

class HostTest {
  private static final RoundsData COPY = SmallCopy.of(RoundsReader.read(Folder.invented()));
  private static final RoundsModel ROUNDS = RoundsModel.of(COPY);
  private static final Lowered LOWERED = RoundsWeights.lowering(ROUNDS).lower(ROUNDS.model());

  @TempDir Path directory;

  @Test
  void drawsOnTheHostReachTheOptimumOfTheCopy() {
    OptionalLong optimum = slowTwin().optimum();
    for (int seed = 1; seed <= 3; seed++) {
      Outcome outcome = Outcome.of("--seed", Integer.toString(seed));
      long onHost = Long.parseLong(outcome.found("(?s)\\n8\\..*\\n  best +(\\d+) m"));
      long direct = Long.parseLong(outcome.found("^  direct +(\\d+) m .*proved"));
      long audited = Long.parseLong(outcome.found("^  optimum +(\\d+) m"));
      assertEquals(optimum, OptionalLong.of(direct));
      assertEquals(optimum, OptionalLong.of(audited));
      assertEquals(direct, onHost);
      assertTrue(outcome.out().replaceAll("\\n +", " ").contains("the host's draws reach it"));
    }
  }

  private static SlowTwin slowTwin() {
    return new SlowTwin(
        "-\n"
            + COPY.villages().stream()
                .map(v -> v + "," + v.crates() + "," + v.east() + "," + v.north())
                .collect(Collectors.joining("\n")),
        "-\n"
            + COPY.vans().stream()
                .map(van -> van.name() + "," + van.capacity())
                .collect(Collectors.joining("\n")),
        "-\n"
            + COPY.wishes().stream()
                .map(wish -> wish.village() + "," + wish.van().name() + "," + wish.metres())
                .collect(Collectors.joining("\n")),
        "-\n" + pairs(COPY.together()),
        "-\n" + pairs(COPY.apart()));
  }

  private static String pairs(List<Pair> pairs) {
    return pairs.stream()
        .map(pair -> pair.one() + "," + pair.other())
        .collect(Collectors.joining("\n"));
  }

  @Test
  void theFiguresAreThoseOfTheEmbedding() {
    HostRun run = HostRun.of(LOWERED, Effort.draws(20).seed(4), Watch.none());
    Embedding found = run.fit().orThrow();
    String page = HostPage.of(run);
    assertEquals(784, run.host().presentCount());
    assertTrue(page.matches("(?s).*vertices +784  16 are missing.*"), page);
    assertTrue(page.matches("(?s).*embedding +" + found.total() + "  .*"), page);
    assertTrue(page.matches("(?s).*longest +" + found.longest() + "  .*"), page);
    assertEquals(LOWERED.qubo().size(), found.sets().size());
    int owned = 0;
    for (int v = 0; v < run.host().vertices(); v++) {
      owned += found.owner(v).isPresent() ? 1 : 0;
    }
    assertEquals(owned, found.total());
  }

  @Test
  void withoutAnEmbeddingThePageSaysSoAndMakesNoComparison() {
    HostRun run = HostRun.of(LOWERED, Effort.draws(1), Watch.none());
    Fit none = new Fit.NotFound(End.DEADLINE, OptionalInt.empty());
    HostRun failed =
        new HostRun(run.copy(), run.host(), run.guest(), none, Optional.empty(), run.direct());
    String page = HostPage.of(failed);
    assertTrue(page.contains("none was found"), page);
    assertFalse(page.contains("reach it"), page);
    HostRun impossible =
        new HostRun(
            run.copy(),
            run.host(),
            run.guest(),
            new Fit.Impossible("the guest is too large"),
            Optional.empty(),
            run.direct());
    assertTrue(HostPage.of(impossible).contains("the guest is too large"));
  }

  @Test
  void theHostIsDrawnBesideTheMap() throws Exception {
    Path map = directory.resolve("rounds.map.svg");
    Outcome outcome = Outcome.of("--svg", map.toString());
    assertEquals(0, outcome.status());
    Path host = directory.resolve("rounds.map-host.svg");
    Document svg = DocumentBuilderFactory.newInstance().newDocumentBuilder().parse(host.toFile());
    assertEquals("svg", svg.getDocumentElement().getTagName());
    assertTrue(svg.getDocumentElement().getTextContent().contains("on a sparse host"));
  }
}
