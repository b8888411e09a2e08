package dev.couplet.bench.instances;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.embed.Guest;
import dev.couplet.form.FormatException;
import dev.couplet.host.Host;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class GraphReaderTest {
  @TempDir Path folder;

  /** Numbers of vertices and edges from the definitions of the graphs. */
  @ParameterizedTest
  @CsvSource({
    "complete:12, 12, 66",
    "complete:0, 0, 0",
    "bipartite:3x5, 8, 15",
    "grid:4x6, 24, 38",
    "regular:3:100, 100, 150",
    "random:30:1, 30, 435",
    "random:30:0.0, 30, 0",
    "cycle:7, 7, 7",
  })
  void guestsAreMadeAsTheirNamesSay(String text, int vertices, int edges) throws IOException {
    Guest guest = GraphReader.guest(text, 1);
    assertEquals(text, guest.name());
    assertEquals(vertices, guest.vertices());
    assertEquals(edges, guest.edges());
  }

  /** For cells: k k R C inside, k (R - 1) C upright, k R (C - 1) level. */
  @ParameterizedTest
  @CsvSource({
    "cells:4@10x10, 800, 2320",
    "cells:2@1x3, 12, 16",
    "king:3x4, 12, 29",
    "square:3x4, 12, 17",
    "cubic:2x3x4, 24, 46",
  })
  void hostsAreMadeAsTheirNamesSay(String text, int vertices, int edges) throws IOException {
    Host host = GraphReader.host(text);
    assertEquals(text, host.name());
    assertEquals(vertices, host.vertices());
    assertEquals(edges, host.edges());
  }

  @Test
  void theSeedDecidesRandomGuests() throws IOException {
    for (String text : new String[] {"regular:3:20", "random:20:.3"}) {
      assertEquals(GraphReader.guest(text, 5).graph(), GraphReader.guest(text, 5).graph());
      assertNotEquals(GraphReader.guest(text, 5).graph(), GraphReader.guest(text, 6).graph());
    }
  }

  @Test
  void filesOfEdgesAreGuestsAndHosts() throws IOException {
    String file = write("ring.txt", "4 4\n1 2\n2 3 7.5\n3 4\n4 1\n");
    assertEquals(GraphReader.guest("cycle:4", 1).graph(), GraphReader.guest(file, 1).graph());
    assertEquals(GraphReader.guest("cycle:4", 1).graph(), GraphReader.host(file).graph());
    assertEquals("ring", GraphReader.guest(file, 1).name());
    assertEquals("ring", GraphReader.host(file).name());
  }

  @Test
  void instancesAreGuestsToo() throws IOException {
    String matrix =
        "%%MatrixMarket matrix coordinate real symmetric\n3 3 3\n1 1 2\n2 1 1\n3 2 -4\n";
    String quadratic = "1\n3 3\n1 1 2\n1 2 1\n2 3 -4\n";
    for (String text : new String[] {matrix, quadratic}) {
      Guest guest = GraphReader.guest(write("form.txt", text), 1);
      assertEquals(2, guest.edges());
      assertTrue(guest.graph().adjacent(0, 1) && guest.graph().adjacent(1, 2));
    }
  }

  @Test
  void faultsInFilesAreLocated() throws IOException {
    String file = write("bad.txt", "4 2\n1 2\n2 5\n");
    FormatException fault = assertThrows(FormatException.class, () -> GraphReader.host(file));
    assertEquals(3, fault.line());
    assertEquals(3, fault.column());
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '"',
      value = {
        "complete:x | 'complete:x' is not written like complete:N",
        "grid:3     | 'grid:3' is not written like grid:RxC",
        "random:3:x | 'random:3:x' is not written like random:N:P",
        "nothing    | 'nothing' is no file and no guest; write one of complete:N, bipartite:AxB, grid:RxC, regular:D:N, random:N:P, cycle:N",
      })
  void otherGuestsAreRefused(String text, String message) {
    IllegalArgumentException fault =
        assertThrows(IllegalArgumentException.class, () -> GraphReader.guest(text, 1));
    assertEquals(message, fault.getMessage());
  }

  @ParameterizedTest
  @ValueSource(strings = {"regular:3:5", "random:5:2", "cycle:2", "complete:9999999999"})
  void guestsThatCannotBeAreRefused(String text) {
    assertThrows(IllegalArgumentException.class, () -> GraphReader.guest(text, 1));
  }

  @ParameterizedTest
  @ValueSource(strings = {"cells:4", "cells:0@3x3", "king:0x3", "cubic:2x2", "nothing"})
  void otherHostsAreRefused(String text) {
    assertThrows(IllegalArgumentException.class, () -> GraphReader.host(text));
  }

  private String write(String name, String text) throws IOException {
    return Files.writeString(folder.resolve(name), text).toString();
  }
}
