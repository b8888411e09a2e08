package dev.couplet.bench.instances;

import dev.couplet.bench.instances.EntryList.Places;
import dev.couplet.form.Qubo;
import dev.couplet.form.TokenReader;
import dev.couplet.model.Statement.Sense;
import java.io.IOException;
import java.util.List;

/**
 * OR-Library binary quadratic programmes: the number of problems, then for each {@code n m} and m
 * lines {@code i j q} with {@code 1 <= i <= j <= n}.
 *
 * <p>To be maximised, summed over all ordered pairs: an entry off the diagonal counts twice.
 *
 * <p>Source: Beasley, "Heuristic algorithms for the unconstrained binary quadratic programming
 * problem" (1998).
 */
final class BinaryQuadraticText implements Format {
  @Override
  public String kind() {
    return "quadratic";
  }

  @Override
  public boolean recognises(List<String> head) {
    return Format.numbersPerLine(head, 1, 2, 3);
  }

  @Override
  public Instance read(Source source) throws IOException {
    TokenReader text = source.tokens();
    text.seekToken("the number of problems");
    int problems = text.integer("the number of problems", 1, 1_000_000);
    int picked = source.pick(text, problems);
    text.endOfLine();
    Qubo form = Qubo.builder(0).build();
    for (int p = 1; p <= problems; p++) {
      Qubo read = readProblem(text);
      if (p == picked) {
        form = read;
      }
    }
    EntryList.endOfText(text);
    return new Instance.OfForm(source.nameOf(picked, problems), form, Sense.MAXIMIZE);
  }

  private static Qubo readProblem(TokenReader text) throws IOException {
    EntryList entries = EntryList.readSizes(text, Places.UPPER_TRIANGLE);
    Qubo.Builder form = Qubo.builder(entries.size());
    entries.forEach(
        text,
        (i, j, q) -> {
          if (i == j) {
            form.addLinear(i - 1, -q);
          } else {
            form.addPair(i - 1, j - 1, -2 * q);
          }
        });
    return EntryList.build(text, form);
  }
}
