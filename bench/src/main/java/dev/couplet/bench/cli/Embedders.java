package dev.couplet.bench.cli;

import dev.couplet.embed.Embedder;
import dev.couplet.embed.path.PathEmbedder;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Every embedder by its name on the command line. */
final class Embedders {
  /** What {@code fit} uses unless told otherwise. */
  static final String STANDARD = "path";

  private static final Map<String, Embedder> EMBEDDERS = new LinkedHashMap<>();

  static {
    EMBEDDERS.put("path", PathEmbedder.standard());
  }

  private Embedders() {}

  /** The names for {@code fit}. */
  static final class Names implements Iterable<String> {
    @Override
    public Iterator<String> iterator() {
      return List.copyOf(EMBEDDERS.keySet()).iterator();
    }
  }

  /**
   * The embedder of a name.
   *
   * @throws IllegalArgumentException if there is none, naming those there are
   */
  static Embedder named(String name) {
    return Methods.known(EMBEDDERS, name);
  }
}
