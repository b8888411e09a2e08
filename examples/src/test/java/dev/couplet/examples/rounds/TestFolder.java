package dev.couplet.examples.rounds;

import static java.nio.charset.StandardCharsets.UTF_8;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;

/** A folder of CSV files for one test: the invented ones, until they are overwritten. */
record TestFolder(Path path) {
  static TestFolder invented(Path path) {
    TestFolder folder = new TestFolder(path);
    for (String file : RoundsReader.FILES.split(", ")) {
      folder.write(file, invented(file));
    }
    folder.write(RoundsReader.LIBRARY, invented(RoundsReader.LIBRARY));
    return folder;
  }

  static String invented(String file) {
    try (InputStream stream = Rounds.class.getResourceAsStream(file)) {
      return new String(stream.readAllBytes(), UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  TestFolder write(String file, String text) {
    try {
      Files.writeString(path.resolve(file), text);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return this;
  }

  /** Puts one text for another, which must be there. */
  TestFolder replace(String file, String old, String text) {
    String before = invented(file);
    if (!before.contains(old)) {
      throw new IllegalArgumentException(file + " does not hold " + old);
    }
    return write(file, before.replace(old, text));
  }

  TestFolder append(String file, String line) {
    return write(file, invented(file) + line + "\n");
  }

  Outcome run(String... more) {
    String[] args = new String[more.length + 2];
    args[0] = "--data";
    args[1] = path.toString();
    System.arraycopy(more, 0, args, 2, more.length);
    return Outcome.of(args);
  }
}
