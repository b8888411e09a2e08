package dev.couplet.bench.cli;

import dev.couplet.bench.instances.Couplings;
import picocli.CommandLine.Option;

/** How generated lattices are coupled: the same options for every verb that makes them. */
final class CouplingOptions {
  @Option(
      names = "--couplings",
      paramLabel = "C",
      description =
          "Uniform on the integers -C..C without zero, or 'gauss' (default: ${DEFAULT-VALUE}).")
  private String couplings = "1";

  @Option(
      names = "--seed",
      paramLabel = "N",
      description = "The seed of lattices and draws (default: ${DEFAULT-VALUE}).")
  private long seed = 1;

  Couplings distribution() {
    return Couplings.parse(couplings);
  }

  long seed() {
    return seed;
  }
}
