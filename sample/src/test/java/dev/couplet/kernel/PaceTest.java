package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Vigil;
import org.junit.jupiter.api.Test;

class PaceTest {
  @Test
  void asksOnlyEverySoManySteps() {
    int[] asked = {0};
    Pace pace =
        new Pace(
            () -> {
              asked[0]++;
              return false;
            });
    for (int k = 0; k < 100; k++) {
      assertFalse(pace.after(1 << 14));
    }
    assertEquals(25, asked[0]);
  }

  @Test
  void staysEndedOnceItEnded() {
    boolean[] answer = {true};
    Pace pace = new Pace(() -> answer[0]);
    assertFalse(pace.ended());
    assertTrue(pace.look());
    answer[0] = false;
    assertTrue(pace.look());
    assertTrue(pace.after(1));
  }

  @Test
  void portionsOfAWideFormAreSmallEnough() {
    int size = 700_000;
    Qubo.Builder form = Qubo.builder(size);
    for (int i = 1; i < size; i++) {
      form.addPair(0, i, 1).addPair(i, i % 1000 == 0 ? 1 : i / 2 + (i == 1 ? 2 : 0), 1);
    }
    Adjacency rows = Adjacency.of(form.build());
    int[] bounds = rows.portions();
    assertEquals(0, bounds[0]);
    assertEquals(size, bounds[bounds.length - 1]);
    for (int p = 0; p + 1 < bounds.length; p++) {
      int places = rows.start()[bounds[p + 1]] - rows.start()[bounds[p]];
      int length = bounds[p + 1] - bounds[p];
      assertTrue(length > 0);
      assertTrue(length == 1 || length + places <= Pace.PORTION && Pace.PORTION < Vigil.STEPS);
    }
  }

  @Test
  void theClosingPaceEndsAfterHalfTheStepsThatMayLieBetweenTwoLooks() {
    Pace closing = Pace.closing();
    long steps = 0;
    while (!closing.after(1 << 10)) {
      steps += 1 << 10;
    }
    assertTrue(steps > Vigil.STEPS / 4 && steps <= Vigil.STEPS / 2, "steps: " + steps);
  }
}
