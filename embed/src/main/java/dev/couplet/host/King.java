package dev.couplet.host;

import dev.couplet.form.CheckReturnValue;
import java.util.OptionalInt;

/**
 * A king's lattice: a rectangle of vertices, each the neighbour of the eight around it.
 *
 * <p>Numbered row by row. RC vertices, R(C - 1) + (R - 1)C + 2(R - 1)(C - 1) edges.
 *
 * @param rows the rows of vertices
 * @param columns the columns of vertices
 */
@CheckReturnValue
public record King(int rows, int columns) implements Lattice {
  /** Refuses sizes below 1 and more than 2^30 vertices. */
  public King {
    Check.positive("the number of rows", rows);
    Check.positive("the number of columns", columns);
    int ignored = Check.count("king:" + rows + "x" + columns, rows, columns);
  }

  @Override
  public String name() {
    return "king:" + rows + "x" + columns;
  }

  @Override
  public int vertices() {
    return rows * columns;
  }

  /** The vertex in a row and a column. */
  public int vertex(int row, int column) {
    return Rectangle.vertex(row, column, rows, columns);
  }

  @Override
  public void forEachEdge(EdgeVisitor visitor) {
    Rectangle.forEachEdge(rows, columns, visitor);
    for (int row = 0; row + 1 < rows; row++) {
      for (int column = 0; column + 1 < columns; column++) {
        visitor.visit(vertex(row, column), vertex(row + 1, column + 1));
        visitor.visit(vertex(row, column + 1), vertex(row + 1, column));
      }
    }
  }

  @Override
  public double x(int vertex) {
    return Rectangle.column(Check.vertex(vertex, vertices()), columns);
  }

  @Override
  public double y(int vertex) {
    return Rectangle.row(Check.vertex(vertex, vertices()), columns);
  }

  @Override
  public String describe(int vertex) {
    return Rectangle.describe(Check.vertex(vertex, vertices()), columns);
  }

  /**
   * The lesser of rows and columns, and 1: eliminated line by line along the shorter side, a vertex
   * has as neighbours at most the rest of its line, the part of the next line behind it, and the
   * two vertices ahead of that.
   */
  @Override
  public OptionalInt treewidthBound() {
    return OptionalInt.of(Math.min(rows, columns) + 1);
  }
}
