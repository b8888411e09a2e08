package dev.couplet.bench.cli;

import dev.couplet.bench.instances.Couplings;
import dev.couplet.bench.instances.Torus;
import dev.couplet.form.Qubo;
import dev.couplet.sampling.Effort;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** The verb {@code overrun}: how far past its deadline a method returns. */
@Command(
    name = "overrun",
    mixinStandardHelpOptions = true,
    sortOptions = false,
    description = {
      "Measures how far past their deadlines methods return, on generated lattices.",
      "",
      "Every lattice with every method and every limit, in this order, in one virtual machine:"
          + " nothing is warmed up, and what the garbage collector takes counts."
    },
    optionListHeading = "%nOptions:%n",
    footerHeading = "%nColumns:%n",
    footer = {
      "  instance    lattice and couplings",
      "  n, pairs    bits of the quadratic form, pairs of them with a coefficient",
      "  method      as asked for",
      "  limit       seconds the method was given",
      "  seconds     the whole call of the method",
      "  overrun_ms  what it took beyond the limit; below zero if it was done before"
    })
final class OverrunCommand implements Callable<Integer> {
  static final List<String> COLUMNS =
      List.of("instance", "n", "pairs", "method", "limit", "seconds", "overrun_ms");

  @Spec private CommandSpec spec = CommandSpec.create();

  @Option(
      names = "--lattice",
      paramLabel = "LATTICE",
      split = ",",
      description = "torus: and the sides of a periodic lattice (default: ${DEFAULT-VALUE}).")
  private List<String> lattices = List.of("torus:100x100x100");

  @Mixin private CouplingOptions coupled = new CouplingOptions();

  @Option(
      names = "--method",
      paramLabel = "NAME",
      split = ",",
      completionCandidates = Methods.Names.class,
      description = "Some of ${COMPLETION-CANDIDATES} (default: ${DEFAULT-VALUE}).")
  private List<String> methods =
      List.of("annealing", "tempering", "tabu", "relink", "descent", "solver");

  @Option(
      names = "--seconds",
      paramLabel = "S",
      split = ",",
      description = "The limits (default: ${DEFAULT-VALUE}).")
  private List<Double> limits = List.of(0.2, 1.0, 3.0);

  @Option(
      names = "--threads",
      paramLabel = "T",
      description = "The number of threads (default: ${DEFAULT-VALUE}).")
  private int threads = 1;

  @Override
  public Integer call() {
    Couplings distribution = coupled.distribution();
    List<Torus> tori = lattices.stream().map(Torus::parse).toList();
    List<Methods.Method> chosen = methods.stream().map(Methods::named).toList();
    List<Effort> efforts = efforts();
    Table table = new Table(spec.commandLine().getOut(), COLUMNS);
    for (Torus torus : tori) {
      Qubo form = torus.couple(distribution, coupled.seed()).toQubo();
      for (Methods.Method method : chosen) {
        for (Effort effort : efforts) {
          table.row(cells(torus + ":" + distribution, form, method, effort));
        }
      }
    }
    return 0;
  }

  private List<Effort> efforts() {
    List<Effort> efforts = new ArrayList<>();
    for (double limit : limits) {
      efforts.add(TimedOptions.within("--seconds", limit).seed(coupled.seed()).threads(threads));
    }
    return efforts;
  }

  private static List<String> cells(
      String instance, Qubo form, Methods.Method method, Effort effort) {
    Duration limit = effort.limit().orElseThrow();
    long began = System.nanoTime();
    var unused = method.sampler().sample(form, effort);
    long took = System.nanoTime() - began;
    return List.of(
        instance,
        Integer.toString(form.size()),
        Integer.toString(form.pairs()),
        method.name(),
        Table.fixed(limit.toNanos() * 1e-9, 3),
        Table.fixed(took * 1e-9, 3),
        Table.fixed((took - limit.toNanos()) * 1e-6, 1));
  }
}
