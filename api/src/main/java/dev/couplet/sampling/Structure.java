package dev.couplet.sampling;

import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;

/**
 * What is known of a form beyond its coefficients, for methods that can use it.
 *
 * <p>An exactly-one set is a set of bits of which every state that means something has exactly one
 * at 1. Methods may use it for moves that keep it so; the form's own coefficients still decide
 * every energy. Immutable.
 */
public final class Structure {
  private static final Structure NONE = new Structure(List.of());

  private final List<List<Integer>> exactlyOne;

  private Structure(List<List<Integer>> exactlyOne) {
    this.exactlyOne = exactlyOne;
  }

  /** Nothing is known. */
  public static Structure none() {
    return NONE;
  }

  /**
   * Each of the sets has exactly one bit at 1.
   *
   * @throws IllegalArgumentException if a set is empty, or a bit is negative or in two sets
   */
  public static Structure exactlyOne(List<? extends List<Integer>> sets) {
    List<List<Integer>> copy = new ArrayList<>(sets.size());
    BitSet seen = new BitSet();
    for (List<Integer> set : sets) {
      if (set.isEmpty()) {
        throw new IllegalArgumentException(
            "exactly-one set " + copy.size() + " is empty; leave it out");
      }
      for (int bit : set) {
        if (bit < 0 || seen.get(bit)) {
          throw new IllegalArgumentException(
              "bit " + bit + " of exactly-one set " + copy.size() + " is negative or used before");
        }
        seen.set(bit);
      }
      copy.add(List.copyOf(set));
    }
    return new Structure(List.copyOf(copy));
  }

  /** The exactly-one sets, no bit in two of them. */
  public List<List<Integer>> exactlyOne() {
    return exactlyOne;
  }

  /**
   * Insists that every set lies within a form.
   *
   * @throws IllegalArgumentException naming the first bit that the form does not have
   */
  public void requireWithin(int size) {
    for (List<Integer> set : exactlyOne) {
      for (int bit : set) {
        if (bit >= size) {
          throw new IllegalArgumentException(
              "an exactly-one set names bit "
                  + bit
                  + ", the form has "
                  + size
                  + " variables; pass the structure of the form that is sampled");
        }
      }
    }
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof Structure other && exactlyOne.equals(other.exactlyOne);
  }

  @Override
  public int hashCode() {
    return exactlyOne.hashCode();
  }

  @Override
  public String toString() {
    return "Structure(" + exactlyOne.size() + " exactly-one sets)";
  }
}
