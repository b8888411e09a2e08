package dev.couplet.consumer;

import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;

/** Runs a Java machine of its own, of the version that runs the tests. */
public final class ChildJvm {
  private static final long PATIENCE_SECONDS = 120;

  private ChildJvm() {}

  /**
   * How it ended.
   *
   * @param status its exit status
   * @param output what it wrote, errors among it
   */
  public record Outcome(int status, String output) {}

  /** Starts it with the given arguments and waits for its end. */
  public static Outcome run(Path folder, String... arguments)
      throws IOException, InterruptedException {
    List<String> command = new ArrayList<>();
    command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
    command.addAll(List.of(arguments));
    Path output = Files.createTempFile(folder, "output", ".txt");
    Process process =
        new ProcessBuilder(command)
            .directory(folder.toFile())
            .redirectErrorStream(true)
            .redirectOutput(output.toFile())
            .start();
    if (!process.waitFor(PATIENCE_SECONDS, TimeUnit.SECONDS)) {
      process.destroyForcibly();
      throw new AssertionError("still running after " + PATIENCE_SECONDS + " s: " + command);
    }
    return new Outcome(process.exitValue(), Files.readString(output, StandardCharsets.UTF_8));
  }

  /** Where a class was loaded from: a folder or a jar. */
  public static Path home(Class<?> type) throws URISyntaxException {
    return Path.of(type.getProtectionDomain().getCodeSource().getLocation().toURI());
  }
}
