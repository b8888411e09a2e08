package dev.couplet.bench.cli;

import dev.couplet.bench.instances.Instance;
import dev.couplet.bound.SplitBound;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import java.io.IOException;
import java.io.PrintWriter;
import java.util.concurrent.Callable;
import java.util.function.DoubleUnaryOperator;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** The verb {@code solve}: samples one instance and bounds it. */
@Command(
    name = "solve",
    mixinStandardHelpOptions = true,
    sortOptions = false,
    description = {
      "Looks for the best value of one instance, and for a bound on it.",
      "",
      "Values are in the file's own sense and units."
    },
    parameterListHeading = "%nParameters:%n",
    optionListHeading = "%nOptions:%n",
    footerHeading = "%nColumns:%n",
    footer = {
      "  instance      the file's name without folder and ending",
      "  n, pairs      bits of the quadratic form, pairs of them with a coefficient",
      "  method, seed  as asked for",
      "  seconds       how long the method ran; reading the file is not in it, nor is bounding",
      "                afterwards (at most a tenth of --seconds) where the method gives no bound",
      "  value         the best value found; where there are rules, of a plan that keeps them",
      "  hit_seconds   when the run first told of the target, or without one of that value.",
      "                Methods tell at most every 50 ms, so that this is never too early, but can",
      "                be late by that much, and is the end of the run if it ended before it told",
      "  bound         no value is better than this: proved",
      "  gap           how far value and bound are apart",
      "  proof         'optimal' if they are not, 'infeasible' if no plan keeps the rules, else 'none'",
      "A dash stands for what is not there."
    })
final class SolveCommand implements Callable<Integer> {
  private static final int NOT_REACHED = 1;

  @Spec private CommandSpec spec = CommandSpec.create();

  @Mixin private Inputs inputs = new Inputs();

  @Mixin private TimedOptions timed = new TimedOptions();

  @Option(
      names = "--threads",
      paramLabel = "T",
      description = "The number of threads (default: ${DEFAULT-VALUE}).")
  private int threads = 1;

  @Option(
      names = "--method",
      paramLabel = "NAME",
      completionCandidates = Methods.Names.class,
      description = "One of ${COMPLETION-CANDIDATES} (default: ${DEFAULT-VALUE}).")
  private String method = Methods.STANDARD;

  @Option(
      names = "--target",
      paramLabel = "V",
      description = "End as soon as this value is reached; exit status 1 if it is not.")
  private @Nullable Double target;

  @Override
  public Integer call() throws IOException {
    Methods.Method chosen = Methods.named(method);
    Effort effort = timed.effort().threads(threads);
    Instance instance = inputs.read();
    Outcome outcome =
        instance instanceof Instance.OfModel model && method.equals(Methods.STANDARD)
            ? answered(model, effort)
            : bounded(attempt(chosen, Subject.of(instance), effort));
    new Table(spec.commandLine().getOut(), Outcome.COLUMNS).row(outcome.cells());
    return outcome.reached() ? 0 : NOT_REACHED;
  }

  private Answered answered(Instance.OfModel model, Effort effort) {
    Effort aimed = target == null ? effort : effort.target(target);
    int sign = model.statement().sense().sign();
    try (ProgressLine line = progress(energy -> sign * energy)) {
      return Answered.make(model, aimed, line, System::nanoTime);
    }
  }

  private Attempt attempt(Methods.Method chosen, Subject subject, Effort effort) {
    Effort aimed = target == null ? effort : effort.target(subject.turn(target));
    try (ProgressLine line = progress(subject::turn)) {
      return Attempt.make(subject, chosen, aimed, line, System::nanoTime);
    }
  }

  private ProgressLine progress(DoubleUnaryOperator valueOf) {
    PrintWriter err = spec.commandLine().getErr();
    return new ProgressLine(err, ProgressLine.onTerminal(), "value", valueOf);
  }

  private Attempt bounded(Attempt attempt) {
    if (attempt.bound().isPresent()) {
      return attempt;
    }
    Effort share = timed.share(0.1);
    return attempt.bound(SplitBound.standard().below(attempt.subject().form(), Run.of(share)));
  }
}
