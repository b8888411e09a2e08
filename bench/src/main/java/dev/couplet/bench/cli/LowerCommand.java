package dev.couplet.bench.cli;

import dev.couplet.bench.instances.Instance;
import dev.couplet.form.MatrixMarket;
import dev.couplet.form.Qubo;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowering;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.OptionalDouble;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** The verb {@code lower}: from an instance with rules to a quadratic form. */
@Command(
    name = "lower",
    mixinStandardHelpOptions = true,
    sortOptions = false,
    description = {
      "Lowers one instance to a quadratic form in 0/1 variables, to be minimised.",
      "",
      "A form as it stands is passed on. Where the file's own values are to be maximised, those of"
          + " the form have the other sign."
    },
    parameterListHeading = "%nParameters:%n",
    optionListHeading = "%nOptions:%n",
    footerHeading = "%nColumns:%n",
    footer = {
      "  instance  the file's name without folder and ending",
      "  bits      bits of the form, the auxiliary ones among them",
      "  aux       auxiliary bits: those that stand for no decision; they come last",
      "  pairs     pairs of bits with a coefficient",
      "  max_abs, min_abs  the largest and the smallest magnitude among the coefficients of bits and",
      "            pairs that are not zero",
      "  seconds   how long lowering took; reading and writing files is not in it",
      "A dash stands for what is not there."
    })
final class LowerCommand implements Callable<Integer> {
  static final List<String> COLUMNS =
      List.of("instance", "bits", "aux", "pairs", "max_abs", "min_abs", "seconds");

  @Spec private CommandSpec spec = CommandSpec.create();

  @Mixin private Inputs inputs = new Inputs();

  @Option(
      names = "--out",
      paramLabel = "FILE",
      description =
          "Write the form there, as a Matrix Market file (symmetric coordinate; minimise x'Ax).")
  private @Nullable Path out;

  @Override
  public Integer call() throws IOException {
    Instance instance = inputs.read();
    long began = System.nanoTime();
    Qubo form;
    int aux = 0;
    if (instance instanceof Instance.OfModel model) {
      Lowered lowered = Lowering.standard().lower(model.statement());
      form = lowered.qubo();
      aux = lowered.auxiliaryBits();
    } else {
      form = ((Instance.OfForm) instance).form();
    }
    double seconds = (System.nanoTime() - began) * 1e-9;
    if (out != null) {
      MatrixMarket.write(form, out);
    }
    new Table(spec.commandLine().getOut(), COLUMNS).row(cells(instance.name(), form, aux, seconds));
    return 0;
  }

  private static List<String> cells(String name, Qubo form, int aux, double seconds) {
    double[] extremes = {0, Double.POSITIVE_INFINITY};
    for (int i = 0; i < form.size(); i++) {
      take(form.linear(i), extremes);
    }
    form.forEachPair((i, j, value) -> take(value, extremes));
    boolean any = extremes[0] > 0;
    return List.of(
        name,
        Integer.toString(form.size()),
        Integer.toString(aux),
        Integer.toString(form.pairs()),
        Table.value(any ? OptionalDouble.of(extremes[0]) : OptionalDouble.empty()),
        Table.value(any ? OptionalDouble.of(extremes[1]) : OptionalDouble.empty()),
        Table.fixed(seconds, 3));
  }

  private static void take(double coefficient, double[] extremes) {
    double magnitude = Math.abs(coefficient);
    if (magnitude > 0) {
      extremes[0] = Math.max(extremes[0], magnitude);
      extremes[1] = Math.min(extremes[1], magnitude);
    }
  }
}
