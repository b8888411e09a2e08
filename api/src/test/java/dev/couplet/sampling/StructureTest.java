package dev.couplet.sampling;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

class StructureTest {
  private static String refusal(List<List<Integer>> sets) {
    return assertThrows(IllegalArgumentException.class, () -> Structure.exactlyOne(sets))
        .getMessage();
  }

  @Test
  void setsAreKeptAsTheyAre() {
    List<Integer> first = new ArrayList<>(List.of(4, 1));
    List<List<Integer>> sets = new ArrayList<>(List.of(first, List.of(0)));
    Structure structure = Structure.exactlyOne(sets);
    first.set(0, 9);
    sets.clear();
    assertEquals(List.of(List.of(4, 1), List.of(0)), structure.exactlyOne());
    assertThrows(UnsupportedOperationException.class, () -> structure.exactlyOne().clear());
    assertThrows(UnsupportedOperationException.class, () -> structure.exactlyOne().get(0).clear());
    assertEquals("Structure(2 exactly-one sets)", structure.toString());
  }

  @Test
  void setsThatMeanNothingAreRefused() {
    assertEquals(
        "exactly-one set 1 is empty; leave it out", refusal(List.of(List.of(0), List.of())));
    assertEquals(
        "bit -1 of exactly-one set 0 is negative or used before", refusal(List.of(List.of(-1))));
    assertEquals(
        "bit 2 of exactly-one set 1 is negative or used before",
        refusal(List.of(List.of(2, 3), List.of(1, 2))));
    assertEquals(
        "bit 2 of exactly-one set 0 is negative or used before", refusal(List.of(List.of(2, 2))));
  }

  @Test
  void equalSetsMakeEqualStructures() {
    Structure structure = Structure.exactlyOne(List.of(List.of(0, 1)));
    assertEquals(structure, Structure.exactlyOne(List.of(List.of(0, 1))));
    assertEquals(structure.hashCode(), Structure.exactlyOne(List.of(List.of(0, 1))).hashCode());
    assertNotEquals(structure, Structure.none());
    assertEquals(Structure.none(), Structure.exactlyOne(List.of()));
  }

  @Test
  void everyBitLiesWithinTheForm() {
    Structure structure = Structure.exactlyOne(List.of(List.of(3, 1), List.of(0, 5)));
    structure.requireWithin(6);
    assertThrows(IllegalArgumentException.class, () -> structure.requireWithin(5));
    Structure.none().requireWithin(0);
  }
}
