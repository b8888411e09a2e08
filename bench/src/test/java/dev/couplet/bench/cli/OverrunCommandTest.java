package dev.couplet.bench.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;

class OverrunCommandTest {
  @Test
  void everyLatticeWithEveryMethodAndLimitHasARow() {
    CommandRun run =
        CommandRun.of(
            "overrun",
            "--lattice",
            "torus:4x4,torus:5x5x5",
            "--couplings",
            "3",
            "--method",
            "annealing,descent",
            "--seconds",
            "0.02,0.01");
    assertEquals(0, run.status(), run.toString());
    List<String[]> rows = run.out().stream().map(line -> line.split("\t", -1)).toList();
    assertEquals("instance n pairs method limit seconds overrun_ms", String.join(" ", rows.get(0)));
    assertEquals(9, rows.size());
    assertEquals(
        List.of(
            "torus:4x4:3 16 32 annealing 0.020",
            "torus:4x4:3 16 32 annealing 0.010",
            "torus:4x4:3 16 32 descent 0.020",
            "torus:4x4:3 16 32 descent 0.010",
            "torus:5x5x5:3 125 375 annealing 0.020",
            "torus:5x5x5:3 125 375 annealing 0.010",
            "torus:5x5x5:3 125 375 descent 0.020",
            "torus:5x5x5:3 125 375 descent 0.010"),
        rows.subList(1, 9).stream()
            .map(row -> String.join(" ", List.of(row).subList(0, 5)))
            .toList());
    for (String[] row : rows.subList(1, 9)) {
      double seconds = Double.parseDouble(row[5]);
      double overrun = Double.parseDouble(row[6]);
      assertEquals(seconds * 1e3, Double.parseDouble(row[4]) * 1e3 + overrun, 0.6);
    }
  }

  @Test
  void aMethodThatIsDoneBeforeHasANegativeOverrun() {
    CommandRun run =
        CommandRun.of(
            "overrun", "--lattice", "torus:3x3", "--method", "enumeration", "--seconds", "60");
    assertTrue(run.number("overrun_ms") < 0);
  }

  @Test
  void badUseIsToldByName() {
    CommandRun limit = CommandRun.of("overrun", "--seconds", "0.1,-1");
    assertEquals(2, limit.status());
    assertTrue(limit.err().get(0).startsWith("--seconds is -1.0, it must be above 0"));
    CommandRun method = CommandRun.of("overrun", "--method", "luck");
    assertEquals(2, method.status());
    assertTrue(method.err().get(0).startsWith("there is no method 'luck'"));
  }
}
