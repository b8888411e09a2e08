package dev.couplet.bound;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Vigil;
import java.util.OptionalDouble;

/**
 * The semidefinite bound, with triangle inequalities: the one for dense forms (Goemans and
 * Williamson 1995; Helmberg, Rendl, Vanderbei and Wolkowicz 1996; Rendl, Rinaldi and Wiegele 2010).
 *
 * <p>Spins become unit vectors; violated triangle inequalities are moved into the objective with
 * multipliers that are improved in rounds by subgradient steps. Whatever the multipliers and
 * however far from optimal the vectors, the bound is certified by a Cholesky factorisation,
 * rounding included.
 *
 * <p>Time {@code O(n^2.5)} a round and {@code O(n^3)} for each certificate and each look for
 * triangles, memory {@code O(n^2)}. Immutable and thread-safe.
 */
public final class SemidefiniteBound implements Bound {
  /** Forms with more bits than this are refused. */
  public static final int MOST_BITS = 1400;

  private static final int CERTIFY_EVERY = 20;

  /** Before so many rounds nothing is said of how the bound will go on. */
  private static final int PATIENCE = 60;

  /** How much faster than in the last period it may still rise. */
  private static final double HOPE = 1.5;

  private final int rounds;

  private SemidefiniteBound(int rounds) {
    this.rounds = rounds;
  }

  /** At most 300 rounds, unless the effort says how many sweeps. */
  public static SemidefiniteBound standard() {
    return new SemidefiniteBound(300);
  }

  /**
   * This bound with at most so many rounds; with 1, there are no triangle inequalities.
   *
   * @throws IllegalArgumentException if it is not 1 or more
   */
  public SemidefiniteBound rounds(int most) {
    if (most < 1) {
      throw new IllegalArgumentException(
          "the number of rounds is " + most + ", it must be 1 or more");
    }
    return new SemidefiniteBound(most);
  }

  @Override
  public double below(Qubo form, Run run) {
    int most = run.effort().sweeps().orElse(rounds);
    return new SemidefiniteBound(most).below(form, Double.POSITIVE_INFINITY, run.begin());
  }

  /**
   * The bound, as a stage of a run that has begun; ends as soon as it has reached {@code enough},
   * or rises so slowly that it will not.
   *
   * @throws IllegalArgumentException if the form is too large
   */
  public double below(Qubo form, double enough, Vigil vigil) {
    if (form.size() > MOST_BITS) {
      throw new IllegalArgumentException(
          "the form has "
              + form.size()
              + " variables, the semidefinite bound takes at most "
              + MOST_BITS
              + "; use another bound");
    }
    SemidefiniteRounds work = new SemidefiniteRounds(form, enough, vigil);
    double best = Double.NEGATIVE_INFINITY;
    for (int round = 1; round <= rounds && !vigil.over(); round++) {
      work.round();
      if (round == rounds || round % CERTIFY_EVERY == 1) {
        double before = best;
        best = Math.max(best, work.certified());
        vigil.report(OptionalDouble.empty(), OptionalDouble.empty(), OptionalDouble.of(best));
        double periods = (double) (rounds - round) / CERTIFY_EVERY;
        boolean hopeless = best + HOPE * periods * (best - before) < enough;
        if (best >= work.goal()
            || (enough < Double.POSITIVE_INFINITY && round > PATIENCE && hopeless)) {
          break;
        }
      }
    }
    return best;
  }
}
