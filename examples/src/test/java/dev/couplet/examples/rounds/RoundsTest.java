package dev.couplet.examples.rounds;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.w3c.dom.Document;

class RoundsTest {
  @TempDir Path directory;

  @Test
  void theInventedDataHasAPlanThatKeepsEveryRequiredRule() {
    Outcome outcome = Outcome.of("--seed", "3");
    assertEquals("", outcome.err());
    assertEquals(0, outcome.status());
    assertEquals("none", outcome.found("^  unmet rules +(.*)$"));
    assertTrue(outcome.out().contains("invented"));
  }

  @Test
  void theReportHasAPageForEachStepAndFitsTheScreen() {
    String out = Outcome.of().out();
    List<String> headings =
        List.of(
            "The model", "lowering", "audit", "Draws", "plan", "How good", "order", "sparse host");
    int from = 0;
    for (int page = 1; page <= headings.size(); page++) {
      int at = out.indexOf("\n" + page + ". ", from);
      assertTrue(at >= from, "page " + page);
      String heading = out.substring(at + 1, out.indexOf('\n', at + 1));
      assertTrue(heading.contains(headings.get(page - 1)), heading);
      from = at + 1;
    }
    out.lines().forEach(line -> assertTrue(line.length() <= 80, line));
    out.lines().forEach(line -> assertEquals(line.stripTrailing(), line));
  }

  @Test
  void theSameSeedPrintsTheSameOnOneThreadAndOnTwo() {
    String first = Outcome.of("--seed", "11", "--threads", "1", "--seconds", "60").out();
    assertEquals(first, Outcome.of("--seed", "11", "--threads", "1", "--seconds", "60").out());
    assertEquals(first, Outcome.of("--seed", "11", "--threads", "2", "--seconds", "60").out());
  }

  @Test
  void aCopyOfTheInventedDataGivesTheSamePlan() {
    Outcome copied = TestFolder.invented(directory).run();
    assertEquals(Outcome.of().value(), copied.value());
    assertTrue(copied.out().contains("Data: " + directory));
    assertFalse(copied.out().contains("invented"));
  }

  @Test
  void theAuditOfTheCopyFindsNothing() {
    Outcome outcome = Outcome.of();
    assertEquals("0", outcome.found("^  findings +(\\d+)"));
    assertTrue(Long.parseLong(outcome.found("^  margin +(\\d+) m")) > 0);
  }

  @Test
  void loadsStayWithinCapacities() {
    Outcome outcome = Outcome.of();
    for (String van : new String[] {"small", "middle", "large"}) {
      String[] load = outcome.found("^  the " + van + " van +(\\d+ of \\d+) ").split(" of ");
      assertTrue(Integer.parseInt(load[0]) <= Integer.parseInt(load[1]), van);
    }
  }

  @Test
  void progressShowsOnATerminalOnlyAndLeavesACleanLine() {
    Outcome watched = Outcome.of(true, "--seed", "5", "--seconds", "60");
    assertTrue(watched.err().contains("%"), watched.err());
    assertTrue(watched.err().endsWith(" \r"), watched.err());
    assertFalse(watched.err().contains("\n"));
    assertEquals(Outcome.of("--seed", "5", "--seconds", "60"), new Outcome(0, watched.out(), ""));
  }

  @Test
  void theMapIsWellFormedAndNamesEveryVillageOnce() throws Exception {
    Path file = directory.resolve("map.svg");
    Outcome outcome = Outcome.of("--svg", file.toString());
    assertEquals(0, outcome.status());
    Document svg = DocumentBuilderFactory.newInstance().newDocumentBuilder().parse(file.toFile());
    assertEquals("svg", svg.getDocumentElement().getTagName());
    assertEquals(1, svg.getElementsByTagName("title").getLength());
    String text = Files.readString(file);
    for (String line : TestFolder.invented("villages.csv").split("\n")) {
      if (line.matches("[A-Z].*")) {
        String name = line.substring(0, line.indexOf(','));
        assertEquals(2, text.split(">" + name + " ").length, name);
      }
    }
  }

  @Test
  void awkwardNamesAreDrawnAndPrintedAsTheyAre() throws Exception {
    TestFolder folder = TestFolder.invented(directory);
    folder.replace("villages.csv", "Birch,", "\"Bir<h, & Söhne\",");
    folder.replace("wishes.csv", "Birch,", "\"Bir<h, & Söhne\",");
    Path file = directory.resolve("map.svg");
    Outcome outcome = folder.run("--svg", file.toString());
    assertEquals("", outcome.err());
    assertTrue(outcome.out().contains("Bir<h, & Söhne"));
    Document svg = DocumentBuilderFactory.newInstance().newDocumentBuilder().parse(file.toFile());
    assertTrue(svg.getDocumentElement().getTextContent().contains("Bir<h, & Söhne 1"));
  }

  @Test
  void helpNamesEveryOption() {
    Outcome help = Outcome.of("--help");
    assertEquals(0, help.status());
    for (String option : new String[] {"--data", "--seed", "--seconds", "--threads", "--svg"}) {
      assertTrue(help.out().contains(option), option);
    }
    for (String file : RoundsReader.FILES.split(", ")) {
      assertTrue(help.out().contains(file), file);
    }
    assertTrue(help.out().contains(RoundsReader.LIBRARY));
    help.out().lines().forEach(line -> assertTrue(line.length() <= 80, line));
  }
}
