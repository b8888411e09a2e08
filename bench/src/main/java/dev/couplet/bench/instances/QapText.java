package dev.couplet.bench.instances;

import dev.couplet.bench.models.NumberTable;
import dev.couplet.bench.models.QuadraticAssignment;
import dev.couplet.form.TokenReader;
import java.io.IOException;
import java.util.List;

/**
 * QAPLIB: n, then two matrices of n rows and columns, A and B. The cost of a permutation p is the
 * sum of A(i, j) B(p(i), p(j)) over all ordered pairs, to be minimised.
 *
 * <p>Source: Burkard, Karisch and Rendl, "QAPLIB - a quadratic assignment problem library" (1997).
 */
final class QapText implements Format {
  private static final int LARGEST = 1 << 14;

  /** What the file holds. */
  record Matrices(NumberTable a, NumberTable b) {}

  @Override
  public String kind() {
    return "qap";
  }

  /** Told where a row is a line, as it is in most of the library. */
  @Override
  public boolean recognises(List<String> head) {
    if (!Format.numbersPerLine(head, 1)) {
      return false;
    }
    int n = Format.firstNumber(head.get(0), LARGEST);
    return n > 1 && head.size() > 2 && Format.numbersPerLine(head, 1, n, n);
  }

  @Override
  public Instance read(Source source) throws IOException {
    source.requireSingle();
    Matrices read = read(source.tokens());
    return new Instance.OfModel(
        source.name(), QuadraticAssignment.of(source.name(), read.a(), read.b()).statement());
  }

  static Matrices read(TokenReader text) throws IOException {
    text.seekToken("the size");
    int n = text.integer("the size", 1, LARGEST);
    NumberTable a = NumberList.readTable(text, n, n, "the first matrix");
    NumberTable b = NumberList.readTable(text, n, n, "the second matrix");
    text.endOfLine();
    EntryList.endOfText(text);
    return new Matrices(a, b);
  }
}
