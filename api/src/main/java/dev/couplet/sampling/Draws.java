package dev.couplet.sampling;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * What a sampler returns: the states its draws ended in, lowest energy first, equal states merged.
 *
 * <p>Rows of equal energy stand in the order of their first draw. At least one row. Immutable.
 */
public final class Draws implements Iterable<Draw> {
  private final List<Draw> rows;
  private final int total;
  private final End end;
  private final long seed;
  private final OptionalDouble bound;

  private Draws(List<Draw> rows, int total, End end, long seed, OptionalDouble bound) {
    this.rows = rows;
    this.total = total;
    this.end = end;
    this.seed = seed;
    this.bound = bound;
  }

  /**
   * Gathers the states of draws 0, 1, 2, ...; every energy is computed here, from the form itself.
   *
   * @param form the form that was sampled
   * @param states where each draw ended, at least one
   * @param end why the run ended
   * @param seed the seed of the run
   * @throws IllegalArgumentException if there is no state, or one of another size
   */
  public static Draws of(Qubo form, List<State> states, End end, long seed) {
    if (states.isEmpty()) {
      throw new IllegalArgumentException("there is no draw; a run returns at least one state");
    }
    Map<State, Integer> counts = new LinkedHashMap<>();
    for (State state : states) {
      counts.merge(state, 1, Integer::sum);
    }
    List<Draw> rows = new ArrayList<>(counts.size());
    counts.forEach((state, count) -> rows.add(new Draw(state, form.value(state), count)));
    rows.sort(Comparator.comparingDouble(Draw::energy));
    return new Draws(
        Collections.unmodifiableList(rows), states.size(), end, seed, OptionalDouble.empty());
  }

  /**
   * These draws with a proved lower bound on every energy of the form.
   *
   * @throws IllegalArgumentException if the bound is NaN, or above the best energy
   */
  public Draws bound(double lowerBound) {
    Check.number("the bound", lowerBound);
    if (lowerBound > best().energy()) {
      throw new IllegalArgumentException(
          "the bound " + lowerBound + " lies above the energy " + best().energy() + " of a draw");
    }
    return new Draws(rows, total, end, seed, OptionalDouble.of(lowerBound));
  }

  /** These draws with another reason why the run ended. */
  public Draws end(End newEnd) {
    return new Draws(rows, total, newEnd, seed, bound);
  }

  /** The row of lowest energy. */
  public Draw best() {
    return rows.get(0);
  }

  /** All rows, lowest energy first. */
  public List<Draw> rows() {
    return rows;
  }

  /** The number of draws: the sum of the multiplicities. */
  public int total() {
    return total;
  }

  /** Why the run ended. */
  public End end() {
    return end;
  }

  /** The seed of the run. */
  public long seed() {
    return seed;
  }

  /** A proved lower bound on every energy of the form, if the method gives one. */
  public OptionalDouble bound() {
    return bound;
  }

  /** Whether the best energy is proved to be the lowest of all. */
  public boolean proved() {
    return bound.isPresent() && bound.getAsDouble() == best().energy();
  }

  @Override
  public Iterator<Draw> iterator() {
    return rows.iterator();
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof Draws other
        && rows.equals(other.rows)
        && end == other.end
        && seed == other.seed
        && bound.equals(other.bound);
  }

  @Override
  public int hashCode() {
    return 31 * rows.hashCode() + Long.hashCode(seed);
  }

  @Override
  public String toString() {
    return "Draws("
        + total
        + " draws, "
        + rows.size()
        + " states, best "
        + best().energy()
        + ", end "
        + end
        + ")";
  }
}
