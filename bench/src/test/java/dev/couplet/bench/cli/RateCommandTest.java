package dev.couplet.bench.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.Couplings;
import dev.couplet.bench.instances.Torus;
import dev.couplet.exact.Enumeration;
import dev.couplet.form.Ising;
import dev.couplet.sampling.Effort;
import org.junit.jupiter.api.Test;

class RateCommandTest {
  @Test
  void theHeaderIsTheDesigns() {
    assertEquals(
        "workload n method draws sweeps seconds ns_per_update best_per_spin mean_per_spin",
        String.join(" ", RateCommand.COLUMNS));
  }

  /** The lowest energy of 16 sites, against a walk over all states. */
  @Test
  void theBestIsTheMinimumOfASmallLattice() {
    CommandRun run =
        CommandRun.of(
            "rate",
            "--lattice",
            "torus:4x4",
            "--couplings",
            "3",
            "--draws",
            "50",
            "--sweeps",
            "100",
            "--seed",
            "5");
    assertEquals(0, run.status(), run.toString());
    Ising form = Torus.parse("torus:4x4").couple(Couplings.integers(3), 5);
    double minimum = Enumeration.standard().sample(form.toQubo(), Effort.draws(1)).best().energy();
    assertEquals(minimum / 16, run.number("best_per_spin"), 5e-6);
    assertEquals("torus:4x4:3", run.row().get("workload"));
    assertEquals("16", run.row().get("n"));
    assertEquals("50", run.row().get("draws"));
    assertEquals("100", run.row().get("sweeps"));
    assertTrue(run.number("mean_per_spin") >= run.number("best_per_spin"));
  }

  @Test
  void theSpeedIsTimeOverUpdates() {
    CommandRun run =
        CommandRun.of("rate", "--lattice", "torus:8x8x8", "--draws", "20", "--sweeps", "100");
    double updates = 512.0 * 20 * 100;
    assertEquals(run.number("seconds") * 1e9, run.number("ns_per_update") * updates, 0.6e6);
  }

  @Test
  void theSeedDecidesTheEnergies() {
    String[] arguments = {
      "rate", "--lattice", "torus:6x6x6", "--couplings", "gauss", "--draws", "8"
    };
    CommandRun first = CommandRun.of(arguments);
    CommandRun second = CommandRun.of(arguments);
    assertEquals(first.row().get("best_per_spin"), second.row().get("best_per_spin"));
    assertEquals(first.row().get("mean_per_spin"), second.row().get("mean_per_spin"));
  }
}
