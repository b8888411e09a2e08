package dev.couplet.bench.instances;

import dev.couplet.bench.models.Clique;
import dev.couplet.host.CompactGraph;
import java.io.IOException;
import java.util.List;

/** A DIMACS graph whose largest clique is sought. */
final class CliqueText implements Format {
  @Override
  public String kind() {
    return "clique";
  }

  @Override
  public boolean recognises(List<String> head) {
    return DimacsGraph.recognises(head);
  }

  @Override
  public Instance read(Source source) throws IOException {
    source.requireSingle();
    CompactGraph graph = DimacsGraph.read(source.tokens());
    return new Instance.OfModel(source.name(), Clique.of(source.name(), graph).statement());
  }
}
