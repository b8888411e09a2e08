package dev.couplet.examples.rounds;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.OptionalLong;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What the example says is proved, against a look at every assignment. */
class OptimumTest {
  @TempDir Path directory;

  @Test
  void theInventedDataIsSolvedToItsOptimum() {
    Outcome outcome = Outcome.of();
    assertEquals("optimal", outcome.proof());
    assertEquals(SlowTwin.ofInventedData().optimum(), OptionalLong.of(outcome.value()));
    assertEquals("0", outcome.found("^  gap +(\\S+) m"));
    assertEquals(outcome.value(), Long.parseLong(outcome.found("^  lower bound +(\\d+) m")));
  }

  @Test
  void soIsOtherDataAndDataWithoutAPlanIsSaidToHaveNone() {
    int solved = 0;
    int without = 0;
    for (int seed = 0; seed < 20; seed++) {
      SplittableRandom random = new SplittableRandom(seed);
      String villages = villages(random);
      String vans = "van,crates\na," + (3 + random.nextInt(9)) + "\nb,9\n";
      String wishes = "village,van,metres\nV1,a," + random.nextInt(5000) + "\nV2,b,700\n";
      String together = "village,other\nV0,V" + (1 + random.nextInt(3)) + "\n";
      String apart = "village,other\nV4,V5\nV4,V6\n" + (random.nextBoolean() ? "V5,V6\n" : "");
      TestFolder folder = new TestFolder(directory);
      folder.write("villages.csv", villages).write("vans.csv", vans).write("wishes.csv", wishes);
      folder.write("together.csv", together).write("apart.csv", apart);
      OptionalLong optimum = new SlowTwin(villages, vans, wishes, together, apart).optimum();
      Outcome outcome = folder.run("--seconds", "60");
      if (optimum.isPresent()) {
        solved++;
        assertEquals(0, outcome.status(), () -> outcome.out() + outcome.err());
        assertEquals("optimal", outcome.proof());
        assertEquals(optimum.getAsLong(), outcome.value(), villages);
      } else if (outcome.status() == 1) {
        without++;
        assertEquals("infeasible", outcome.proof());
      } else {
        assertEquals(2, outcome.status());
      }
    }
    assertTrue(solved >= 5, "with a plan: " + solved);
    assertTrue(without >= 5, "without: " + without);
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
