package dev.couplet.embed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.host.Faults;
import dev.couplet.host.Host;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;

class EmbeddingProperties {
  /** Random sets on a small host, some valid and most not: the two validators agree. */
  @Property(tries = 2000)
  void theTwoValidatorsAgree(@ForAll long seed, @ForAll @IntRange(min = 1, max = 4) int guests) {
    SplittableRandom random = new SplittableRandom(seed);
    Host whole = Host.cells(2, 2, 1);
    Host host = whole.without(Faults.seeded(whole, 0.1, 0.1, random.nextLong()));
    Guest guest = Guests.random(guests, 0.5, random.nextLong());
    List<int[]> sets = new ArrayList<>();
    for (int g = 0; g < guests; g++) {
      sets.add(random.ints(1 + random.nextInt(2), 0, host.vertices()).toArray());
    }
    assertEquals(PlainValidator.faults(guest, host, sets).isEmpty(), accepted(guest, host, sets));
  }

  private static boolean accepted(Guest guest, Host host, List<int[]> sets) {
    try {
      return Embedding.of(guest, host, sets).total() > 0;
    } catch (IllegalArgumentException refused) {
      return false;
    }
  }

  /** Bands of a king's lattice: wasteful sets that meet all along. */
  @Property
  void trimmedIsValidSmallerAndFinal(@ForAll @IntRange(min = 2, max = 7) int bands) {
    Guest path = new Guest("path", Guests.grid(1, bands).graph());
    List<int[]> sets = new ArrayList<>();
    for (int g = 0; g < bands; g++) {
      sets.add(IntStream.range(12 * g, 12 * g + 12).toArray());
    }
    Embedding wide = Embedding.of(path, Host.king(2 * bands, 6), sets);
    Embedding trimmed = wide.trimmed();
    assertEquals(List.of(), PlainValidator.faults(trimmed));
    assertTrue(trimmed.total() < wide.total());
    assertEquals(trimmed, trimmed.trimmed());
  }
}
