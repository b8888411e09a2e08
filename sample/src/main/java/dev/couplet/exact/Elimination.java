package dev.couplet.exact;

import dev.couplet.bound.Rounding;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Vigil;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Finds the minimum of a sparse form by eliminating one variable after the other: the best value of
 * a variable is tabulated over the values of its neighbours, which become neighbours of each other
 * (Bertele and Brioschi, Nonserial Dynamic Programming, 1972; Dechter, Bucket elimination, 1999).
 *
 * <p>The width is the largest number of neighbours of a variable when its turn comes, at least the
 * treewidth of the form's graph; tables have {@code 2^width} entries. A form of larger width has
 * some variables conditioned: all their assignments are tried in turn. Where a form does not change
 * when all spins are flipped, one of them is set.
 *
 * <p>As a sampler it returns one state of lowest energy, and that energy as bound, whatever the
 * number of draws, sweeps and the seed; which one does not depend on the threads. For forms whose
 * energies are rounded the bound lies below by what rounding can amount to. A run that ends early
 * returns the best state so far, without a bound.
 *
 * <p>Time {@code O(2^c n 2^width)} for c conditioned variables; memory 8 bytes for each entry of
 * the tables alive. Immutable and thread-safe.
 */
public final class Elimination implements Sampler {
  private static final double MEMORY_SHARE = 0.7;

  private final int width;
  private final int conditioned;

  private Elimination(int width, int conditioned) {
    this.width = width;
    this.conditioned = conditioned;
  }

  /** Tables of at most 2^24 entries, at most 16 variables conditioned. */
  public static Elimination standard() {
    return new Elimination(24, 16);
  }

  /**
   * This method with tables of at most {@code 2^most} entries.
   *
   * @throws IllegalArgumentException if it is not between 0 and 30
   */
  public Elimination width(int most) {
    if (most < 0 || most > 30) {
      throw new IllegalArgumentException("the width is " + most + ", it must be from 0 to 30");
    }
    return new Elimination(most, conditioned);
  }

  /**
   * This method with at most so many variables whose values are tried in turn.
   *
   * @throws IllegalArgumentException if it is not between 0 and 60
   */
  public Elimination conditioned(int most) {
    if (most < 0 || most > 60) {
      throw new IllegalArgumentException(
          "the number of conditioned variables is " + most + ", it must be from 0 to 60");
    }
    return new Elimination(width, most);
  }

  /**
   * The number of table entries that a form would take, a measure of time: some 10^8 to 10^9 of
   * them a second; empty if the form's width is too large. O(n) steps of ordering.
   */
  public OptionalDouble steps(Qubo form) {
    ConditionedSweeps sweeps = new ConditionedSweeps(form, width, conditioned);
    return sweeps.possible() ? OptionalDouble.of(sweeps.steps()) : OptionalDouble.empty();
  }

  @Override
  public Draws sample(Qubo form, Run run) {
    run.requireFit(form.size());
    Vigil vigil = run.begin();
    ConditionedSweeps sweeps = prepared(form, false);
    sweeps.run(run.effort().threads(), false, vigil);
    List<State> states = sweeps.best().map(List::of).orElse(run.starts());
    if (states.isEmpty()) {
      states = List.of(State.zeros(form.size()));
    }
    Draws reached = Draws.of(form, states, End.TARGET, run.effort().seed());
    if (reached.best().energy() <= run.effort().target().orElse(Double.NEGATIVE_INFINITY)) {
      vigil.end(End.TARGET);
    }
    Draws draws = reached.end(vigil.reason());
    return sweeps.complete() ? draws.bound(bound(form, sweeps, draws)) : draws;
  }

  /** The lowest energy; what its sums may be too high by is taken off. */
  private static double bound(Qubo form, ConditionedSweeps sweeps, Draws draws) {
    if (form.exact()) {
      return sweeps.lowest();
    }
    long additions = 2L * form.size() + form.pairs() + 8;
    double margin = Rounding.ofSums(form, additions) + Rounding.ofEnergy(form);
    return Math.min(draws.best().energy(), sweeps.lowest() - margin);
  }

  /**
   * The lowest energy and how many states have it; empty if the run ended early. A target of the
   * run does not matter.
   *
   * @throws IllegalArgumentException if the form's width is too large, or its energies are rounded,
   *     so that ties cannot be told
   */
  public Optional<Ground> ground(Qubo form, Run run) {
    if (!form.exact()) {
      throw new IllegalArgumentException(
          "the form's energies are rounded, so that states of equal energy cannot be counted; scale"
              + " its coefficients to integers");
    }
    Vigil vigil = run.begin();
    ConditionedSweeps sweeps = prepared(form, true);
    sweeps.run(run.effort().threads(), true, vigil);
    if (!sweeps.complete()) {
      return Optional.empty();
    }
    return sweeps.best().map(state -> new Ground(sweeps.lowest(), sweeps.minima(), state));
  }

  private ConditionedSweeps prepared(Qubo form, boolean counting) {
    ConditionedSweeps sweeps = new ConditionedSweeps(form, width, conditioned);
    if (!sweeps.possible()) {
      throw new IllegalArgumentException(
          "tables of 2^"
              + width
              + " entries with "
              + conditioned
              + " variables conditioned are not enough for this form of "
              + form.size()
              + " variables and "
              + form.pairs()
              + " pairs; allow more with width(...) or conditioned(...), reduce the form first, or"
              + " use a method for dense forms");
    }
    double bytes = sweeps.bytes() * (counting ? 2 : 1);
    if (bytes > MEMORY_SHARE * Runtime.getRuntime().maxMemory()) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "the tables of width %d take %.0f MB, the heap has %d MB in all; lower width(...) or"
                  + " give the virtual machine more memory",
              sweeps.width(),
              bytes / (1 << 20),
              Runtime.getRuntime().maxMemory() >> 20));
    }
    return sweeps;
  }

  @Override
  public String toString() {
    return "Elimination(width " + width + ", conditioned " + conditioned + ")";
  }
}
