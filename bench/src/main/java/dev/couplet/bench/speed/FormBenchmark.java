package dev.couplet.bench.speed;

import dev.couplet.anneal.Annealing;
import dev.couplet.bench.instances.Couplings;
import dev.couplet.bench.instances.Seeded;
import dev.couplet.bench.instances.Torus;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.Warmup;

/** The work on a form that every method does, on a sparse lattice and on a dense instance. */
@org.openjdk.jmh.annotations.State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(1)
public class FormBenchmark {
  private static final int SWEEPS = 10;

  /** A periodic lattice of 4,096 sites, or 1,000 variables of which half the pairs meet. */
  @Param({"sparse", "dense"})
  public String workload = "sparse";

  private Qubo form = Qubo.builder(0).build();
  private Ising spins = form.toIsing();
  private State state = State.zeros(0);

  /** Makes the form and a random state of it. */
  @Setup
  public void prepare() {
    form =
        workload.equals("sparse")
            ? Torus.parse("torus:16x16x16").couple(Couplings.integers(1), 1).toQubo()
            : Seeded.parse("1000:50:1").generate().form();
    spins = form.toIsing();
    SplittableRandom random = new SplittableRandom(1);
    boolean[] bits = new boolean[form.size()];
    for (int i = 0; i < bits.length; i++) {
      bits[i] = random.nextBoolean();
    }
    state = State.of(bits);
  }

  /** The energy of one state. */
  @Benchmark
  public double value() {
    return form.value(state);
  }

  /** Building a form, from the pairs of another. */
  @Benchmark
  public Qubo build() {
    return spins.toQubo();
  }

  /** One draw of ten sweeps. */
  @Benchmark
  public Draws anneal() {
    return Annealing.standard().sample(form, Effort.draws(1).sweeps(SWEEPS));
  }
}
