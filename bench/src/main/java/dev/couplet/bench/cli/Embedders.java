package dev.couplet.bench.cli;

import dev.couplet.embed.Embedder;
import dev.couplet.embed.best.BestEmbedder;
import dev.couplet.embed.path.PathEmbedder;
import dev.couplet.embed.template.TemplateEmbedder;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Every embedder by its name on the command line. */
final class Embedders {
  /** What {@code fit} uses unless told otherwise. */
  static final String STANDARD = "best";

  private static final Map<String, Embedder> EMBEDDERS = new LinkedHashMap<>();

  static {
    EMBEDDERS.put("best", BestEmbedder.standard());
    EMBEDDERS.put("path", PathEmbedder.standard());
    EMBEDDERS.put("template", TemplateEmbedder.standard());
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
