package dev.couplet.embed;

import dev.couplet.host.Host;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalInt;

/**
 * A guest on a host: one branch set a guest vertex.
 *
 * <p>Valid by construction: every branch set is a non-empty, connected set of present host
 * vertices, no host vertex is in two of them, and every guest edge is carried by a host edge
 * between its two sets. Immutable; two are equal if their guests' and hosts' graphs and their sets
 * are.
 */
public final class Embedding {
  private final Guest guest;
  private final Host host;
  private final List<BranchSet> sets;
  private final int[] owner;

  private Embedding(Guest guest, Host host, List<BranchSet> sets, int[] owner) {
    this.guest = guest;
    this.host = host;
    this.sets = sets;
    this.owner = owner;
  }

  /**
   * Checks the sets and makes an embedding of them; O(s log s + d) with s host vertices in the sets
   * and d the sum of their degrees.
   *
   * @param sets the host vertices of guest vertex 0, 1, ..., each in any order
   * @throws IllegalArgumentException naming the first guest vertex, host vertex or edge at fault
   */
  public static Embedding of(Guest guest, Host host, List<int[]> sets) {
    int[] owner = Validation.owners(guest, host, sets);
    List<BranchSet> own = new ArrayList<>(sets.size());
    for (int[] set : sets) {
      int[] sorted = set.clone();
      Arrays.sort(sorted);
      own.add(new BranchSet(own.size(), sorted));
    }
    return new Embedding(guest, host, List.copyOf(own), owner);
  }

  /** The graph that is carried. */
  public Guest guest() {
    return guest;
  }

  /** The graph that carries it. */
  public Host host() {
    return host;
  }

  /** The branch sets, that of guest vertex 0 first. */
  public List<BranchSet> sets() {
    return sets;
  }

  /** The branch set of a guest vertex. */
  public BranchSet set(int guestVertex) {
    return sets.get(guestVertex);
  }

  /** The guest vertex whose branch set holds a host vertex, if one does. */
  public OptionalInt owner(int hostVertex) {
    int found = owner[hostVertex];
    return found < 0 ? OptionalInt.empty() : OptionalInt.of(found);
  }

  /** How many host vertices all branch sets hold together. */
  public int total() {
    int sum = 0;
    for (BranchSet set : sets) {
      sum += set.size();
    }
    return sum;
  }

  /** The size of the largest branch set; 0 for a guest without vertices. */
  public int longest() {
    int most = 0;
    for (BranchSet set : sets) {
      most = Math.max(most, set.size());
    }
    return most;
  }

  /** The mean size of the branch sets; 0 for a guest without vertices. */
  public double mean() {
    return sets.isEmpty() ? 0 : (double) total() / sets.size();
  }

  /**
   * This embedding without the host vertices that it can do without: one after the other, those
   * whose set stays connected and goes on carrying all its edges. The result depends on nothing but
   * this embedding.
   */
  public Embedding trimmed() {
    return of(guest, host, Trimming.trim(this));
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof Embedding other
        && sets.equals(other.sets)
        && guest.graph().equals(other.guest.graph())
        && host.graph().equals(other.host.graph());
  }

  @Override
  public int hashCode() {
    return sets.hashCode();
  }

  @Override
  public String toString() {
    return "Embedding("
        + guest.name()
        + " on "
        + host.name()
        + ", "
        + total()
        + " host vertices, longest "
        + longest()
        + ")";
  }
}
