package dev.couplet.host;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

class LatticeTest {
  @ParameterizedTest
  @CsvSource({"1,1,1", "4,1,1", "4,8,8", "4,10,10", "3,2,5", "2,5,2", "1,3,4"})
  void cellsHaveTheVerticesAndEdgesOfTheFormula(int k, int r, int c) {
    Host host = Host.cells(k, r, c);
    assertEquals(2 * k * r * c, host.vertices());
    assertEquals(k * k * r * c + k * (r - 1) * c + k * r * (c - 1), host.edges());
    assertEquals("cells:" + k + "@" + r + "x" + c, host.name());
  }

  @ParameterizedTest
  @CsvSource({"1,1", "1,6", "6,1", "2,2", "5,7"})
  void flatLatticesHaveTheVerticesAndEdgesOfTheFormula(int r, int c) {
    int straight = r * (c - 1) + (r - 1) * c;
    assertEquals(r * c, Host.square(r, c).vertices());
    assertEquals(straight, Host.square(r, c).edges());
    assertEquals(r * c, Host.king(r, c).vertices());
    assertEquals(straight + 2 * (r - 1) * (c - 1), Host.king(r, c).edges());
  }

  @ParameterizedTest
  @CsvSource({"1,1,1", "1,1,5", "4,3,2", "2,5,3"})
  void cubicLatticesHaveTheVerticesAndEdgesOfTheFormula(int x, int y, int z) {
    Host host = Host.cubic(x, y, z);
    assertEquals(x * y * z, host.vertices());
    assertEquals(3 * x * y * z - x * y - x * z - y * z, host.edges());
  }

  /** The definition of the grid of cells, once more, by places instead of numbers. */
  @Test
  void cellsAreCoupledAsDefined() {
    Cells cells = new Cells(3, 4, 2);
    CompactGraph graph = Host.of(cells).graph();
    for (int u = 0; u < cells.vertices(); u++) {
      for (int v = 0; v < cells.vertices(); v++) {
        assertEquals(coupled(cells, u, v), graph.adjacent(u, v), u + " " + v);
      }
    }
  }

  private static boolean coupled(Cells cells, int u, int v) {
    int rows = Math.abs(cells.row(u) - cells.row(v));
    int columns = Math.abs(cells.column(u) - cells.column(v));
    if (cells.isUpright(u) != cells.isUpright(v)) {
      return rows == 0 && columns == 0;
    }
    boolean sameLine = cells.index(u) == cells.index(v);
    return sameLine && (cells.isUpright(u) ? rows == 1 && columns == 0 : rows == 0 && columns == 1);
  }

  @Test
  void cellsAreNumberedAlongWholeLines() {
    Cells cells = new Cells(2, 3, 4);
    List<Integer> expected = new ArrayList<>();
    for (int column = 0; column < 4; column++) {
      for (int index = 0; index < 2; index++) {
        for (int row = 0; row < 3; row++) {
          expected.add(cells.upright(row, column, index));
        }
      }
    }
    for (int row = 0; row < 3; row++) {
      for (int index = 0; index < 2; index++) {
        for (int column = 0; column < 4; column++) {
          expected.add(cells.level(row, column, index));
        }
      }
    }
    for (int v = 0; v < cells.vertices(); v++) {
      assertEquals(v, expected.get(v));
    }
  }

  @Test
  void verticesOfCellsKnowTheirPlace() {
    Cells cells = new Cells(3, 4, 5);
    int upright = cells.upright(2, 4, 1);
    int level = cells.level(3, 1, 2);
    assertEquals("upright 1 of cell (2, 4)", cells.describe(upright));
    assertEquals("level 2 of cell (3, 1)", Host.of(cells).describe(level));
    assertThrows(IllegalArgumentException.class, () -> cells.level(4, 0, 0));
    assertThrows(IllegalArgumentException.class, () -> cells.row(120));
  }

  static List<Lattice> lattices() {
    return List.of(
        new Cells(4, 3, 3),
        new Cells(3, 2, 2),
        new King(3, 4),
        new Square(4, 3),
        new Cubic(3, 4, 5),
        new Cubic(1, 1, 1));
  }

  @ParameterizedTest
  @MethodSource("lattices")
  void everyVertexHasAPlaceOfItsOwnAndWords(Lattice lattice) {
    Set<List<Double>> places = new HashSet<>();
    Set<String> words = new HashSet<>();
    for (int v = 0; v < lattice.vertices(); v++) {
      assertTrue(places.add(List.of(lattice.x(v), lattice.y(v))), "place of " + v);
      assertTrue(words.add(lattice.describe(v)), "words of " + v);
    }
  }

  @Test
  void sizesThatMakeNoSenseAreRefused() {
    assertThrows(IllegalArgumentException.class, () -> new Cells(0, 1, 1));
    assertThrows(IllegalArgumentException.class, () -> new King(3, 0));
    assertThrows(IllegalArgumentException.class, () -> new Square(-1, 3));
    assertThrows(IllegalArgumentException.class, () -> new Cubic(1, 0, 1));
    IllegalArgumentException huge =
        assertThrows(IllegalArgumentException.class, () -> new Cells(4, 1 << 20, 1 << 20));
    assertTrue(huge.getMessage().contains("cells:4@1048576x1048576"), huge.getMessage());
  }
}
