package dev.couplet.host;

import dev.couplet.form.CheckReturnValue;
import java.util.OptionalInt;

/**
 * A square lattice: a rectangle of vertices, each the neighbour of the four beside it.
 *
 * <p>Numbered row by row. RC vertices, R(C - 1) + (R - 1)C edges.
 *
 * @param rows the rows of vertices
 * @param columns the columns of vertices
 */
@CheckReturnValue
public record Square(int rows, int columns) implements Lattice {
  /** Refuses sizes below 1 and more than 2^30 vertices. */
  public Square {
    Check.positive("the number of rows", rows);
    Check.positive("the number of columns", columns);
    int ignored = Check.count("square:" + rows + "x" + columns, rows, columns);
  }

  @Override
  public String name() {
    return "square:" + rows + "x" + columns;
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
   * The lesser of rows and columns: eliminated line by line along the shorter side, a vertex has as
   * neighbours at most the rest of its line and the part of the next line behind it.
   */
  @Override
  public OptionalInt treewidthBound() {
    return OptionalInt.of(Math.min(rows, columns));
  }
}
