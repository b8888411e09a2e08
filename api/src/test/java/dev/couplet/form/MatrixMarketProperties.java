package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.io.StringReader;
import java.math.BigDecimal;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;

class MatrixMarketProperties {
  @Provide
  Arbitrary<Entries> entries() {
    return Entries.upTo(7);
  }

  private static String written(Qubo form) throws IOException {
    StringBuilder text = new StringBuilder();
    MatrixMarket.write(form, text);
    return text.toString();
  }

  @Property
  void writingAndReadingGivesAnEqualForm(@ForAll("entries") Entries entries) throws IOException {
    Qubo form = entries.qubo();
    assertEquals(form, MatrixMarket.read("", new StringReader(written(form))));
  }

  /** Energies of the text, taken apart here: x'Ax over the lower triangle, each place twice. */
  @Property
  void theTextMeansTheSameMatrix(@ForAll("entries") Entries entries) throws IOException {
    Qubo form = entries.qubo();
    String[] lines = written(form).split("\n");
    for (State state : Entries.states(Math.min(4, form.size()))) {
      State whole = State.parse(state.toText() + "1".repeat(form.size() - state.size()));
      BigDecimal sum = new BigDecimal(form.constant());
      int sizes = lines[1].startsWith("%") ? 2 : 1;
      for (int line = sizes + 1; line < lines.length; line++) {
        String[] words = lines[line].split(" ");
        int row = Integer.parseInt(words[0]) - 1;
        int column = Integer.parseInt(words[1]) - 1;
        if (whole.get(row) && whole.get(column)) {
          double value = Double.parseDouble(words[2]) * (row == column ? 1 : 2);
          sum = sum.add(new BigDecimal(value));
        }
      }
      assertEquals(sum.doubleValue(), form.value(whole), 100 * 0x1p-53 * form.magnitude());
    }
  }
}
