package dev.couplet.bench.instances;

import dev.couplet.form.FormatException;
import java.io.BufferedReader;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.Collectors;

/**
 * Reads published instances from files, compressed with gzip or not.
 *
 * <p>The kind of a file is told by its content, unless the caller says it. Time and memory are
 * linear in the length of the file. Immutable, thread-safe.
 */
public final class InstanceReader {
  private static final List<Format> FORMATS =
      List.of(
          new MatrixText(),
          new BinaryQuadraticText(),
          new EdgeListText(),
          ColourText.unnumbered(),
          new CliqueText(),
          new TspText(),
          new QapText(),
          new GapText(),
          new KnapsackText(),
          new JobShopText(),
          new PseudoBooleanInstanceText());

  private static final int HEAD = 1 << 16;
  private static final int HEAD_LINES = 100;

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
      Optional<Format> named = candidate.named(kind);
      if (named.isPresent()) {
        return new InstanceReader(named, item);
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
  public Instance read(Path path) throws IOException {
    TextFile file = new TextFile(path);
    return file.read(
        text -> {
          Format chosen = format.isPresent() ? format.get() : recognise(path, head(text));
          return chosen.read(new Source(path.toString(), file.name(), text, item));
        });
  }

  /**
   * Reads a file whose problem is a form as it stands.
   *
   * @throws FormatException with file, line and column of the first fault
   * @throws IllegalArgumentException if the content does not tell the kind, or the problem has
   *     rules
   * @throws IOException if the file cannot be read, naming the file
   */
  public Instance.OfForm readForm(Path path) throws IOException {
    if (read(path) instanceof Instance.OfForm form) {
      return form;
    }
    throw new IllegalArgumentException(
        path + ": the problem has rules, a form is needed here; lower it first");
  }

  /**
   * The kind of a file, if its content tells it.
   *
   * @throws IOException if the file cannot be read, naming the file
   */
  public static Optional<String> kindOf(Path path) throws IOException {
    List<Format> matching = new TextFile(path).read(text -> matching(head(text)));
    return matching.size() == 1 ? Optional.of(matching.get(0).kind()) : Optional.empty();
  }

  private static List<Format> matching(List<String> head) {
    return FORMATS.stream().filter(f -> f.recognises(head)).toList();
  }

  private static Format recognise(Path file, List<String> head) {
    List<Format> matching = matching(head);
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
}
