package dev.couplet.bench.speed;

import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowering;
import dev.couplet.model.Expr;
import dev.couplet.model.Model;
import java.util.Arrays;
import java.util.Locale;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Level;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * Lowering a model that is built, beside sorting as many random longs as the model has terms. Whole
 * calls are timed, one after the other; the seed of all numbers is 1.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SingleShotTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 3)
@Measurement(iterations = 7)
@Fork(1)
public class LoweringBenchmark {
  /** One linear term a bit and five pairs, or all pairs. */
  @Param({"sparse", "dense"})
  public String workload = "sparse";

  /** The number of terms, about. */
  @Param({"10000", "100000", "1000000"})
  public int terms = 10_000;

  private Model model = Model.named("empty");
  private Model other = model;
  private Expr sum = Expr.constant(0);
  private long[] random = new long[0];
  private long[] numbers = random;

  /** Builds the model. */
  @Setup
  public void build() {
    Workload chosen = Workload.valueOf(workload.toUpperCase(Locale.ROOT));
    model = chosen.model(terms, 1);
    other = Model.named("other");
    sum = chosen.sum(terms, other, 1);
    random = new SplittableRandom(1).longs(model.snapshot().objective().terms()).toArray();
  }

  /** Brings the longs out of order again. */
  @Setup(Level.Invocation)
  public void shuffle() {
    numbers = random.clone();
  }

  /** From the model to the form. */
  @Benchmark
  public Lowered lower() {
    return Lowering.standard().lower(model);
  }

  /** The measure of it. */
  @Benchmark
  public long[] sort() {
    Arrays.sort(numbers);
    return numbers;
  }

  /** From a sum to a model's objective; what the same model had before it is not asked again. */
  @Benchmark
  public int minimize() {
    return other.minimize("sum " + System.nanoTime(), sum).terms().terms();
  }
}
