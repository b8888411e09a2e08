package dev.couplet.examples.rounds;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;

/**
 * Where the CSV files are read from: a directory, or else the invented data that comes with the
 * example.
 */
record Folder(Optional<Path> directory) {
  static Folder invented() {
    return new Folder(Optional.empty());
  }

  static Folder at(Path directory) {
    return new Folder(Optional.of(directory));
  }

  /** How messages name a file. */
  String nameOf(String file) {
    return directory.map(path -> path.resolve(file).toString()).orElse(file);
  }

  /** The text of a file, in UTF-8, without the mark that some editors put before it. */
  String text(String file) {
    try (InputStream stream = open(file);
        BufferedReader reader =
            new BufferedReader(
                new InputStreamReader(stream, StandardCharsets.UTF_8.newDecoder()))) {
      StringBuilder text = new StringBuilder();
      char[] part = new char[8192];
      for (int read = reader.read(part); read >= 0; read = reader.read(part)) {
        text.append(part, 0, read);
      }
      return text.length() > 0 && text.charAt(0) == '\uFEFF' ? text.substring(1) : text.toString();
    } catch (CharacterCodingException e) {
      throw new BadInput(nameOf(file) + ": the file is not text in UTF-8; save it as UTF-8");
    } catch (IOException e) {
      throw new BadInput(nameOf(file) + ": the file cannot be read");
    }
  }

  /** Whether a file is there, for those that may be missing. */
  boolean holds(String file) {
    return directory
        .map(path -> Files.exists(path.resolve(file)))
        .orElse(Folder.class.getResource(file) != null);
  }

  private InputStream open(String file) throws IOException {
    if (directory.isPresent()) {
      Path path = directory.get().resolve(file);
      if (!Files.isRegularFile(path)) {
        throw new BadInput(
            path + ": there is no such file; a folder of rounds holds " + RoundsReader.FILES);
      }
      return Files.newInputStream(path);
    }
    InputStream stream = Folder.class.getResourceAsStream(file);
    if (stream == null) {
      throw new IOException(file + " is not on the class path");
    }
    return stream;
  }
}
