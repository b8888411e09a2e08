package dev.couplet.bench.instances;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.PublishedData.Published;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.solve.Solver;
import java.io.IOException;
import java.util.List;
import org.junit.jupiter.api.Test;

/**
 * Optima of Beasley's instances (OR-Library; Beasley 1998), as the data folder's table has them.
 */
class PublishedOptimaTest {
  @Test
  void theSolverReachesEveryPublishedOptimumOf50Variables() throws IOException {
    List<Published> rows =
        PublishedData.of("bqp").stream().filter(row -> row.size() == 50).toList();
    assertEquals(5, rows.size());
    for (Published row : rows) {
      assertEquals("optimal", row.status());
      Instance.OfForm instance = InstanceReader.standard().readForm(row.path());
      Draws draws = Solver.standard().sample(instance.form(), Effort.draws(64).seed(7));
      assertEquals(row.best(), instance.value(draws.best().energy()), row.name());
      double bound = instance.value(draws.bound().orElseThrow());
      assertTrue(bound >= row.best(), row.name() + ": bound " + bound);
    }
  }
}
