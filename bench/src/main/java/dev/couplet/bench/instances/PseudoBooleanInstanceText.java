package dev.couplet.bench.instances;

import dev.couplet.model.PseudoBooleanText;
import java.io.IOException;
import java.util.List;
import java.util.regex.Pattern;

/** OPB, the text of the pseudo-Boolean competitions. */
final class PseudoBooleanInstanceText implements Format {
  private static final Pattern BEGINNING =
      Pattern.compile("\\* *#variable=.*|\\s*min:.*|\\s*[-+]?\\d+\\s+~?x\\d+.*");

  @Override
  public String kind() {
    return "opb";
  }

  @Override
  public boolean recognises(List<String> head) {
    return head.stream().anyMatch(line -> BEGINNING.matcher(line).matches());
  }

  @Override
  public Instance read(Source source) throws IOException {
    source.requireSingle();
    return new Instance.OfModel(
        source.name(), PseudoBooleanText.read(source.path(), source.reader()).snapshot());
  }
}
