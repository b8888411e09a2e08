package dev.couplet.bond;

import dev.couplet.embed.BranchSet;
import dev.couplet.embed.Embedding;
import dev.couplet.form.Ising;
import dev.couplet.form.State;
import dev.couplet.host.CompactGraph;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A guest's spin form on a host.
 *
 * <p>Host spins are numbered set by set, in the order of the embedding: those of guest vertex 0
 * first. A field is spread evenly over its branch set, a coupling over all host edges between the
 * two sets; bonds lie on a spanning tree of each set. The constant takes the bonds out again, so
 * that a state with no torn set has the energy of the guest state that it stands for, up to
 * rounding. Immutable.
 */
public final class HostedForm {
  private final Embedding embedding;
  private final Ising form;
  private final int[] first;

  private HostedForm(Embedding embedding, Ising form, int[] first) {
    this.embedding = embedding;
    this.form = form;
    this.first = first;
  }

  /**
   * Spreads a form over the branch sets of an embedding; linear in the host edges of the sets.
   *
   * @throws IllegalArgumentException if the form has another number of variables than the guest, or
   *     a pair that the embedding does not carry, or a bond strength is not positive and finite
   */
  public static HostedForm of(Embedding embedding, Ising guest, BondStrength strength) {
    if (guest.size() != embedding.guest().vertices()) {
      throw new IllegalArgumentException(
          "the form has "
              + guest.size()
              + " variables, the embedding's guest has "
              + embedding.guest().vertices()
              + " vertices; embed the graph of this form");
    }
    int[] first = new int[guest.size() + 1];
    for (int g = 0; g < guest.size(); g++) {
      first[g + 1] = first[g] + embedding.set(g).size();
    }
    Spreading spreading = new Spreading(embedding, first);
    spreading.spread(guest);
    spreading.bind(strength);
    return new HostedForm(embedding, spreading.form(), first);
  }

  /** The embedding. */
  public Embedding embedding() {
    return embedding;
  }

  /** The form over the host spins. */
  public Ising ising() {
    return form;
  }

  /** The number of the first host spin of a guest vertex; at the number of vertices, of all. */
  public int first(int guest) {
    return first[guest];
  }

  /** The host state with every branch set whole that stands for a guest state. */
  public State whole(State guest) {
    boolean[] spins = new boolean[first[first.length - 1]];
    for (int g = 0; g + 1 < first.length; g++) {
      Arrays.fill(spins, first[g], first[g + 1], guest.get(g));
    }
    return State.of(spins);
  }

  /** Whether the members of a guest vertex's branch set disagree in a host state. */
  public boolean torn(State host, int guest) {
    for (int k = first[guest] + 1; k < first[guest + 1]; k++) {
      if (host.get(k) != host.get(first[guest])) {
        return true;
      }
    }
    return false;
  }

  @Override
  public String toString() {
    return "HostedForm(" + embedding + ")";
  }

  /** The coefficients being spread; mutable, used once. */
  private static final class Spreading {
    private final Embedding embedding;
    private final CompactGraph graph;
    private final int[] first;
    private final double[] weight;
    private final Ising.Builder spins;

    Spreading(Embedding embedding, int[] first) {
      this.embedding = embedding;
      this.graph = embedding.host().graph();
      this.first = first;
      this.weight = new double[first[first.length - 1]];
      this.spins = Ising.builder(weight.length).allowRounding();
    }

    void spread(Ising guest) {
      spins.addConstant(guest.constant());
      for (int g = 0; g < guest.size(); g++) {
        int size = embedding.set(g).size();
        double share = guest.linear(g) / size;
        for (int k = first[g]; k < first[g + 1]; k++) {
          spins.addLinear(k, share);
          weight[k] += Math.abs(share);
        }
      }
      guest.forEachPair(this::spreadPair);
    }

    private void spreadPair(int g, int h, double coupling) {
      List<int[]> edges = edges(g, h);
      if (edges.isEmpty()) {
        throw new IllegalArgumentException(
            "the embedding does not carry the pair ("
                + g
                + ", "
                + h
                + "); embed the graph of this"
                + " form");
      }
      double share = coupling / edges.size();
      for (int[] edge : edges) {
        spins.addPair(edge[0], edge[1], share);
        weight[edge[0]] += Math.abs(share);
        weight[edge[1]] += Math.abs(share);
      }
    }

    /** The host edges between two sets, by the numbers of their spins. */
    private List<int[]> edges(int g, int h) {
      BranchSet set = embedding.set(g);
      int[] others = embedding.set(h).toArray();
      List<int[]> edges = new ArrayList<>();
      for (int a = 0; a < set.size(); a++) {
        for (int neighbour : graph.neighbours(set.vertex(a))) {
          int b = Arrays.binarySearch(others, neighbour);
          if (b >= 0) {
            edges.add(new int[] {first[g] + a, first[h] + b});
          }
        }
      }
      return edges;
    }

    void bind(BondStrength strength) {
      for (BranchSet set : embedding.sets()) {
        int from = first[set.guest()];
        SetTree tree = SetTree.of(set, graph);
        double[] below = tree.below(Arrays.copyOfRange(weight, from, from + set.size()));
        double all = below[0];
        for (int k = 1; k < set.size(); k++) {
          int place = tree.order()[k];
          double under = below[place];
          double above = Math.max(0, all - under);
          double bond = checked(strength, set, Math.min(under, above), Math.max(under, above));
          spins.addPair(from + place, from + tree.parent(place), -bond).addConstant(bond);
        }
      }
    }

    private static double checked(
        BondStrength strength, BranchSet set, double lighter, double heavier) {
      double bond = strength.of(new BondStrength.Sides(set.guest(), lighter, heavier));
      if (!(bond > 0) || !Double.isFinite(bond)) {
        throw new IllegalArgumentException(
            "a bond of guest vertex "
                + set.guest()
                + " was given the strength "
                + bond
                + ", it must be positive and finite");
      }
      return bond;
    }

    Ising form() {
      return spins.build();
    }
  }
}
