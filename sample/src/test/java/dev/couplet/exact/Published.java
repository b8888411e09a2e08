package dev.couplet.exact;

import static org.junit.jupiter.api.Assumptions.assumeTrue;

import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Scanner;
import java.util.zip.GZIPInputStream;

/**
 * Published instances, read from the folder that the system property {@code couplet.data} names;
 * tests that need them are skipped without it.
 */
public final class Published {
  private Published() {}

  private static Scanner open(String file) {
    String folder = System.getProperty("couplet.data");
    assumeTrue(folder != null, "couplet.data is not set");
    Path path = Path.of(folder, file);
    try {
      InputStream in = Files.newInputStream(path);
      return new Scanner(
          file.endsWith(".gz") ? new GZIPInputStream(in) : in, StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /**
   * An OR-Library binary quadratic programme, negated: its minimum is minus the published value.
   */
  public static Qubo binaryQuadratic(String file) {
    try (Scanner in = open("bqp/" + file)) {
      int problems = in.nextInt();
      assumeTrue(problems == 1);
      Qubo.Builder form = Qubo.builder(in.nextInt());
      for (int entries = in.nextInt(); entries > 0; entries--) {
        int i = in.nextInt() - 1;
        int j = in.nextInt() - 1;
        double value = in.nextDouble();
        if (i == j) {
          form.addLinear(i, -value);
        } else {
          form.addPair(i, j, -2 * value);
        }
      }
      return form.build();
    }
  }

  /**
   * A weighted graph as spins: the sum of w s s, whose minimum is the sum of w minus twice the cut.
   */
  public static Ising graph(String file) {
    try (Scanner in = open(file)) {
      Ising.Builder form = Ising.builder(in.nextInt());
      for (int edges = in.nextInt(); edges > 0; edges--) {
        int i = in.nextInt() - 1;
        form.addPair(i, in.nextInt() - 1, in.nextDouble());
      }
      return form.build();
    }
  }

  /** The sum of the weights of a graph. */
  public static double weight(Ising graph) {
    double[] sum = {0};
    graph.forEachPair((i, j, value) -> sum[0] += value);
    return sum[0];
  }
}
