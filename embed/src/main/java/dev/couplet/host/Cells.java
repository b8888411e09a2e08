package dev.couplet.host;

import dev.couplet.form.CheckReturnValue;
import java.util.OptionalInt;

/**
 * A grid of cells, each a complete bipartite graph of {@code side} upright and {@code side} level
 * vertices.
 *
 * <p>The upright vertices of a cell are coupled to the same ones in the cells above and below, the
 * level ones to those on the left and right. So every upright vertex is part of one whole line down
 * a column of cells, and every level vertex of one across a row; each upright line meets each level
 * line in one cell. Vertices are numbered along whole lines: all upright lines, column by column,
 * then all level lines, row by row.
 *
 * <p>With k = side: 2kRC vertices, k&sup2;RC + k(R - 1)C + kR(C - 1) edges.
 *
 * @param side the number of vertices of each side of a cell
 * @param rows the rows of cells
 * @param columns the columns of cells
 */
@CheckReturnValue
public record Cells(int side, int rows, int columns) implements Lattice {
  /** Refuses sizes below 1 and more than 2^30 vertices. */
  public Cells {
    Check.positive("the side of a cell", side);
    Check.positive("the number of rows", rows);
    Check.positive("the number of columns", columns);
    int ignored = Check.count("cells:" + side + "@" + rows + "x" + columns, 2, side, rows, columns);
  }

  @Override
  public String name() {
    return "cells:" + side + "@" + rows + "x" + columns;
  }

  @Override
  public int vertices() {
    return 2 * side * rows * columns;
  }

  /** The upright vertex {@code index} of the cell in a row and a column. */
  public int upright(int row, int column, int index) {
    checkCell(row, column, index);
    return (column * side + index) * rows + row;
  }

  /** The level vertex {@code index} of the cell in a row and a column. */
  public int level(int row, int column, int index) {
    checkCell(row, column, index);
    return vertices() / 2 + (row * side + index) * columns + column;
  }

  private void checkCell(int row, int column, int index) {
    if (row < 0 || row >= rows || column < 0 || column >= columns || index < 0 || index >= side) {
      throw new IllegalArgumentException(
          "there is no vertex " + index + " of cell (" + row + ", " + column + ") in " + name());
    }
  }

  /** Whether a vertex is an upright one. */
  public boolean isUpright(int vertex) {
    return Check.vertex(vertex, vertices()) < vertices() / 2;
  }

  /** The row of a vertex's cell. */
  public int row(int vertex) {
    return isUpright(vertex) ? vertex % rows : (vertex - vertices() / 2) / columns / side;
  }

  /** The column of a vertex's cell. */
  public int column(int vertex) {
    return isUpright(vertex) ? vertex / rows / side : (vertex - vertices() / 2) % columns;
  }

  /** The place of a vertex on its side of its cell. */
  public int index(int vertex) {
    return isUpright(vertex) ? vertex / rows % side : (vertex - vertices() / 2) / columns % side;
  }

  @Override
  public void forEachEdge(EdgeVisitor visitor) {
    for (int row = 0; row < rows; row++) {
      for (int column = 0; column < columns; column++) {
        for (int index = 0; index < side; index++) {
          edgesOf(row, column, index, visitor);
        }
      }
    }
  }

  private void edgesOf(int row, int column, int index, EdgeVisitor visitor) {
    int upright = upright(row, column, index);
    for (int other = 0; other < side; other++) {
      visitor.visit(upright, level(row, column, other));
    }
    if (row + 1 < rows) {
      visitor.visit(upright, upright(row + 1, column, index));
    }
    if (column + 1 < columns) {
      visitor.visit(level(row, column, index), level(row, column + 1, index));
    }
  }

  @Override
  public double x(int vertex) {
    return column(vertex) * pitch() + (isUpright(vertex) ? index(vertex) + 1 : 0);
  }

  @Override
  public double y(int vertex) {
    return row(vertex) * pitch() + (isUpright(vertex) ? 0 : index(vertex) + 1);
  }

  /** Uprights stand along the top of a cell, level ones down its left, one unit between cells. */
  private double pitch() {
    return side + 2.0;
  }

  @Override
  public String describe(int vertex) {
    return (isUpright(vertex) ? "upright " : "level ")
        + index(vertex)
        + " of cell ("
        + row(vertex)
        + ", "
        + column(vertex)
        + ")";
  }

  /**
   * The side times the lesser of rows and columns.
   *
   * <p>Let there be no more rows than columns. Eliminate column after column: first the upright
   * lines one by one from the top, when each vertex has at most the levels of its column and all
   * above, and one upright neighbour below; then the levels one by one, whose neighbours are the
   * other levels of the column or what follows them in the next. No vertex has more than {@code
   * side * rows} neighbours when it is eliminated.
   */
  @Override
  public OptionalInt treewidthBound() {
    return OptionalInt.of(side * Math.min(rows, columns));
  }
}
