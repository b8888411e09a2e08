package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.couplet.consumer.ChildJvm;
import java.io.File;
import java.nio.file.Path;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * A form takes 12 bytes a pair, and building one not four times as much.
 *
 * <p>The form of this test takes 26.3 MiB. Measured on JDK 17 with the serial collector: its
 * building needs a heap of 78 MiB, that is 2.96 times the form, the most of all numbers of pairs
 * from 2 to 4 million. With arrays that double as they grow, an order beside the entries and a
 * second copy of the result it needed 112 MiB.
 */
class FormMemoryTest {
  private static final int VARIABLES = 100_000;
  private static final int PAIRS = 2_200_000;

  /** Builds the form in a machine of its own, and takes it to spins and back. */
  public static final class Building {
    private Building() {}

    /** Prints what was built. */
    public static void main(String[] args) {
      Qubo form = build();
      System.out.println(form.toIsing().toQubo().equals(form) + " " + form);
    }

    private static Qubo build() {
      SplittableRandom random = new SplittableRandom(1);
      Qubo.Builder form = Qubo.builder(VARIABLES);
      for (int p = 0; p < PAIRS; p++) {
        int i = random.nextInt(VARIABLES);
        form.addPair(i, (i + 1 + p % 40_000) % VARIABLES, 1 + random.nextInt(9));
      }
      return form.build();
    }
  }

  @Test
  void buildingTakesLessThanFourTimesTheForm(@TempDir Path folder) throws Exception {
    String classes = ChildJvm.home(Qubo.class) + File.pathSeparator + ChildJvm.home(Building.class);
    ChildJvm.Outcome outcome =
        ChildJvm.run(
            folder,
            "-XX:+UseSerialGC",
            "-Xmn4m",
            "-Xmx94m",
            "-cp",
            classes,
            Building.class.getName());
    assertEquals(0, outcome.status(), outcome.output());
    int merged = 2_199_402;
    assertEquals(
        "true Qubo(100000 variables, " + merged + " pairs, constant 0.0)\n", outcome.output());
  }
}
