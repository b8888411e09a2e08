package dev.couplet.examples.rounds;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalLong;
import java.util.SplittableRandom;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What the page of the order of the visits prints, recomputed from the files alone. */
class JointTest {
  private static final Pattern ROUND =
      Pattern.compile(
          "(?m)^    the (\\w+) van +(\\d+) of (\\d+) +(\\d+)  (\\S.*(?:\n {20,}\\S.*)*)$");

  @TempDir Path directory;

  @Test
  void theInventedDataIsSolvedBetterJointly() {
    OptionalLong best = SlowTwin.ofInventedData().shortestWays(8800, 9200);
    for (int seed = 1; seed <= 3; seed++) {
      Outcome outcome = Outcome.of("--seed", Integer.toString(seed), "--seconds", "60");
      long staged = number(outcome, "value", 1);
      assertEquals(best, OptionalLong.of(number(outcome, "value", 2)));
      assertTrue(best.getAsLong() < staged);
      assertEquals(staged, number(outcome, "lower bound", 1));
      assertPrintedAsItIs(outcome, new CsvText(TestFolder::invented), 8800, 9200);
    }
  }

  @Test
  void onOtherDataTheJointPlanIsNeverWorseAndNeverTooGood() {
    int solved = 0;
    for (int seed = 0; seed < 8; seed++) {
      SplittableRandom random = new SplittableRandom(seed);
      Map<String, String> text = new LinkedHashMap<>();
      text.put("villages.csv", villages(random));
      text.put("vans.csv", "van,crates\na," + (5 + random.nextInt(5)) + "\nb,9\n");
      text.put("wishes.csv", "village,van,metres\nV1,a," + random.nextInt(5000) + "\nV2,b,700\n");
      text.put("together.csv", "village,other\nV0,V1\n");
      text.put("apart.csv", "village,other\nV4,V5\n");
      text.put("library.csv", "east,north\n" + random.nextInt(9000) + ",4000\n");
      TestFolder folder = new TestFolder(directory);
      text.forEach(folder::write);
      Outcome outcome = folder.run("--seconds", "60");
      if (outcome.status() == 0) {
        solved++;
        String[] library = text.get("library.csv").split("\n")[1].split(",");
        assertPrintedAsItIs(
            outcome,
            new CsvText(text::get),
            Long.parseLong(library[0]),
            Long.parseLong(library[1]));
      }
    }
    assertTrue(solved >= 5, "with a plan: " + solved);
  }

  @Test
  void withoutAFileTheLibraryStandsAmidTheVillages() throws Exception {
    TestFolder folder = TestFolder.invented(directory);
    Files.delete(directory.resolve("library.csv"));
    Outcome outcome = folder.run("--seconds", "60");
    CsvText files = new CsvText(TestFolder::invented);
    long east = Math.round(files.mean(2));
    long north = Math.round(files.mean(3));
    assertPrintedAsItIs(outcome, files, east, north);
  }

  @Test
  void withoutAPlanThereIsNothingToPutInOrder() {
    TestFolder folder = TestFolder.invented(directory);
    folder.write("vans.csv", "van,crates\nsmall,9\nmiddle,9\nlarge,9\n");
    folder.write(
        "apart.csv",
        "village,other\nAlder,Elm\nElm,Rowan\nRowan,Alder\nBirch,Elm\n"
            + "Birch,Rowan\nBirch,Alder\n");
    Path map = directory.resolve("map.svg");
    Outcome outcome = folder.run("--svg", map.toString());
    assertEquals(1, outcome.status());
    assertTrue(outcome.out().contains("nothing to put in order"), outcome.out());
  }

  private static void assertPrintedAsItIs(Outcome outcome, CsvText files, long east, long north) {
    List<MatchResult> rounds = ROUND.matcher(outcome.out()).results().toList();
    int vans = files.rows("vans.csv").size();
    assertEquals(2 * vans, rounds.size(), outcome.out());
    for (int column = 1; column <= 2; column++) {
      long ways = 0;
      Map<String, String> vanOf = new LinkedHashMap<>();
      for (MatchResult round : rounds.subList((column - 1) * vans, column * vans)) {
        long[] library = {east, north};
        long[] here = library;
        long way = 0;
        long crates = 0;
        for (String name : names(round.group(5))) {
          String[] village = files.village(name);
          vanOf.put(name, round.group(1));
          crates += Long.parseLong(village[1]);
          long[] next = {Long.parseLong(village[2]), Long.parseLong(village[3])};
          way += HeldKarp.metres(here, next);
          here = next;
        }
        way += HeldKarp.metres(here, library);
        assertEquals(Long.parseLong(round.group(4)), way);
        assertEquals(Long.parseLong(round.group(2)), crates);
        assertTrue(crates <= Long.parseLong(round.group(3)));
        ways += way;
      }
      assertEquals(files.rows("villages.csv").size(), vanOf.size());
      files.rows("together.csv").forEach(p -> assertEquals(vanOf.get(p[0]), vanOf.get(p[1])));
      files.rows("apart.csv").forEach(p -> assertTrue(!vanOf.get(p[0]).equals(vanOf.get(p[1]))));
      long wishes = 0;
      for (String[] wish : files.rows("wishes.csv")) {
        wishes += vanOf.get(wish[0]).equals(wish[1]) ? 0 : Long.parseLong(wish[2]);
      }
      assertEquals(ways, number(outcome, "ways", column));
      assertEquals(wishes, number(outcome, "wishes", column));
      assertEquals(ways + wishes, number(outcome, "value", column));
      assertEquals(
          ways + wishes - number(outcome, "lower bound", column), number(outcome, "gap", column));
    }
    long joint = number(outcome, "value", 2);
    assertTrue(joint <= number(outcome, "value", 1));
    OptionalLong best = files.slowTwin().shortestWays(east, north);
    assertTrue(joint >= best.getAsLong());
    assertTrue(number(outcome, "lower bound", 2) <= best.getAsLong());
    boolean proved = outcome.found("^  proof +\\w+ +(none|optimal) ").equals("optimal");
    assertTrue(!proved || joint == best.getAsLong());
  }

  private static String[] names(String order) {
    String names = order.replaceAll("\\s+", " ");
    return names.equals("none") ? new String[0] : names.split(", ");
  }

  private static long number(Outcome outcome, String row, int column) {
    String pattern = "^  " + row + " +(\\d+) m +(\\d+) m  \\S";
    return Long.parseLong(
        column == 1
            ? outcome.found(pattern)
            : outcome.found(pattern.replace("(\\d+) m +", "\\d+ m +")));
  }

  private static String villages(SplittableRandom random) {
    StringBuilder text = new StringBuilder("village,crates,east,north\n");
    for (int v = 0; v < 7; v++) {
      text.append('V').append(v).append(',').append(random.nextInt(4)).append(',');
      text.append(random.nextInt(9000)).append(',').append(random.nextInt(9000)).append('\n');
    }
    return text.toString();
  }
}
