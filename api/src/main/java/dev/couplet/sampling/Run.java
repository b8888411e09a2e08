package dev.couplet.sampling;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.List;
import java.util.Objects;

/**
 * One call of a sampler, apart from the form: how much work, how watched, from where, and what is
 * known of the form.
 *
 * @param effort how much work may be done
 * @param watch how it is watched
 * @param starts states to begin from: draw k begins from start k modulo their number; if empty,
 *     draws begin at random
 * @param structure what is known of the form
 */
public record Run(Effort effort, Watch watch, List<State> starts, Structure structure) {
  /** Copies the list of starts. */
  public Run {
    Objects.requireNonNull(effort, "effort");
    Objects.requireNonNull(watch, "watch");
    Objects.requireNonNull(structure, "structure");
    starts = List.copyOf(starts);
  }

  /** An unwatched run from random states, nothing known of the form. */
  public static Run of(Effort effort) {
    return new Run(effort, Watch.none(), List.of(), Structure.none());
  }

  /** This run with another effort. */
  public Run effort(Effort newEffort) {
    return new Run(newEffort, watch, starts, structure);
  }

  /** This run, watched. */
  public Run watch(Watch newWatch) {
    return new Run(effort, newWatch, starts, structure);
  }

  /** This run from the given states. */
  public Run starts(List<State> newStarts) {
    return new Run(effort, watch, newStarts, structure);
  }

  /** This run with what is known of the form. */
  public Run structure(Structure newStructure) {
    return new Run(effort, watch, starts, newStructure);
  }

  /**
   * Begins to watch over this run on a form, with time kept for returning its draws; to be called
   * first, on the caller's own thread.
   */
  public Vigil begin(Qubo form) {
    return Vigil.begin(effort, watch, form);
  }

  /** Begins to watch over this run; to be called first, on the caller's own thread. */
  public Vigil begin() {
    return Vigil.begin(effort, watch);
  }

  /**
   * Insists that starts and structure fit a form of so many variables; every sampler does so first.
   *
   * @throws IllegalArgumentException naming the first start of another size, or the first bit of
   *     the structure that the form does not have
   */
  public void requireFit(int size) {
    for (int k = 0; k < starts.size(); k++) {
      if (starts.get(k).size() != size) {
        throw new IllegalArgumentException(
            "start "
                + k
                + " has "
                + starts.get(k).size()
                + " variables, the form has "
                + size
                + "; pass states of the form that is sampled");
      }
    }
    structure.requireWithin(size);
  }
}
