package dev.couplet.bench.instances;

import dev.couplet.form.FormatException;
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
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.Collectors;
import java.util.zip.GZIPInputStream;

/**
 * Reads published instances from files, compressed with gzip or not.
 *
 * <p>The kind of a file is told by its content, unless the caller says it. Time and memory are
 * linear in the length of the file. Immutable, thread-safe.
 */
public final class InstanceReader {
  private static final List<Format> FORMATS =
      List.of(new MatrixText(), new BinaryQuadraticText(), new EdgeListText());

  private static final int HEAD = 1 << 16;
  private static final int HEAD_LINES = 3;

  private final Optional<Format> format;
  private final OptionalInt item;

  private InstanceReader(Optional<Format> format, OptionalInt item) {
    this.format = format;
    this.item = item;
  }

  /** A reader that goes by the content, for files that hold one problem. */
  public static InstanceReader standard() {
    return new InstanceReader(Optional.empty(), OptionalInt.empty());
  }

  /** The names of the kinds of files, for {@link #as}. */
  public static List<String> kinds() {
    return FORMATS.stream().map(Format::kind).toList();
  }

  /**
   * This reader, but the file is of the given kind, whatever it looks like.
   *
   * @throws IllegalArgumentException if there is no such kind, naming those there are
   */
  public InstanceReader as(String kind) {
    for (Format candidate : FORMATS) {
      if (candidate.kind().equals(kind)) {
        return new InstanceReader(Optional.of(candidate), item);
      }
    }
    throw new IllegalArgumentException(
        "there is no kind of file '" + kind + "'; the kinds are " + String.join(", ", kinds()));
  }

  /** This reader, taking one problem of a file that holds several, counted from 1. */
  public InstanceReader item(int number) {
    if (number < 1) {
      throw new IllegalArgumentException("item is " + number + ", items are counted from 1");
    }
    return new InstanceReader(format, OptionalInt.of(number));
  }

  /**
   * Reads a file.
   *
   * @throws FormatException with file, line and column of the first fault
   * @throws IllegalArgumentException if the content does not tell the kind
   * @throws IOException if the file cannot be read, naming the file
   */
  public Instance read(Path file) throws IOException {
    try (BufferedReader reader = open(file)) {
      List<String> head = head(reader);
      Format chosen = format.isPresent() ? format.get() : recognise(file, head);
      return chosen.read(new Source(file.toString(), nameOf(file), reader, item));
    } catch (FileSystemException named) {
      throw named;
    } catch (EOFException cutShort) {
      throw new IOException(file + ": the compressed text is cut short", cutShort);
    } catch (IOException unreadable) {
      throw new IOException(file + ": cannot be read: " + unreadable.getMessage(), unreadable);
    }
  }

  private static Format recognise(Path file, List<String> head) {
    List<Format> matching = FORMATS.stream().filter(f -> f.recognises(head)).toList();
    if (matching.size() == 1) {
      return matching.get(0);
    }
    String candidates =
        (matching.isEmpty() ? FORMATS : matching)
            .stream().map(Format::kind).collect(Collectors.joining(", "));
    throw new IllegalArgumentException(
        file
            + ": the content does not tell what kind of file it is; say --as, one of "
            + candidates);
  }

  private static BufferedReader open(Path file) throws IOException {
    InputStream bytes = new BufferedInputStream(Files.newInputStream(file));
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

  /** The first lines that are not blank; the reader stays at the start. */
  private static List<String> head(BufferedReader reader) throws IOException {
    reader.mark(HEAD);
    char[] start = new char[HEAD];
    int length = 0;
    for (int read = 0; read >= 0 && length < HEAD; length += Math.max(0, read)) {
      read = reader.read(start, length, HEAD - length);
    }
    reader.reset();
    List<String> lines = new ArrayList<>();
    new String(start, 0, length)
        .lines()
        .filter(line -> !line.isBlank())
        .limit(HEAD_LINES)
        .forEach(lines::add);
    return lines;
  }

  /** The file's name without {@code .gz} and without an ending of letters. */
  private static String nameOf(Path file) {
    String name = String.valueOf(file.getFileName());
    if (name.endsWith(".gz")) {
      name = name.substring(0, name.length() - 3);
    }
    return name.replaceFirst("(?<=.)\\.[A-Za-z]+$", "");
  }
}
