package dev.couplet.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.List;
import org.junit.jupiter.api.Test;

class FindingsTest {
  private static Findings findings(int wrong) {
    Notes notes = new Notes();
    notes.expect("sound", true, () -> "never asked for");
    for (int k = 0; k < wrong; k++) {
      int number = k;
      notes.expect("order", false, () -> "row " + number + " stands too low");
    }
    notes.expect("order", true, () -> "never asked for");
    return notes.of("the sampler");
  }

  @Test
  void aCleanAuditSaysSo() {
    Findings clean = findings(0);
    clean.orThrow();
    assertEquals("all 2 checks of the sampler hold", clean.toString());
    assertEquals(List.of("sound", "order"), clean.checks());
    assertEquals(List.of(), clean.all());
  }

  @Test
  void theErrorListsTheFirstFindingsOfEachCheck() {
    AssertionError error = assertThrows(AssertionError.class, () -> findings(5).orThrow());
    assertEquals(
        "1 of 2 checks of the sampler fails\n"
            + "  [order] row 0 stands too low\n"
            + "  [order] row 1 stands too low\n"
            + "  [order] row 2 stands too low\n"
            + "  [order] and 2 more like these",
        error.getMessage());
    assertEquals(5, findings(5).all().size());
  }
}
