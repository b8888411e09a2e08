package dev.couplet.sampling;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.AbstractList;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.HashMap;
import java.util.Iterator;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.RandomAccess;

/**
 * What a sampler returns: the states its draws ended in, lowest energy first, equal states merged.
 *
 * <p>Rows of equal energy stand in the order of their first draw. At least one row. Two results are
 * equal if they say the same of every draw. Immutable.
 */
public final class Draws implements Iterable<Draw> {
  private final List<Draw> rows;

  /** Draw k ended in the state of row {@code rowOf[k]}. */
  private final int[] rowOf;

  private final End end;
  private final long seed;
  private final OptionalDouble bound;

  private Draws(List<Draw> rows, int[] rowOf, End end, long seed, OptionalDouble bound) {
    this.rows = rows;
    this.rowOf = rowOf;
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
    Map<State, Draw> valued = new HashMap<>();
    List<Draw> draws = new ArrayList<>(states.size());
    for (State state : states) {
      Draw draw = valued.get(state);
      if (draw == null) {
        draw = Draw.of(form, state);
        valued.put(state, draw);
      }
      draws.add(draw);
    }
    return of(draws, end, seed);
  }

  /**
   * Gathers draws 0, 1, 2, ..., each made by {@link Draw#of}: for runs that have valued their
   * states already, so that nothing is left to do for it once their time is up.
   *
   * @param draws where each draw ended, at least one
   * @throws IllegalArgumentException if there is no draw, or one of a multiplicity other than 1
   */
  public static Draws of(List<Draw> draws, End end, long seed) {
    if (draws.isEmpty()) {
      throw new IllegalArgumentException("there is no draw; a run returns at least one state");
    }
    Map<State, Integer> placeOfState = new HashMap<>();
    List<Row> unsorted = new ArrayList<>();
    int[] placeOf = new int[draws.size()];
    for (int k = 0; k < placeOf.length; k++) {
      Draw draw = draws.get(k);
      if (draw.multiplicity() != 1) {
        throw new IllegalArgumentException(
            "draw " + k + " has multiplicity " + draw.multiplicity() + "; pass each by itself");
      }
      Integer seen = placeOfState.putIfAbsent(draw.state(), unsorted.size());
      placeOf[k] = seen == null ? unsorted.size() : seen;
      if (seen == null) {
        unsorted.add(new Row(unsorted.size(), draw));
      }
    }
    return sorted(unsorted, placeOf, end, seed);
  }

  /** A row with its place in the order of first draws. Its energy orders it. */
  private record Row(int place, Draw draw) implements Comparable<Row> {
    @Override
    public int compareTo(Row other) {
      return Double.compare(draw.energy(), other.draw.energy());
    }
  }

  private static Draws sorted(List<Row> unsorted, int[] placeOf, End end, long seed) {
    int[] counts = new int[unsorted.size()];
    for (int place : placeOf) {
      counts[place]++;
    }
    Collections.sort(unsorted);
    List<Draw> rows = new ArrayList<>(unsorted.size());
    int[] rowOfPlace = new int[unsorted.size()];
    for (Row row : unsorted) {
      rowOfPlace[row.place] = rows.size();
      rows.add(new Draw(row.draw.state(), row.draw.energy(), counts[row.place]));
    }
    int[] rowOf = new int[placeOf.length];
    for (int k = 0; k < rowOf.length; k++) {
      rowOf[k] = rowOfPlace[placeOf[k]];
    }
    return new Draws(Collections.unmodifiableList(rows), rowOf, end, seed, OptionalDouble.empty());
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
    return new Draws(rows, rowOf, end, seed, OptionalDouble.of(lowerBound));
  }

  /** These draws with another reason why the run ended. */
  public Draws end(End newEnd) {
    return new Draws(rows, rowOf, newEnd, seed, bound);
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
    return rowOf.length;
  }

  /** Where draws 0, 1, 2, ... ended, unmerged. */
  public List<State> inOrder() {
    return new Sequence(rows, rowOf);
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
        && Arrays.equals(rowOf, other.rowOf)
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
        + total()
        + " draws, "
        + rows.size()
        + " states, best "
        + best().energy()
        + ", end "
        + end
        + ")";
  }

  /** A view of the states by the number of the draw. */
  private static final class Sequence extends AbstractList<State> implements RandomAccess {
    private final List<Draw> rows;
    private final int[] rowOf;

    Sequence(List<Draw> rows, int[] rowOf) {
      this.rows = rows;
      this.rowOf = rowOf;
    }

    @Override
    public State get(int draw) {
      return rows.get(rowOf[draw]).state();
    }

    @Override
    public int size() {
      return rowOf.length;
    }
  }
}
