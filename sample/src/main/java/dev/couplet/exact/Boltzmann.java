package dev.couplet.exact;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.Locale;

/**
 * The Boltzmann distribution of a form: state x has probability {@code exp(-b E(x)) / Z}, where b
 * is the inverse temperature and Z the partition function. Computed by summing over all states, in
 * a fixed order, the same on every platform.
 *
 * <p>Results carry the rounding of sums of 2^n terms, some 2^-40 relative. Immutable. Making one
 * takes O(2^n) exponentials.
 */
public final class Boltzmann {
  /** Forms with more bits than this are refused. */
  public static final int MOST_BITS = 26;

  private final Qubo form;
  private final double inverseTemperature;
  private final double lowest;
  private final double sum;
  private final double meanEnergy;
  private final double variance;
  private final double[] mean;

  private Boltzmann(Qubo form, double inverseTemperature, double lowest, BoltzmannSums sums) {
    this.form = form;
    this.inverseTemperature = inverseTemperature;
    this.lowest = lowest;
    this.sum = sums.weight();
    double above = sums.energy() / sum;
    this.meanEnergy = lowest + above;
    this.variance = Math.max(0, sums.square() / sum - above * above);
    this.mean = sums.ones();
    for (int i = 0; i < mean.length; i++) {
      mean[i] /= sum;
    }
  }

  static Boltzmann of(Qubo form, double inverseTemperature) {
    if (form.size() > MOST_BITS) {
      throw new IllegalArgumentException(
          "the form has "
              + form.size()
              + " variables, the exact distribution takes at most "
              + MOST_BITS
              + "; reduce the form, or sample it");
    }
    if (!(inverseTemperature >= 0) || Double.isInfinite(inverseTemperature)) {
      throw new IllegalArgumentException(
          "the inverse temperature is " + inverseTemperature + ", it must be finite, 0 or more");
    }
    double lowest = Enumeration.standard().keep(1).levels(form, 1).minimum();
    return new Boltzmann(
        form, inverseTemperature, lowest, BoltzmannSums.of(form, inverseTemperature, lowest));
  }

  /** The inverse temperature b. */
  public double inverseTemperature() {
    return inverseTemperature;
  }

  /** The natural logarithm of the partition function Z. */
  public double logPartition() {
    return StrictMath.log(sum) - inverseTemperature * lowest;
  }

  /**
   * The probability of a state.
   *
   * @throws IllegalArgumentException if the state is of another size
   */
  public double probability(State state) {
    return StrictMath.exp(-inverseTemperature * (form.value(state) - lowest)) / sum;
  }

  /** The mean of variable {@code i}: the probability that it is 1. */
  public double mean(int i) {
    if (i < 0 || i >= mean.length) {
      throw new IllegalArgumentException(
          "variable " + i + " is not one of the " + mean.length + " variables of the form");
    }
    return mean[i];
  }

  /** The mean energy. */
  public double meanEnergy() {
    return meanEnergy;
  }

  /** The variance of the energy: the heat capacity over the square of b. */
  public double energyVariance() {
    return variance;
  }

  /** The entropy in nats: {@code ln Z + b <E>}. */
  public double entropy() {
    return StrictMath.log(sum) + inverseTemperature * (meanEnergy - lowest);
  }

  @Override
  public String toString() {
    return String.format(
        Locale.ROOT,
        "Boltzmann(%d variables, inverse temperature %.6g, mean energy %.6g)",
        form.size(),
        inverseTemperature,
        meanEnergy);
  }
}
