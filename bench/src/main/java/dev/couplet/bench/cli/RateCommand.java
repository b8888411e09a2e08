package dev.couplet.bench.cli;

import dev.couplet.bench.instances.Couplings;
import dev.couplet.bench.instances.Torus;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Sampler;
import java.time.Duration;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** The verb {@code rate}: the speed of one kernel on one thread. */
@Command(
    name = "rate",
    mixinStandardHelpOptions = true,
    sortOptions = false,
    description = {
      "Measures the speed of a method on a generated lattice, on one thread.",
      "",
      "The inverse temperature grows evenly over the sweeps of a draw, from 0.1 to 3 over the root"
          + " mean square of the couplings. Draws are left as the last sweep leaves them. A run of"
          + " the same draws, of at most two seconds, comes first and is not measured."
    },
    optionListHeading = "%nOptions:%n",
    footerHeading = "%nColumns:%n",
    footer = {
      "  workload       lattice and couplings",
      "  n              sites",
      "  method, draws, sweeps  as asked for",
      "  seconds        the whole call of the method: its tables, all draws, their energies",
      "  ns_per_update  nanoseconds of that for each site, sweep and draw",
      "  best_per_spin  the lowest energy of a draw over n, in units of the couplings",
      "  mean_per_spin  the mean energy of the draws over n"
    })
final class RateCommand implements Callable<Integer> {
  static final List<String> COLUMNS =
      List.of(
          "workload",
          "n",
          "method",
          "draws",
          "sweeps",
          "seconds",
          "ns_per_update",
          "best_per_spin",
          "mean_per_spin");
  private static final double FIRST = 0.1;
  private static final double LAST = 3;
  private static final Duration WARM_UP = Duration.ofSeconds(2);

  @Spec private CommandSpec spec = CommandSpec.create();

  @Option(
      names = "--lattice",
      paramLabel = "LATTICE",
      description = "torus: and the sides of a periodic lattice (default: ${DEFAULT-VALUE}).")
  private String lattice = "torus:16x16x16";

  @Option(
      names = "--method",
      paramLabel = "NAME",
      completionCandidates = Methods.ThermalNames.class,
      description = "One of ${COMPLETION-CANDIDATES} (default: ${DEFAULT-VALUE}).")
  private String method = "annealing";

  @Option(
      names = "--draws",
      paramLabel = "D",
      description = "The number of draws (default: ${DEFAULT-VALUE}).")
  private int draws = 64;

  @Option(
      names = "--sweeps",
      paramLabel = "N",
      description = "Passes over all sites in a draw (default: ${DEFAULT-VALUE}).")
  private int sweeps = 1000;

  @Mixin private CouplingOptions coupled = new CouplingOptions();

  @Override
  public Integer call() {
    Torus torus = Torus.parse(lattice);
    Couplings distribution = coupled.distribution();
    Methods.Thermal thermal = Methods.thermal(method);
    Effort effort = Effort.draws(draws).sweeps(sweeps).seed(coupled.seed());
    Ising spins = torus.couple(distribution, coupled.seed());
    double unit = rootMeanSquare(spins);
    Sampler sampler = thermal.between(unit / FIRST, unit / LAST);
    Qubo form = spins.toQubo();

    var unused = sampler.sample(form, effort.limit(WARM_UP));
    long began = System.nanoTime();
    Draws found = sampler.sample(form, effort);
    double seconds = (System.nanoTime() - began) * 1e-9;
    new Table(spec.commandLine().getOut(), COLUMNS)
        .row(cells(torus + ":" + distribution, form.size(), found, seconds));
    return 0;
  }

  private List<String> cells(String workload, int n, Draws found, double seconds) {
    double updates = (double) n * sweeps * found.total();
    return List.of(
        workload,
        Integer.toString(n),
        method,
        Integer.toString(found.total()),
        Integer.toString(sweeps),
        Table.fixed(seconds, 3),
        Table.fixed(seconds * 1e9 / updates, 4),
        Table.fixed(found.best().energy() / n, 5),
        Table.fixed(mean(found) / n, 5));
  }

  private static double rootMeanSquare(Ising spins) {
    double[] sum = {0};
    spins.forEachPair((i, j, value) -> sum[0] += value * value);
    return Math.sqrt(sum[0] / spins.pairs());
  }

  private static double mean(Draws found) {
    double sum = 0;
    for (Draw draw : found) {
      sum += draw.energy() * draw.multiplicity();
    }
    return sum / found.total();
  }
}
