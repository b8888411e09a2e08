package dev.couplet.reduce;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.ArrayList;
import java.util.Collections;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/**
 * A form made smaller: independent parts whose minima add up, with a constant, to the original's.
 *
 * <p>For a minimum of each part, {@link #restore} gives a minimum of the original; its energy is
 * the constant plus the parts' energies, up to {@link #slack}. Immutable.
 */
public final class Reduced {
  private final Qubo original;
  private final History history;
  private final double constant;
  private final double slack;
  private final double bound;
  private final List<int[]> bits;
  private final List<Qubo> parts;

  Reduced(Qubo original, Graph graph, History history, double roof) {
    this.original = original;
    this.history = history;
    this.constant = graph.constant;
    this.slack = graph.slack;
    this.bits = Parts.of(graph);
    List<Qubo> forms = new ArrayList<>(bits.size());
    int[] position = new int[graph.size];
    for (int[] part : bits) {
      forms.add(graph.form(part, position, 0));
    }
    this.parts = List.copyOf(forms);
    this.bound = parts.isEmpty() ? constant - slack : roof;
  }

  /** The form that was reduced. */
  public Qubo original() {
    return original;
  }

  /** What is left: connected parts without a constant, in the order of their first bits. */
  public List<Qubo> parts() {
    return parts;
  }

  /** How many bits are left. */
  public int size() {
    return bits.stream().mapToInt(part -> part.length).sum();
  }

  /** What every energy has in common, apart from the parts. */
  public double constant() {
    return constant;
  }

  /** By how much rounding may have moved the minimum: 0 if the form's energies are exact. */
  public double slack() {
    return slack;
  }

  /**
   * A number that no energy of the original is below: the minimum itself if nothing is left, else
   * what the roof dual gave, or negative infinity without it.
   */
  public double bound() {
    return bound;
  }

  /** How many bits each rule removed; rules that removed none are left out. */
  public Map<Removal, Integer> report() {
    Map<Removal, Integer> copy = new EnumMap<>(Removal.class);
    copy.putAll(history.counts());
    return Collections.unmodifiableMap(copy);
  }

  /**
   * The state of the original whose remaining bits are given and whose removed bits are best for
   * them.
   *
   * @param states one state for each of the parts, in their order
   * @throws IllegalArgumentException if their number or a size is wrong
   */
  public State restore(List<State> states) {
    if (states.size() != parts.size()) {
      throw new IllegalArgumentException(
          "there are " + states.size() + " states for " + parts.size() + " parts; give one each");
    }
    boolean[] values = new boolean[original.size()];
    for (int p = 0; p < parts.size(); p++) {
      State state = states.get(p);
      int[] own = bits.get(p);
      if (state.size() != own.length) {
        throw new IllegalArgumentException(
            "the state of part "
                + p
                + " has "
                + state.size()
                + " variables, the part has "
                + own.length);
      }
      for (int k = 0; k < own.length; k++) {
        values[own[k]] = state.get(k);
      }
    }
    history.undo(values);
    return State.of(values);
  }

  /**
   * The values that the remaining bits have in a state of the original: one state a part, to begin
   * from.
   *
   * @throws IllegalArgumentException if the state is of another size
   */
  public List<State> project(State state) {
    if (state.size() != original.size()) {
      throw new IllegalArgumentException(
          "the state has " + state.size() + " variables, the form has " + original.size());
    }
    List<State> states = new ArrayList<>(bits.size());
    for (int[] own : bits) {
      boolean[] values = new boolean[own.length];
      for (int k = 0; k < own.length; k++) {
        values[k] = state.get(own[k]);
      }
      states.add(State.of(values));
    }
    return List.copyOf(states);
  }

  @Override
  public String toString() {
    return "Reduced("
        + original.size()
        + " variables to "
        + size()
        + " in "
        + parts.size()
        + " parts, removed "
        + history.counts()
        + ")";
  }
}
