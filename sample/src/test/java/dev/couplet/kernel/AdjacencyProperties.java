package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.couplet.form.Qubo;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class AdjacencyProperties {
  @Property(tries = 200)
  void rowsHoldEveryPairTwiceAndNothingElse(
      @ForAll @IntRange(max = 20) int size,
      @ForAll @IntRange(max = 4) int fifths,
      @ForAll long seed) {
    Qubo form = Forms.integers(size, fifths / 4.0, 9, seed);
    Adjacency rows = Adjacency.of(form);
    assertEquals(size, rows.size());
    assertEquals(form.pairs(), rows.pairs());
    assertEquals(2 * form.pairs(), rows.start()[size]);
    for (int i = 0; i < size; i++) {
      assertEquals(form.linear(i), rows.linear()[i]);
      double magnitude = Math.abs(form.linear(i));
      int place = rows.start()[i];
      for (int j = 0; j < size; j++) {
        double pair = i == j ? 0 : form.pair(i, j);
        magnitude += Math.abs(pair);
        if (pair != 0) {
          assertEquals(j, rows.neighbour()[place]);
          assertEquals(pair, rows.weight()[place++]);
        }
      }
      assertEquals(rows.start()[i + 1], place);
      assertEquals(magnitude, rows.magnitude(i));
    }
  }
}
