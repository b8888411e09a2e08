package dev.couplet.bench.cli;

import dev.couplet.bench.instances.Cities;
import dev.couplet.bench.instances.Instance;
import dev.couplet.bench.instances.InstanceReader;
import dev.couplet.bench.instances.Seeded;
import java.io.IOException;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Where an instance comes from: the same parameter and options for every verb that reads one. */
final class Inputs {
  private static final String SEEDED = "seeded:";
  private static final String CITIES = "cities:";

  @Parameters(
      paramLabel = "FILE",
      description = {
        "The instance: a Matrix Market file (symmetric coordinate; minimise x'Ax), an OR-Library"
            + " binary quadratic programme (maximise), a weighted edge list 'n m' / 'i j w'"
            + " (maximum cut); or, with rules, OPB (the text of the pseudo-Boolean competitions), a DIMACS graph (--as colour:K or clique), a TSPLIB"
            + " symmetric tour, a QAPLIB quadratic assignment, an OR-Library generalised"
            + " assignment or multi-dimensional knapsack, a job shop. Files compressed with gzip"
            + " are read through. Also seeded:NAME, a published seeded instance such as"
            + " seeded:p3000.1, or seeded:N:DENSITY:SEED; and cities:N:SEED, a tour of invented"
            + " cities."
      })
  private String file = "";

  @Option(
      names = "--as",
      paramLabel = "KIND",
      description = {
        "Read FILE as matrix, quadratic, cut, colour:K (with K colours), clique, tsp, qap, gap,"
            + " knapsack, jobshop or opb, whatever its content looks like."
      })
  private @Nullable String kind;

  @Option(
      names = "--item",
      paramLabel = "K",
      description = "Which problem of a file that holds several, from 1.")
  private @Nullable Integer item;

  Instance read() throws IOException {
    if (file.startsWith(SEEDED)) {
      return Seeded.parse(file.substring(SEEDED.length())).generate();
    }
    if (file.startsWith(CITIES)) {
      return Cities.parse(file.substring(CITIES.length())).generate();
    }
    InstanceReader reader = InstanceReader.standard();
    if (kind != null) {
      reader = reader.as(kind);
    }
    if (item != null) {
      reader = reader.item(item);
    }
    try {
      return reader.read(Path.of(file));
    } catch (InvalidPathException noPath) {
      throw new IllegalArgumentException("'" + file + "' is not the name of a file", noPath);
    }
  }
}
