package dev.couplet.bench.instances;

import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;

/** The folder of published instances, named by the system property {@code couplet.data}. */
public final class PublishedData {
  private PublishedData() {}

  /** The folder; the calling test is skipped if there is none. */
  public static Path folder() {
    String property = System.getProperty("couplet.data", "");
    assumeTrue(!property.isEmpty(), "the system property couplet.data names no folder");
    return Path.of(property);
  }

  /** The published values of one family, in the order of the table. */
  public static List<Published> of(String family) {
    Path table = folder().resolve("best.tsv");
    try (var lines = Files.lines(table)) {
      return lines
          .skip(1)
          .map(line -> line.split("\t", -1))
          .filter(cells -> cells[0].equals(family))
          .map(
              cells ->
                  new Published(
                      family,
                      cells[1],
                      cells[2],
                      Integer.parseInt(cells[3]),
                      Double.parseDouble(cells[5]),
                      cells[6]))
          .toList();
    } catch (IOException unreadable) {
      throw new UncheckedIOException(unreadable);
    }
  }

  /** One row: the best value known, and whether it is optimal or best-known. */
  public record Published(
      String family, String name, String file, int size, double best, String status) {
    /** Where the instance stands. */
    public Path path() {
      return folder().resolve(family).resolve(file);
    }
  }
}
