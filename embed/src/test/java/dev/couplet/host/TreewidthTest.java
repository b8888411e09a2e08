package dev.couplet.host;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The bounds on treewidth against the widths of elimination orders, played out on sets. */
class TreewidthTest {
  @ParameterizedTest
  @CsvSource({"1,1,1", "4,1,1", "4,1,3", "4,3,3", "2,3,5", "1,4,4", "3,2,2"})
  void cells(int side, int rows, int columns) {
    Cells cells = new Cells(side, rows, columns);
    Comparator<Integer> order =
        Comparator.<Integer>comparingInt(cells::column)
            .thenComparing(v -> !cells.isUpright(v))
            .thenComparing(Comparator.naturalOrder());
    int width = width(cells, order);
    assertTrue(width <= cells.treewidthBound().orElseThrow());
    // Published for the grid of cells: exactly side * min(rows, columns).
    assertEquals(side * Math.min(rows, columns), cells.treewidthBound().orElseThrow());
  }

  @ParameterizedTest
  @CsvSource({"1,1", "1,5", "3,3", "3,6", "4,4"})
  void flat(int rows, int columns) {
    Comparator<Integer> byColumn = Comparator.comparingInt(v -> v % columns);
    Comparator<Integer> order = byColumn.thenComparing(Comparator.naturalOrder());
    Square square = new Square(rows, columns);
    assertTrue(width(square, order) <= square.treewidthBound().orElseThrow());
    King king = new King(rows, columns);
    assertTrue(width(king, order) <= king.treewidthBound().orElseThrow());
  }

  @ParameterizedTest
  @CsvSource({"1,1,1", "2,2,2", "2,3,4", "3,3,3"})
  void cubic(int x, int y, int z) {
    Cubic cubic = new Cubic(x, y, z);
    assertTrue(width(cubic, Comparator.naturalOrder()) <= cubic.treewidthBound().orElseThrow());
  }

  private static int width(Lattice lattice, Comparator<Integer> order) {
    List<Set<Integer>> neighbours = new ArrayList<>();
    for (int v = 0; v < lattice.vertices(); v++) {
      neighbours.add(new TreeSet<>());
    }
    lattice.forEachEdge(
        (u, v) -> {
          neighbours.get(u).add(v);
          neighbours.get(v).add(u);
        });
    int width = 0;
    for (int v : IntStream.range(0, lattice.vertices()).boxed().sorted(order).toList()) {
      Set<Integer> around = neighbours.get(v);
      width = Math.max(width, around.size());
      for (int u : around) {
        neighbours.get(u).addAll(around);
        neighbours.get(u).remove(u);
        neighbours.get(u).remove(v);
      }
    }
    return width;
  }
}
