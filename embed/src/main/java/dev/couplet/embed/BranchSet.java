package dev.couplet.embed;

import java.util.Arrays;

/**
 * The host vertices that together stand for one guest vertex: not empty, connected in the host,
 * ascending. Immutable.
 */
public final class BranchSet {
  private final int guest;
  private final int[] vertices;

  BranchSet(int guest, int[] vertices) {
    this.guest = guest;
    this.vertices = vertices;
  }

  /** The guest vertex. */
  public int guest() {
    return guest;
  }

  /** The number of host vertices. */
  public int size() {
    return vertices.length;
  }

  /** The k-th host vertex, the lowest number first. */
  public int vertex(int k) {
    return vertices[k];
  }

  /** Whether a host vertex is in this set; O(log size). */
  public boolean contains(int hostVertex) {
    return Arrays.binarySearch(vertices, hostVertex) >= 0;
  }

  /** The host vertices, ascending; a new array. */
  public int[] toArray() {
    return vertices.clone();
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof BranchSet other
        && guest == other.guest
        && Arrays.equals(vertices, other.vertices);
  }

  @Override
  public int hashCode() {
    return 31 * guest + Arrays.hashCode(vertices);
  }

  @Override
  public String toString() {
    return "BranchSet(" + guest + " on " + Arrays.toString(vertices) + ")";
  }
}
