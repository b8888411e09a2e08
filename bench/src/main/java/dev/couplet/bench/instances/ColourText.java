package dev.couplet.bench.instances;

import dev.couplet.bench.models.Colouring;
import dev.couplet.host.CompactGraph;
import java.io.IOException;
import java.util.List;
import java.util.Optional;

/** A DIMACS graph that is to be coloured with a number of colours, which the kind names. */
final class ColourText implements Format {
  private static final String PREFIX = "colour:";

  private final int colours;

  private ColourText(int colours) {
    this.colours = colours;
  }

  /** The kind before the number of colours is known; never read by itself. */
  static ColourText unnumbered() {
    return new ColourText(0);
  }

  @Override
  public String kind() {
    return PREFIX + (colours == 0 ? "K" : Integer.toString(colours));
  }

  @Override
  public Optional<Format> named(String kind) {
    return kind.matches(PREFIX + "[1-9]\\d{0,5}")
        ? Optional.of(new ColourText(Integer.parseInt(kind.substring(PREFIX.length()))))
        : Optional.empty();
  }

  @Override
  public boolean recognises(List<String> head) {
    return DimacsGraph.recognises(head);
  }

  @Override
  public Instance read(Source source) throws IOException {
    source.requireSingle();
    CompactGraph graph = DimacsGraph.read(source.tokens());
    return new Instance.OfModel(
        source.name(), Colouring.of(source.name(), graph, colours).statement());
  }
}
