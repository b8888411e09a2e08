package dev.couplet.bench.instances;

import static dev.couplet.bench.instances.Shapes.decimal;
import static dev.couplet.bench.instances.Shapes.whole;

import dev.couplet.embed.Guest;
import dev.couplet.embed.Guests;
import dev.couplet.host.CompactGraph;
import dev.couplet.host.EdgeList;
import dev.couplet.host.Host;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.Optional;
import java.util.Set;
import java.util.function.LongFunction;

/**
 * Guests and hosts by the texts that stand for them on a command line: a shape like {@code
 * complete:12} or {@code cells:4@10x10}, or the name of a file.
 *
 * <p>A file holds an edge list, {@code n m} and m lines {@code i j} with vertices from 1, weights
 * behind them or not. That of a guest can also be an instance of another kind, whose pairs are the
 * edges. Compressed files are read through.
 */
public final class GraphReader {
  private static final Shapes<LongFunction<Guest>> GUESTS =
      new Shapes<LongFunction<Guest>>()
          .add("complete:N", n -> seed -> Guests.complete(whole(n, 1)))
          .add("bipartite:AxB", n -> seed -> Guests.bipartite(whole(n, 1), whole(n, 2)))
          .add("grid:RxC", n -> seed -> Guests.grid(whole(n, 1), whole(n, 2)))
          .add("regular:D:N", n -> seed -> Guests.regular(whole(n, 1), whole(n, 2), seed))
          .add("random:N:P", n -> seed -> Guests.random(whole(n, 1), decimal(n, 2), seed))
          .add("cycle:N", n -> seed -> Guests.cycle(whole(n, 1)));

  private static final Shapes<Host> HOSTS =
      new Shapes<Host>()
          .add("cells:K@RxC", n -> Host.cells(whole(n, 1), whole(n, 2), whole(n, 3)))
          .add("king:RxC", n -> Host.king(whole(n, 1), whole(n, 2)))
          .add("square:RxC", n -> Host.square(whole(n, 1), whole(n, 2)))
          .add("cubic:XxYxZ", n -> Host.cubic(whole(n, 1), whole(n, 2), whole(n, 3)));

  private static final Set<String> FORMS = Set.of("matrix", "quadratic");

  private GraphReader() {}

  /** How the shapes of guests are written. */
  public static String guests() {
    return GUESTS.usages();
  }

  /** How the shapes of hosts are written. */
  public static String hosts() {
    return HOSTS.usages();
  }

  /**
   * The guest that a text stands for, under the name of that text or file.
   *
   * @param seed the seed of random guests
   * @throws IllegalArgumentException if the text is neither a shape nor the name of a file, or the
   *     file is not as it should be
   * @throws IOException if the file cannot be read, naming it
   */
  public static Guest guest(String text, long seed) throws IOException {
    Optional<LongFunction<Guest>> shape = GUESTS.parse(text);
    if (shape.isPresent()) {
      return new Guest(text, shape.get().apply(seed).graph());
    }
    Path path = file("guest", text, guests());
    String name = new TextFile(path).name();
    if (InstanceReader.kindOf(path).filter(FORMS::contains).isPresent()) {
      return new Guest(name, Guest.of(InstanceReader.standard().readForm(path).form()).graph());
    }
    return new Guest(name, edges(path));
  }

  /**
   * The host that a text stands for, under the name of that text or file.
   *
   * @throws IllegalArgumentException if the text is neither a shape nor the name of a file, or the
   *     file is not as it should be
   * @throws IOException if the file cannot be read, naming it
   */
  public static Host host(String text) throws IOException {
    Optional<Host> shape = HOSTS.parse(text);
    if (shape.isPresent()) {
      return shape.get();
    }
    Path path = file("host", text, hosts());
    return Host.of(new TextFile(path).name(), edges(path));
  }

  private static Path file(String what, String text, String usages) {
    Path path;
    try {
      path = Path.of(text);
    } catch (InvalidPathException noPath) {
      throw unknown(what, text, usages);
    }
    if (!Files.exists(path)) {
      throw unknown(what, text, usages);
    }
    return path;
  }

  private static IllegalArgumentException unknown(String what, String text, String usages) {
    return new IllegalArgumentException(
        "'" + text + "' is no file and no " + what + "; write one of " + usages);
  }

  private static CompactGraph edges(Path path) throws IOException {
    return new TextFile(path).read(text -> EdgeList.read(path.toString(), text));
  }
}
