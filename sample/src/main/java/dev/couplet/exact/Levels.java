package dev.couplet.exact;

import dev.couplet.form.State;
import dev.couplet.sampling.End;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/**
 * The lowest energy levels of a form, from an enumeration.
 *
 * <p>If the run was cut short, they are those of the states looked at: {@link #complete()} tells.
 * Immutable.
 */
public final class Levels {
  /**
   * One energy that states of the form have.
   *
   * @param energy the energy
   * @param states how many states have it: the level's degeneracy
   */
  public record Level(double energy, long states) {}

  private final List<Level> levels;
  private final List<State> lowest;
  private final End end;

  private Levels(List<Level> levels, List<State> lowest, End end) {
    this.levels = List.copyOf(levels);
    this.lowest = List.copyOf(lowest);
    this.end = end;
  }

  static Levels of(StateSpace space, Tally tally, End end) {
    List<Level> levels = new ArrayList<>(tally.size());
    for (int l = 0; l < tally.size(); l++) {
      levels.add(new Level(tally.energy(l), tally.count(l)));
    }
    List<State> lowest = new ArrayList<>();
    for (long number : tally.kept()) {
      lowest.add(space.state(number));
    }
    return new Levels(levels, lowest, end);
  }

  /** The levels, lowest first; empty only if the run ended before it looked at any state. */
  public List<Level> levels() {
    return levels;
  }

  /** States of the lowest level, as many as were to be kept. */
  public List<State> lowest() {
    return lowest;
  }

  /** Why the run ended. */
  public End end() {
    return end;
  }

  /** Whether every state of the form was looked at. */
  public boolean complete() {
    return end == End.DONE;
  }

  /**
   * The lowest energy.
   *
   * @throws IllegalStateException if no state was looked at
   */
  public double minimum() {
    return first().energy();
  }

  /**
   * How many states have the lowest energy.
   *
   * @throws IllegalStateException if no state was looked at
   */
  public long minima() {
    return first().states();
  }

  /** The distance between the two lowest levels; empty if fewer than two are known. */
  public OptionalDouble gap() {
    return levels.size() < 2
        ? OptionalDouble.empty()
        : OptionalDouble.of(levels.get(1).energy() - levels.get(0).energy());
  }

  private Level first() {
    if (levels.isEmpty()) {
      throw new IllegalStateException(
          "the run ended (" + end + ") before any state was looked at; give it more time");
    }
    return levels.get(0);
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof Levels other
        && levels.equals(other.levels)
        && lowest.equals(other.lowest)
        && end == other.end;
  }

  @Override
  public int hashCode() {
    return 31 * levels.hashCode() + lowest.hashCode();
  }

  @Override
  public String toString() {
    return "Levels(" + levels + ", end " + end + ")";
  }
}
