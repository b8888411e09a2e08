package dev.couplet.bench.instances;

import dev.couplet.form.MatrixMarket;
import dev.couplet.model.Statement.Sense;
import java.io.IOException;
import java.util.List;
import java.util.Locale;

/** Matrix Market, symmetric coordinate: minimise x'Ax. */
final class MatrixText implements Format {
  @Override
  public String kind() {
    return "matrix";
  }

  @Override
  public boolean recognises(List<String> head) {
    return !head.isEmpty() && head.get(0).toLowerCase(Locale.ROOT).startsWith("%%matrixmarket");
  }

  @Override
  public Instance read(Source source) throws IOException {
    source.requireSingle();
    return new Instance.OfForm(
        source.name(), MatrixMarket.read(source.path(), source.reader()), Sense.MINIMIZE);
  }
}
