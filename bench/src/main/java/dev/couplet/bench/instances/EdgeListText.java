package dev.couplet.bench.instances;

import dev.couplet.bench.instances.EntryList.Places;
import dev.couplet.form.Qubo;
import dev.couplet.form.TokenReader;
import dev.couplet.model.Statement.Sense;
import java.io.IOException;
import java.util.List;

/**
 * A weighted edge list: {@code n m}, then m lines {@code i j w} with vertices from 1, every edge
 * once. The maximum cut is sought: the vertices in two parts, so that the edges between them weigh
 * as much as possible.
 *
 * <p>Common practice; the layout of the published maximum cut instances of Helmberg and Rendl, "A
 * spectral bundle method for semidefinite programming" (2000).
 */
final class EdgeListText implements Format {
  @Override
  public String kind() {
    return "cut";
  }

  @Override
  public boolean recognises(List<String> head) {
    return Format.numbersPerLine(head, 2, 3);
  }

  @Override
  public Instance read(Source source) throws IOException {
    source.requireSingle();
    TokenReader text = source.tokens();
    EntryList edges = EntryList.readSizes(text, Places.EDGES);
    Qubo.Builder form = Qubo.builder(edges.size());
    edges.forEach(
        text,
        (i, j, w) -> form.addLinear(i - 1, -w).addLinear(j - 1, -w).addPair(i - 1, j - 1, 2 * w));
    Instance instance =
        new Instance.OfForm(source.name(), EntryList.build(text, form), Sense.MAXIMIZE);
    EntryList.endOfText(text);
    return instance;
  }
}
