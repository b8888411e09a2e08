package dev.couplet.host;

/** What the lattices on a rectangle of vertices, numbered row by row, have in common. */
final class Rectangle {
  private Rectangle() {}

  static int vertex(int row, int column, int rows, int columns) {
    if (row < 0 || row >= rows || column < 0 || column >= columns) {
      throw new IllegalArgumentException(
          "(" + row + ", " + column + ") lies outside the " + rows + " x " + columns + " vertices");
    }
    return row * columns + column;
  }

  static String describe(int vertex, int columns) {
    return "row " + row(vertex, columns) + ", column " + column(vertex, columns);
  }

  static int row(int vertex, int columns) {
    return vertex / columns;
  }

  static int column(int vertex, int columns) {
    return vertex % columns;
  }

  static void forEachEdge(int rows, int columns, EdgeVisitor visitor) {
    for (int row = 0; row < rows; row++) {
      for (int column = 0; column < columns; column++) {
        int vertex = row * columns + column;
        if (column + 1 < columns) {
          visitor.visit(vertex, vertex + 1);
        }
        if (row + 1 < rows) {
          visitor.visit(vertex, vertex + columns);
        }
      }
    }
  }
}
