package dev.couplet.bound;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Vigil;
import java.util.OptionalDouble;

/**
 * A bound by splitting: each pair's coefficient gives a share to the linear coefficients of its two
 * ends, and then every variable and every pair is minimised by itself.
 *
 * <p>Any shares give a valid bound. A round goes over all pairs and gives each the shares that are
 * best while all others stay (Globerson and Jaakkola, Fixing max-product: convergent message
 * passing algorithms for MAP LP-relaxations, 2007; Werner, A linear programming approach to max-sum
 * problem: a review, 2007). For forms without cycles it reaches the minimum, in general at most the
 * roof dual (Hammer, Hansen and Simeone 1984).
 *
 * <p>Time O(n + m) a round, memory O(n + m). Rounds end early when four in a row gain nothing. If
 * the run ends before a large form is set up, the bound is negative infinity.
 */
public final class SplitBound implements Bound {
  /** Shares still move while the bound stands still: a round or two without gain prove nothing. */
  private static final int PATIENCE = 4;

  private static final int SMALL = 1 << 16;

  private final int rounds;

  private SplitBound(int rounds) {
    this.rounds = rounds;
  }

  /** At most 64 rounds, unless the effort says how many sweeps. */
  public static SplitBound standard() {
    return new SplitBound(64);
  }

  /**
   * This bound with at most so many rounds; with none, each pair is split evenly.
   *
   * @throws IllegalArgumentException if it is negative
   */
  public SplitBound rounds(int most) {
    if (most < 0) {
      throw new IllegalArgumentException(
          "the number of rounds is " + most + ", it must be 0 or more");
    }
    return new SplitBound(most);
  }

  @Override
  public double below(Qubo form, Run run) {
    Vigil vigil = run.begin();
    int most = run.effort().sweeps().orElse(rounds);
    // A small form is bounded whatever the vigil says: that takes less than two looks are apart.
    if (form.pairs() > SMALL && vigil.overBefore(32L * form.pairs())) {
      return Double.NEGATIVE_INFINITY;
    }
    return ScaledForm.of(form, vigil)
        .map(scaled -> below(scaled, most, vigil))
        .orElse(Double.NEGATIVE_INFINITY);
  }

  private static double below(ScaledForm scaled, int most, Vigil vigil) {
    Shares shares = new Shares(scaled, vigil);
    long best = shares.bound();
    int idle = 0;
    for (int round = 0; round < most; round++) {
      if (!shares.improve(round % 2 == 0, vigil)) {
        break;
      }
      long bound = shares.bound();
      idle = bound <= best ? idle + 1 : 0;
      if (idle == PATIENCE) {
        break;
      }
      best = bound;
      vigil.report(
          OptionalDouble.empty(), OptionalDouble.empty(), OptionalDouble.of(scaled.bound(best)));
    }
    return scaled.bound(best);
  }
}
