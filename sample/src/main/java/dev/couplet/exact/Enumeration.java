package dev.couplet.exact;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Looks at all 2^n states of a form of at most {@value #MOST_BITS} bits.
 *
 * <p>As a sampler it returns every state of lowest energy once, up to {@link #keep} of them, and
 * that energy as bound: {@code draws.proved()} holds. The number of draws and of sweeps of the
 * effort do not matter, nor does the seed. With a target it ends at the first state, in the order
 * of the walk, that reaches it. A run that is stopped or out of time returns the lowest states so
 * far, without a bound.
 *
 * <p>Two states are of equal energy if {@link Qubo#value} says so. For forms that are {@linkplain
 * Qubo#exact() exact} all arithmetic of the walk is exact; for others, whatever comes within the
 * rounding error of the walk is computed again from the coefficients, so that accumulated rounding
 * decides nothing; equal energies that {@code Qubo.value} itself rounds differently stay apart.
 *
 * <p>Time O(2^n), some 3 billion states a second and thread; the threads of the effort share it and
 * do not change the result. Memory O(n 2^10). Immutable and thread-safe.
 */
public final class Enumeration implements Sampler {
  /** Forms with more bits than this are refused. */
  public static final int MOST_BITS = 34;

  private final int keep;

  private Enumeration(int keep) {
    this.keep = keep;
  }

  /** Keeps at most 4096 states of lowest energy. */
  public static Enumeration standard() {
    return new Enumeration(4096);
  }

  /**
   * This method, keeping at most so many states of lowest energy: the first ones of the walk. All
   * are counted.
   *
   * @throws IllegalArgumentException if it is not 1 or more
   */
  public Enumeration keep(int states) {
    if (states < 1) {
      throw new IllegalArgumentException(
          "the number of states to keep is " + states + ", it must be 1 or more");
    }
    return new Enumeration(states);
  }

  @Override
  public Draws sample(Qubo form, Run run) {
    requireSmall(form);
    run.requireFit(form.size());
    Vigil vigil = run.begin();
    Levels levels = search(form, 1, run.effort(), vigil);
    List<State> states = new ArrayList<>(levels.lowest());
    if (states.isEmpty()) {
      states.addAll(run.starts());
    }
    if (states.isEmpty()) {
      states.add(State.zeros(form.size()));
    }
    Draws draws = Draws.of(form, states, levels.end(), run.effort().seed());
    return levels.complete() ? draws.bound(levels.minimum()) : draws;
  }

  /**
   * The {@code count} lowest energy levels of a form; fewer if it has fewer.
   *
   * @throws IllegalArgumentException if the form is too large or {@code count} is not 1 or more
   */
  public Levels levels(Qubo form, int count) {
    return levels(form, count, Run.of(Effort.draws(1)));
  }

  /**
   * The {@code count} lowest energy levels of a form; fewer if it has fewer, or if the run ends
   * before all states were looked at. A target of the run does not matter.
   *
   * @throws IllegalArgumentException if the form is too large or {@code count} is not 1 or more
   */
  public Levels levels(Qubo form, int count, Run run) {
    requireSmall(form);
    if (count < 1) {
      throw new IllegalArgumentException(
          "the number of levels is " + count + ", it must be 1 or more");
    }
    return search(form, count, run.effort().withoutTarget(), run.begin());
  }

  /**
   * The Boltzmann distribution of a form of at most {@value Boltzmann#MOST_BITS} bits.
   *
   * @param inverseTemperature finite, 0 or more
   * @throws IllegalArgumentException if the form is too large or the inverse temperature is not
   *     such a number
   */
  public Boltzmann boltzmann(Qubo form, double inverseTemperature) {
    requireSmall(form);
    return Boltzmann.of(form, inverseTemperature);
  }

  /** The lowest level of a form, unless it lies above the ceiling: then nothing. */
  static Levels lowest(Qubo form, double ceiling, int threads, Vigil vigil) {
    StateSpace space = new StateSpace(form);
    Search search = new Search(space, 1, 1, OptionalDouble.empty(), ceiling, vigil);
    return Levels.of(space, search.run(threads), vigil.reason());
  }

  private Levels search(Qubo form, int count, Effort effort, Vigil vigil) {
    Tally tally = new Tally(count, keep);
    StateSpace space = new StateSpace(form);
    OptionalDouble target = effort.target();
    if (!vigil.over()) {
      if (form.size() == 0) {
        tally.add(form.constant(), 0);
      } else {
        double ceiling = Double.POSITIVE_INFINITY;
        tally = new Search(space, count, keep, target, ceiling, vigil).run(effort.threads());
      }
      if (tally.size() > 0 && target.isPresent() && tally.energy(0) <= target.getAsDouble()) {
        vigil.end(End.TARGET);
      }
    }
    return Levels.of(space, tally, vigil.reason());
  }

  private static void requireSmall(Qubo form) {
    if (form.size() > MOST_BITS) {
      throw new IllegalArgumentException(
          "the form has "
              + form.size()
              + " variables, enumeration looks at every state and takes at most "
              + MOST_BITS
              + "; reduce the form or split it first, or use a method that does not look at all"
              + " states");
    }
  }

  @Override
  public String toString() {
    return "Enumeration(keep " + keep + ")";
  }
}
