package dev.couplet.embed.template;

import dev.couplet.host.Cells;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Lines on m by m cells: set i of group g has an upright line down column g from row g on, and a
 * level line along row g up to column g. Two sets of different groups meet where the level line of
 * the later crosses the upright one of the earlier; two of one group meet in the cell they share on
 * the diagonal.
 *
 * <p>With one set more than t m, every level line goes on to the last column, the last set keeps
 * its level line only, and its upright line, now whole, is the additional set: it crosses all level
 * lines, as the last set's level line crosses all upright ones.
 *
 * @param cells the lattice
 * @param count the number of sets
 * @param side the number m of cells a side
 */
record CellsPattern(Cells cells, int count, int side) implements Pattern {
  static Optional<Pattern> of(int count, Cells cells) {
    int most = Math.min(cells.rows(), cells.columns());
    int side = (count + cells.side() - 1) / cells.side();
    if (side <= most) {
      return Optional.of(new CellsPattern(cells, count, side));
    }
    boolean oneMore = count == cells.side() * most + 1;
    return oneMore ? Optional.of(new CellsPattern(cells, count, most)) : Optional.empty();
  }

  private boolean oneMore() {
    return count > cells.side() * side;
  }

  @Override
  public int spareRows() {
    return cells.rows() - side;
  }

  @Override
  public int spareColumns() {
    return cells.columns() - side;
  }

  @Override
  public List<int[]> sets(int down, int right) {
    List<int[]> sets = new ArrayList<>(count);
    int last = side - 1;
    int bent = oneMore() ? count - 2 : count;
    for (int i = 0; i < bent; i++) {
      int group = i / cells.side();
      int index = i % cells.side();
      IntStream upright = upright(down, right, group, index, group);
      IntStream level = level(down, right, group, index, oneMore() ? last : group);
      sets.add(IntStream.concat(upright, level).toArray());
    }
    if (oneMore()) {
      sets.add(level(down, right, last, cells.side() - 1, last).toArray());
      sets.add(upright(down, right, last, cells.side() - 1, 0).toArray());
    }
    return sets;
  }

  private IntStream upright(int down, int right, int column, int index, int fromRow) {
    return IntStream.range(fromRow, side)
        .map(row -> cells.upright(down + row, right + column, index));
  }

  private IntStream level(int down, int right, int row, int index, int toColumn) {
    return IntStream.rangeClosed(0, toColumn)
        .map(column -> cells.level(down + row, right + column, index));
  }
}
