package dev.couplet.bench.instances;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.PublishedData.Published;
import dev.couplet.form.Qubo.PairVisitor;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class SeededTest {
  /**
   * The published table says, of every instance: density D seed S fnv H pairs P offdiag Q first and
   * the first six entries.
   */
  @Test
  void everyPublishedInstanceIsGeneratedEntryByEntry() {
    List<Published> rows = PublishedData.of("seeded");
    assertEquals(
        rows.stream().map(Published::name).toList(),
        Seeded.published().stream().map(Seeded::name).toList());
    for (int k = 0; k < rows.size(); k++) {
      assertEquals(rows.get(k).file(), description(Seeded.published().get(k)), rows.get(k).name());
    }
  }

  private static String description(Seeded seeded) {
    Fingerprint print = new Fingerprint(seeded.size());
    seeded.forEachEntry(print);
    return "density %d seed %d fnv %016x pairs %d offdiag %d first %s"
        .formatted(
            seeded.density(),
            seeded.seed(),
            print.finish(),
            print.pairs,
            print.sum,
            String.join(" ", print.first.subList(0, 6)));
  }

  /** FNV-1a over the upper triangle, row by row, zeros included. */
  private static final class Fingerprint implements PairVisitor {
    private final int size;
    private final List<String> first;
    private long hash = 1469598103934665603L;
    private int row;
    private int column;
    private long pairs;
    private long sum;

    Fingerprint(int size) {
      this.size = size;
      this.first = new ArrayList<>(Collections.nCopies(size, "0"));
    }

    @Override
    public void visit(int i, int j, double q) {
      while (row < i || column < j) {
        step(0);
      }
      if (i == 0) {
        first.set(j, Integer.toString((int) q));
      }
      if (i != j) {
        pairs++;
        sum += (long) q;
      }
      step((int) q);
    }

    long finish() {
      while (row < size) {
        step(0);
      }
      return hash;
    }

    private void step(int q) {
      hash = (hash ^ Integer.toUnsignedLong(q)) * 1099511628211L;
      if (++column == size) {
        column = ++row;
      }
    }
  }

  /**
   * Worked out by hand from seed 1: the states are 16807, 282475249, 1622650073, ... (Park and
   * Miller, "Random number generators: good ones are hard to find", 1988), so u is 0.0000078,
   * 0.1315378, 0.7556053.
   */
  @Test
  void theFirstEntriesOfSeedOne() {
    List<String> entries = new ArrayList<>();
    new Seeded("two", 2, 100, 1)
        .forEachEntry((i, j, q) -> entries.add(i + " " + j + " " + (int) q));
    // 201 u: 0.0016 for the diagonal; a draw for the choice; 151.9 for the pair; then 92.2.
    assertEquals(List.of("0 0 -100", "0 1 51", "1 1 -8"), entries);
  }

  @Test
  void entriesStandInTheFormWithTheirSignTurned() {
    Seeded seeded = Seeded.parse("40:50:7");
    Instance.OfForm instance = seeded.generate();
    assertEquals("40:50:7", instance.name());
    int[] nonZero = {0};
    seeded.forEachEntry(
        (i, j, q) -> {
          assertEquals(
              -q, i == j ? instance.form().linear(i) : instance.form().pair(i, j) / 2, 0.0);
          nonZero[0] += i != j && q != 0 ? 1 : 0;
        });
    assertEquals(nonZero[0], instance.form().pairs());
    assertTrue(nonZero[0] > 300 && nonZero[0] < 480, "about half of 780 pairs: " + nonZero[0]);
  }

  @Test
  void publishedNamesAreFound() {
    assertEquals(new Seeded("p5000.2", 5000, 80, 52000), Seeded.parse("p5000.2"));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"p5000.9", "", "10:50", "10:101:1", "10:50:0", "10:50:2147483647", "a:1:1"})
  void otherNamesAreRefused(String text) {
    assertThrows(IllegalArgumentException.class, () -> Seeded.parse(text));
  }
}
