package dev.couplet.bench.instances;

import java.io.BufferedInputStream;
import java.io.BufferedReader;
import java.io.EOFException;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.zip.GZIPInputStream;

/** A file of text, compressed with gzip or not. */
record TextFile(Path path) {
  /** What is done with the text. */
  @FunctionalInterface
  interface Reading<T> {
    T read(BufferedReader text) throws IOException;
  }

  /**
   * Opens the file, reads and closes it.
   *
   * @throws IOException if that fails, naming the file
   */
  <T> T read(Reading<T> reading) throws IOException {
    try (BufferedReader text = open()) {
      return reading.read(text);
    } catch (FileSystemException named) {
      throw named;
    } catch (EOFException cutShort) {
      throw new IOException(path + ": the compressed text is cut short", cutShort);
    } catch (IOException unreadable) {
      throw new IOException(path + ": cannot be read: " + unreadable.getMessage(), unreadable);
    }
  }

  private BufferedReader open() throws IOException {
    InputStream bytes = new BufferedInputStream(Files.newInputStream(path));
    try {
      bytes.mark(2);
      boolean compressed = bytes.read() == 0x1f && bytes.read() == 0x8b;
      bytes.reset();
      InputStream plain = compressed ? new GZIPInputStream(bytes, 1 << 16) : bytes;
      return new BufferedReader(new InputStreamReader(plain, StandardCharsets.UTF_8));
    } catch (IOException unreadable) {
      bytes.close();
      throw unreadable;
    }
  }

  /** The file's name without {@code .gz} and without an ending of letters. */
  String name() {
    String name = String.valueOf(path.getFileName());
    if (name.endsWith(".gz")) {
      name = name.substring(0, name.length() - 3);
    }
    return name.replaceFirst("(?<=.)\\.[A-Za-z]+$", "");
  }
}
