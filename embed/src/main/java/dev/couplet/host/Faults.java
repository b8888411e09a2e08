package dev.couplet.host;

import dev.couplet.form.CheckReturnValue;
import java.util.Arrays;
import java.util.BitSet;
import java.util.SplittableRandom;

/**
 * The missing parts of a host: vertices and edges.
 *
 * <p>An edge whose end is missing is missing too and need not be named. Immutable.
 */
@CheckReturnValue
public final class Faults {
  private static final Faults NONE = new Faults(new BitSet(), new int[0][]);

  private final BitSet vertices;
  private final int[][] edges;

  private Faults(BitSet vertices, int[][] edges) {
    this.vertices = vertices;
    this.edges = edges;
  }

  /** Nothing is missing. */
  public static Faults none() {
    return NONE;
  }

  /** The listed vertices are missing. */
  public static Faults vertices(int... missing) {
    BitSet set = new BitSet();
    for (int vertex : missing) {
      Check.vertex(vertex, Integer.MAX_VALUE);
      set.set(vertex);
    }
    return new Faults(set, NONE.edges);
  }

  /**
   * A seeded choice: the given share of the host's present vertices, to the nearest whole number,
   * then the given share of the edges left.
   *
   * @throws IllegalArgumentException if a share is not from 0 to 1
   */
  public static Faults seeded(Host host, double vertexShare, double edgeShare, long seed) {
    Check.share("the share of missing vertices", vertexShare);
    Check.share("the share of missing edges", edgeShare);
    SplittableRandom random = new SplittableRandom(seed);
    BitSet present = host.presentVertices();
    BitSet missing = new BitSet();
    int[] all = present.stream().toArray();
    for (int vertex : choose(all, vertexShare, random.split())) {
      missing.set(vertex);
    }
    int[][] left = edgesApartFrom(missing, host.graph());
    int[] numbers = new int[left.length];
    Arrays.setAll(numbers, e -> e);
    int[] chosen = choose(numbers, edgeShare, random.split());
    return new Faults(missing, Arrays.stream(chosen).mapToObj(e -> left[e]).toArray(int[][]::new));
  }

  private static int[][] edgesApartFrom(BitSet missing, CompactGraph graph) {
    int[][] edges = new int[graph.edges()][];
    int[] count = {0};
    graph.forEachEdge(
        (u, v) -> {
          if (!missing.get(u) && !missing.get(v)) {
            edges[count[0]++] = new int[] {u, v};
          }
        });
    return Arrays.copyOf(edges, count[0]);
  }

  /** The first places of a random shuffle. */
  private static int[] choose(int[] items, double share, SplittableRandom random) {
    int wanted = (int) Math.round(share * items.length);
    for (int k = 0; k < wanted; k++) {
      int other = k + random.nextInt(items.length - k);
      int item = items[other];
      items[other] = items[k];
      items[k] = item;
    }
    return Arrays.copyOf(items, wanted);
  }

  /** These faults, and the edge between two vertices missing. */
  public Faults edge(int u, int v) {
    int[][] more = Arrays.copyOf(edges, edges.length + 1);
    more[edges.length] = new int[] {u, v};
    return new Faults(vertices, more);
  }

  /** The missing vertices, a new set. */
  public BitSet missingVertices() {
    return (BitSet) vertices.clone();
  }

  /** Passes every edge that is named as missing to the visitor. */
  public void forEachMissingEdge(EdgeVisitor visitor) {
    for (int[] edge : edges) {
      visitor.visit(edge[0], edge[1]);
    }
  }

  @Override
  public String toString() {
    return "Faults(" + vertices.cardinality() + " vertices, " + edges.length + " edges)";
  }
}
