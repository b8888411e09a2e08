package dev.couplet.bench.speed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Collection;
import org.junit.jupiter.api.Test;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.Options;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.TimeValue;
import org.openjdk.jmh.runner.options.VerboseMode;

/** That the benchmarks are found and run; their times, taken in haste here, mean nothing. */
class FormBenchmarkTest {
  @Test
  void everyBenchmarkRunsOnEveryWorkload() throws RunnerException {
    Options options =
        new OptionsBuilder()
            .include(FormBenchmark.class.getName())
            .forks(0)
            .warmupIterations(0)
            .measurementIterations(1)
            .measurementTime(TimeValue.milliseconds(10))
            .shouldFailOnError(true)
            .verbosity(VerboseMode.SILENT)
            .build();
    Collection<RunResult> results = new Runner(options).run();
    assertEquals(3 * 2, results.size(), "three benchmarks, two workloads");
    for (RunResult result : results) {
      assertTrue(result.getPrimaryResult().getScore() > 0, result.getParams().id());
    }
  }
}
