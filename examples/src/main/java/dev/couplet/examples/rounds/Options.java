package dev.couplet.examples.rounds;

import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;

/** What can be said on the command line. */
@Command(
    name = "rounds",
    usageHelpWidth = 80,
    description =
        "Decides which van of a mobile library serves which village, so that the villages of a van"
            + " lie close together. Prints the model, its lowering to a quadratic form, an audit of"
            + " the lowering, the plan, how good it is, the order in which each van visits its"
            + " villages, and a small copy of it all on a sparse host.",
    footer = {
      "",
      "The folder of --data holds files in UTF-8; the first line of each names its",
      "columns. All must be there but the last:",
      "  villages.csv   village,crates,east,north   metres on the map, whole numbers",
      "  vans.csv       van,crates                  how many crates it carries",
      "  wishes.csv     village,van,metres          what the wish is worth",
      "  together.csv   village,other               these two must share a van",
      "  apart.csv      village,other               these two must not",
      "  library.csv    east,north                  where the vans start and return;",
      "                                             without it: the villages' mean",
      "Lines that begin with # and other columns are not read.",
      "",
      "Exit status: 0 a plan that keeps all rules, 1 none found, 2 bad use or input."
    })
final class Options {
  private static final double LONGEST = 86_400;

  @Option(
      names = "--data",
      paramLabel = "DIR",
      description = "The folder with the data. Without it: twelve invented villages.")
  private @Nullable Path data;

  @Option(
      names = "--seed",
      paramLabel = "N",
      description = "The seed of all random numbers (default: ${DEFAULT-VALUE}).")
  private long seed = 1;

  @Option(
      names = "--seconds",
      paramLabel = "S",
      description =
          "How long to search at most: half for draws, half for the solver; then as long again for"
              + " the order of the visits (default: ${DEFAULT-VALUE}).")
  private double seconds = 5;

  @Option(
      names = "--threads",
      paramLabel = "T",
      description = "How many threads search (default: ${DEFAULT-VALUE}).")
  private int threads = 2;

  @Option(
      names = "--svg",
      paramLabel = "FILE",
      description = {
        "Draws the plan as a map into this file, and the embedding of the small copy into one beside"
            + " it whose name ends in -host."
      })
  private @Nullable Path svg;

  @Option(
      names = {"-h", "--help"},
      usageHelp = true,
      description = "Prints this help.")
  private boolean help;

  boolean help() {
    return help;
  }

  /**
   * These options, none of them out of range.
   *
   * @throws BadInput naming the option and its value
   */
  Options checked() {
    if (!(seconds > 0 && seconds <= LONGEST)) {
      throw new BadInput(
          "--seconds " + seconds + ": give a number above 0, at most " + Numbers.shown(LONGEST));
    }
    if (threads < 1 || threads > 1024) {
      throw new BadInput("--threads " + threads + ": give a number from 1 to 1024");
    }
    svg().ifPresent(Options::requireWritable);
    hostSvg().ifPresent(Options::requireWritable);
    return this;
  }

  private static void requireWritable(Path file) {
    Path folder = Optional.ofNullable(file.toAbsolutePath().getParent()).orElse(file);
    if (!Files.isDirectory(folder)) {
      throw new BadInput("--svg " + file + ": there is no folder " + folder);
    }
    if (Files.isDirectory(file)) {
      throw new BadInput("--svg " + file + ": this is a folder; name a file");
    }
  }

  Folder folder() {
    return data == null ? Folder.invented() : Folder.at(data);
  }

  long seed() {
    return seed;
  }

  /** A part of the time, at least a nanosecond. */
  Duration time(double share) {
    return Duration.ofNanos(Math.max(1, Math.round(seconds * share * 1e9)));
  }

  int threads() {
    return threads;
  }

  Optional<Path> svg() {
    return Optional.ofNullable(svg);
  }

  /** The file beside it for the embedding: map-host.svg beside map.svg. */
  Optional<Path> hostSvg() {
    return svg()
        .flatMap(file -> Optional.ofNullable(file.getFileName()))
        .flatMap(name -> svg().map(file -> file.resolveSibling(hostName(name.toString()))));
  }

  private static String hostName(String name) {
    int dot = name.lastIndexOf('.');
    return dot <= 0 ? name + "-host" : name.substring(0, dot) + "-host" + name.substring(dot);
  }
}
