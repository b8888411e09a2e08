package dev.couplet.host;

import dev.couplet.form.CheckReturnValue;
import java.util.OptionalInt;

/**
 * A cubic lattice with open borders: a box of vertices, each the neighbour of the six beside it.
 *
 * <p>Vertex (x, y, z) has the number {@code x + width * (y + height * z)}. XYZ vertices, 3XYZ - XY
 * - XZ - YZ edges.
 *
 * @param width the number of vertices X along x
 * @param height the number of vertices Y along y
 * @param depth the number of vertices Z along z
 */
@CheckReturnValue
public record Cubic(int width, int height, int depth) implements Lattice {
  /** Refuses sizes below 1 and more than 2^30 vertices. */
  public Cubic {
    Check.positive("the width", width);
    Check.positive("the height", height);
    Check.positive("the depth", depth);
    int ignored = Check.count("cubic:" + width + "x" + height + "x" + depth, width, height, depth);
  }

  @Override
  public String name() {
    return "cubic:" + width + "x" + height + "x" + depth;
  }

  @Override
  public int vertices() {
    return width * height * depth;
  }

  /** The vertex at a point of the box. */
  public int vertex(int x, int y, int z) {
    if (x < 0 || x >= width || y < 0 || y >= height || z < 0 || z >= depth) {
      throw new IllegalArgumentException(
          "(" + x + ", " + y + ", " + z + ") lies outside the box of " + name());
    }
    return x + width * (y + height * z);
  }

  @Override
  public void forEachEdge(EdgeVisitor visitor) {
    int layer = width * height;
    for (int vertex = 0; vertex < vertices(); vertex++) {
      if (vertex % width + 1 < width) {
        visitor.visit(vertex, vertex + 1);
      }
      if (vertex / width % height + 1 < height) {
        visitor.visit(vertex, vertex + width);
      }
      if (vertex + layer < vertices()) {
        visitor.visit(vertex, vertex + layer);
      }
    }
  }

  /** The layers lie behind one another, each set off aslant within a square of the first. */
  @Override
  public double x(int vertex) {
    int column = Check.vertex(vertex, vertices()) % width;
    return column * spread() + layer(vertex);
  }

  @Override
  public double y(int vertex) {
    int row = Check.vertex(vertex, vertices()) / width % height;
    return row * spread() + 0.6 * layer(vertex);
  }

  private int layer(int vertex) {
    return vertex / (width * height);
  }

  private double spread() {
    return depth + 0.5;
  }

  @Override
  public String describe(int vertex) {
    int plane = Check.vertex(vertex, vertices()) % (width * height);
    return "(" + plane % width + ", " + plane / width + ", " + layer(vertex) + ")";
  }

  /**
   * The smallest face: eliminated layer by layer along the longest side, a vertex has as neighbours
   * at most the rest of its layer and the part of the next layer behind it.
   */
  @Override
  public OptionalInt treewidthBound() {
    int longest = Math.max(width, Math.max(height, depth));
    return OptionalInt.of(vertices() / longest);
  }
}
