package dev.couplet.exact.plans;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.List;

/**
 * Costs as whole numbers: each stands for so many times {@code 1 / unit} of the model's own.
 *
 * <p>The unit is the largest power of a tenth of which all costs are multiples, as close as doubles
 * that were added up can be expected to be: within 2^-49 of what all of them add up to. So 0.1 +
 * 0.2 is 0.3, as it was written. Costs that are no such multiples, while they add up to less than
 * 2^44 units, are rounded down to multiples of a power of two; then a plan never costs less than
 * its whole number says. Every finer unit that still fits is used for moving fractions of costs
 * about.
 */
final class Scale {
  private static final BigDecimal MOST = new BigDecimal(1L << 44);
  private static final long MOST_FINE = 1L << 46;
  private static final BigDecimal CLOSE = BigDecimal.ONE.divide(new BigDecimal(1L << 49));
  private static final int MOST_DIGITS = 30;

  private final BigDecimal factor;
  private final boolean exact;
  private final long fine;

  private Scale(BigDecimal factor, boolean exact, long fine) {
    this.factor = factor;
    this.exact = exact;
    this.fine = fine;
  }

  /**
   * The scale for costs like these.
   *
   * @param magnitude the sum of the magnitudes of all costs that can add up in a plan
   */
  static Scale of(List<BigDecimal> costs, BigDecimal magnitude) {
    BigDecimal tens = BigDecimal.ONE;
    while (magnitude.multiply(tens).compareTo(MOST) < 0 && tens.precision() < MOST_DIGITS) {
      if (multiples(costs, tens, magnitude.multiply(tens).multiply(CLOSE))) {
        return new Scale(tens, true, fine(magnitude.multiply(tens)));
      }
      tens = tens.scaleByPowerOfTen(1);
    }
    int exponent = 43 - Math.getExponent(magnitude.doubleValue());
    BigDecimal power = new BigDecimal(2).pow(Math.abs(exponent));
    BigDecimal twos = exponent >= 0 ? power : BigDecimal.ONE.divide(power);
    return new Scale(twos, false, fine(magnitude.multiply(twos)));
  }

  private static boolean multiples(List<BigDecimal> costs, BigDecimal factor, BigDecimal close) {
    for (BigDecimal cost : costs) {
      BigDecimal scaled = cost.multiply(factor);
      BigDecimal off = scaled.subtract(scaled.setScale(0, RoundingMode.HALF_EVEN));
      if (off.abs().compareTo(close) > 0) {
        return false;
      }
    }
    return true;
  }

  private static long fine(BigDecimal magnitude) {
    long fine = 1;
    long all = magnitude.setScale(0, RoundingMode.CEILING).longValueExact() + 1;
    while (fine < 1L << 30 && 2 * fine * all <= MOST_FINE) {
      fine *= 2;
    }
    return fine;
  }

  /** The decimal with the fewest digits that the double stands for. */
  static BigDecimal decimal(double value) {
    if (value == Math.rint(value) && Math.abs(value) < 0x1p53) {
      return BigDecimal.valueOf((long) value);
    }
    BigDecimal exact = new BigDecimal(value);
    for (int digits = 1; digits < 17; digits++) {
      BigDecimal rounded = exact.round(new MathContext(digits));
      if (rounded.doubleValue() == value) {
        return rounded;
      }
    }
    return exact.round(new MathContext(17));
  }

  /** Whether every cost is a whole number as it was written. */
  boolean exact() {
    return exact;
  }

  /** The number of fine units in a whole number. */
  long fine() {
    return fine;
  }

  /** The number of fine units in the model's own unit. */
  BigDecimal unit() {
    return factor.multiply(BigDecimal.valueOf(fine));
  }

  /** A cost as a whole number: what it is, or a little less. */
  long whole(BigDecimal cost) {
    RoundingMode mode = exact ? RoundingMode.HALF_EVEN : RoundingMode.FLOOR;
    return cost.multiply(factor).setScale(0, mode).longValueExact();
  }

  /** A whole number in the model's own units, rounded down. */
  double value(long whole) {
    BigDecimal own = new BigDecimal(whole).divide(factor, MathContext.DECIMAL128);
    double nearest = own.doubleValue();
    return new BigDecimal(nearest).compareTo(own) > 0 ? Math.nextDown(nearest) : nearest;
  }
}
