package dev.couplet.host;

import dev.couplet.form.CheckReturnValue;
import java.util.OptionalInt;

/**
 * A regular graph with a place in the plane for every vertex.
 *
 * <p>Implementations are records; methods that know how to use a lattice recognise it by its type.
 * A new lattice is a new class that implements this interface, and becomes a host by {@link
 * Host#of(Lattice)}.
 */
@CheckReturnValue
public interface Lattice {
  /** The name, such as {@code cells:4@8x8}. */
  String name();

  /** The number of vertices; they are numbered from 0. */
  int vertices();

  /** Passes every edge once to the visitor, in any order and direction. */
  void forEachEdge(EdgeVisitor visitor);

  /** Where to draw a vertex, to the right; neighbours are about 1 apart. */
  double x(int vertex);

  /** Where to draw a vertex, downwards. */
  double y(int vertex);

  /** Where a vertex stands, in words. */
  String describe(int vertex);

  /** An upper bound on the treewidth, with a proof; empty if none is known. */
  default OptionalInt treewidthBound() {
    return OptionalInt.empty();
  }
}
