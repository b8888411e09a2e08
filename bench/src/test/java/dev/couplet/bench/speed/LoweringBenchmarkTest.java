package dev.couplet.bench.speed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.lower.Lowering;
import dev.couplet.model.Statement;
import java.util.Collection;
import org.junit.jupiter.api.Test;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.Options;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.VerboseMode;

/** That the benchmarks are found and run; their times, taken in haste here, mean nothing. */
class LoweringBenchmarkTest {
  @Test
  void everyBenchmarkRunsOnEveryWorkload() throws RunnerException {
    Options options =
        new OptionsBuilder()
            .include(LoweringBenchmark.class.getName())
            .param("terms", "1000")
            .forks(0)
            .warmupIterations(0)
            .measurementIterations(1)
            .shouldFailOnError(true)
            .verbosity(VerboseMode.SILENT)
            .build();
    Collection<RunResult> results = new Runner(options).run();
    assertEquals(3 * 2, results.size(), "three benchmarks, two workloads");
    for (RunResult result : results) {
      assertTrue(result.getPrimaryResult().getScore() > 0, result.getParams().id());
    }
  }

  @Test
  void workloadsHaveTheirSizes() {
    Statement sparse = Workload.SPARSE.model(6_000, 1).snapshot();
    assertEquals(1_000, sparse.literals());
    assertTrue(sparse.objective().terms() > 5_900 && sparse.objective().terms() <= 6_000);
    Statement dense = Workload.DENSE.model(2_000_000 / 1_000, 1).snapshot();
    assertEquals(63, dense.literals());
    assertEquals(63 * 64 / 2, dense.objective().terms());
    Qubo form = Lowering.standard().lower(dense).qubo();
    assertEquals(dense.objective().toQubo(), form);
  }

  @Test
  void memoryIsToldInARow() {
    String[] cells = LoweringMemory.row(Workload.DENSE, 20_000).split("\t", -1);
    assertEquals(7, cells.length);
    assertEquals("dense", cells[0]);
    assertEquals("200", cells[1]);
    assertEquals("19900", cells[2]);
  }
}
