package dev.couplet.embed;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Ising;
import dev.couplet.host.Faults;
import dev.couplet.host.Host;
import dev.couplet.sampling.End;
import java.util.List;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;

class EmbeddingTest {
  private final Host cell = Host.cells(2, 1, 1);
  private final Guest triangle = Guests.complete(3);

  @Test
  void aTriangleOnASquareTakesFourVertices() {
    Embedding embedding = Embedding.of(triangle, cell, sets(s(0), s(2), s(3, 1)));
    assertEquals(4, embedding.total());
    assertEquals(2, embedding.longest());
    assertEquals(4.0 / 3, embedding.mean());
    assertArrayEquals(new int[] {1, 3}, embedding.set(2).toArray());
    assertEquals(1, embedding.set(2).vertex(0));
    assertTrue(embedding.set(2).contains(3));
    assertFalse(embedding.set(2).contains(2));
    assertEquals(OptionalInt.of(2), embedding.owner(3));
    assertEquals(List.of(), PlainValidator.faults(embedding));
  }

  @Test
  void everyFaultIsNamed() {
    refused(sets(s(0), s(2)), "2 branch sets", "3 vertices");
    refused(sets(s(0), s(), s(3, 1)), "guest vertex 1", "empty");
    refused(sets(s(0), s(2), s(3, 2)), "host vertex 2", "guest vertices 1 and 2");
    refused(sets(s(0), s(2), s(3, 3)), "guest vertex 2", "host vertex 3 twice");
    refused(sets(s(0), s(4), s(3)), "guest vertex 1", "host vertex 4");
    refused(sets(s(0), s(-1), s(3)), "guest vertex 1", "host vertex -1");
    refused(sets(s(0, 1), s(2), s(3)), "guest vertex 0", "not connected", "vertex 1");
    refused(sets(s(0), s(2), s(3)), "guest edge (1, 2)");
  }

  private void refused(List<int[]> sets, String... parts) {
    IllegalArgumentException refused =
        assertThrows(IllegalArgumentException.class, () -> Embedding.of(triangle, cell, sets));
    for (String part : parts) {
      assertTrue(refused.getMessage().contains(part), refused.getMessage());
    }
    assertFalse(PlainValidator.faults(triangle, cell, sets).isEmpty());
  }

  @Test
  void aMissingVertexIsRefused() {
    Host broken = cell.without(Faults.vertices(1));
    IllegalArgumentException refused =
        assertThrows(
            IllegalArgumentException.class,
            () -> Embedding.of(triangle, broken, sets(s(0), s(2), s(3, 1))));
    assertTrue(refused.getMessage().contains("host vertex 1"), refused.getMessage());
  }

  @Test
  void anEmptyGuestFitsAnywhere() {
    Embedding nothing = Embedding.of(Guests.complete(0), cell, List.of());
    assertEquals(0, nothing.total());
    assertEquals(0, nothing.longest());
    assertEquals(0, nothing.mean());
    assertEquals(OptionalInt.empty(), nothing.owner(0));
  }

  @Test
  void equalByContent() {
    Embedding one = Embedding.of(triangle, cell, sets(s(0), s(2), s(3, 1)));
    Embedding same = Embedding.of(triangle, Host.cells(2, 1, 1), sets(s(0), s(2), s(1, 3)));
    Embedding other = Embedding.of(triangle, cell, sets(s(1), s(2), s(3, 0)));
    assertEquals(one, same);
    assertEquals(one.hashCode(), same.hashCode());
    assertNotEquals(one, other);
  }

  @Test
  void trimmingKeepsWhatIsNeeded() {
    Embedding wide = Embedding.of(triangle, Host.cells(3, 1, 1), sets(s(0, 3), s(1, 4), s(2, 5)));
    Embedding trimmed = wide.trimmed();
    assertEquals(4, trimmed.total());
    assertEquals(List.of(), PlainValidator.faults(trimmed));
    assertEquals(trimmed, trimmed.trimmed());
  }

  @Test
  void guestsComeFromForms() {
    Ising form = Ising.builder(4).addPair(0, 2, 1).addPair(3, 2, -1).addLinear(1, 5).build();
    Guest guest = Guest.of(form);
    assertEquals(4, guest.vertices());
    assertEquals(2, guest.edges());
    assertTrue(guest.graph().adjacent(2, 3));
    assertEquals(guest.graph(), Guest.of(form.toQubo()).graph());
    assertEquals(guest.graph(), Guest.of("again", guest.graph().toJGraphT()).graph());
  }

  @Test
  void aFitSaysWhy() {
    Embedding embedding = Embedding.of(triangle, cell, sets(s(0), s(2), s(3, 1)));
    assertSame(embedding, new Fit.Fits(embedding).orThrow());
    Fit impossible = new Fit.Impossible("the guest is larger");
    assertFalse(impossible.fits());
    assertTrue(message(impossible).contains("the guest is larger"));
    Fit notFound = new Fit.NotFound(End.DEADLINE, OptionalInt.of(7));
    assertTrue(message(notFound).contains("DEADLINE"), message(notFound));
    assertTrue(message(notFound).contains("7"), message(notFound));
  }

  private static String message(Fit fit) {
    return assertThrows(IllegalStateException.class, fit::orThrow).getMessage();
  }

  private static List<int[]> sets(int[]... sets) {
    return List.of(sets);
  }

  private static int[] s(int... vertices) {
    return vertices;
  }
}
