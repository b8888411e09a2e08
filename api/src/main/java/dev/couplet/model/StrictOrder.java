package dev.couplet.model;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Statement.Objective;
import dev.couplet.model.Statement.Range;
import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;

/**
 * One objective out of several of which a later one never outweighs an earlier one.
 *
 * <p>The last counts as it is, beside the costs of preferred rules. From there backwards: all
 * values of an earlier one lie whole multiples of a step apart, the common factor of its
 * coefficients. In steps it has whole coefficients, and they are multiplied by the first whole
 * number above all that the later ones can win together. Constants of the earlier ones are left
 * out.
 */
final class StrictOrder {
  private static final double LIMIT = 0x1p51;

  /** Decimals of the last objective keep so much of their step. */
  private static final double DIGITS_LEFT = 0x1p-8;

  private static final int DIGITS = 14;

  private final List<Rule> rules;
  private final Function<Polynomial, Range> ranges;
  private double magnitude;
  private double width;

  private StrictOrder(List<Rule> rules, Function<Polynomial, Range> ranges) {
    this.rules = rules;
    this.ranges = ranges;
  }

  /** What each objective adds to the sum of all, in their order. */
  static List<Objective> shares(
      List<Objective> objectives, List<Rule> rules, Function<Polynomial, Range> ranges) {
    return objectives.size() < 2 ? objectives : new StrictOrder(rules, ranges).shares(objectives);
  }

  private List<Objective> shares(List<Objective> objectives) {
    List<Objective> shares = new ArrayList<>(objectives);
    int last = objectives.size() - 1;
    double limit = takeLast(objectives.get(last).terms());
    for (int k = last - 1; k >= 0; k--) {
      Objective own = objectives.get(k);
      shares.set(k, new Objective(own.name(), weighed(own.terms())));
      if (magnitude >= limit) {
        throw new IllegalArgumentException(
            "objective '"
                + own.name()
                + "' goes strictly before '"
                + objectives.get(k + 1).name()
                + "', which takes coefficients that add up to about "
                + Text.number(Math.rint(magnitude))
                + ", beyond "
                + Text.number(limit)
                + "; give the later objectives larger units, or fewer decimals");
      }
    }
    return shares;
  }

  /** Takes in the last objective and the costs; the largest magnitude that keeps their steps. */
  private double takeLast(Polynomial terms) {
    List<BigDecimal> numbers = coefficients(terms);
    width = ranges.apply(terms).width();
    magnitude = magnitudeOf(terms);
    for (Rule rule : rules) {
      width += rule.largestCost();
      magnitude += rule.largestCost();
      rule.parts().forEach(part -> numbers.add(Text.decimal(part.cost(1))));
    }
    BigDecimal step = step(numbers);
    boolean whole = step.signum() == 0 || step.stripTrailingZeros().scale() <= 0;
    return whole ? LIMIT : LIMIT * DIGITS_LEFT * step.doubleValue();
  }

  private Polynomial weighed(Polynomial terms) {
    int places = places(terms);
    BigDecimal step = step(coefficients(terms));
    double factor = Math.floor(width) + 1;
    Polynomial.Builder steps = Polynomial.builder(terms.size());
    terms.forEachTerm(
        (coefficient, literals) -> {
          if (literals.length > 0) {
            BigDecimal exact = rounded(coefficient, places);
            steps.add(exact.divideToIntegralValue(step).doubleValue(), literals);
          }
        });
    Polynomial inSteps = steps.build();
    width += factor * ranges.apply(inSteps).width();
    magnitude += factor * magnitudeOf(inSteps);
    return inSteps.times(factor);
  }

  private static double magnitudeOf(Polynomial terms) {
    double[] sum = {0};
    terms.forEachTerm((coefficient, literals) -> sum[0] += Math.abs(coefficient));
    return sum[0];
  }

  /** The coefficients without the constant. */
  private static List<BigDecimal> coefficients(Polynomial terms) {
    int places = places(terms);
    List<BigDecimal> coefficients = new ArrayList<>();
    terms.forEachTerm(
        (coefficient, literals) -> {
          if (literals.length > 0) {
            coefficients.add(rounded(coefficient, places));
          }
        });
    return coefficients;
  }

  /** Decimals that sums of such coefficients have right: 0.1 + 0.2 is 0.3 to so many. */
  private static int places(Polynomial terms) {
    double[] largest = {1e-300};
    terms.forEachTerm(
        (coefficient, literals) -> largest[0] = Math.max(largest[0], Math.abs(coefficient)));
    BigDecimal exact = new BigDecimal(largest[0]);
    return DIGITS - (exact.precision() - exact.scale());
  }

  private static BigDecimal rounded(double coefficient, int places) {
    return new BigDecimal(coefficient).setScale(places, RoundingMode.HALF_EVEN);
  }

  /** The largest number of which all the given ones are whole multiples; 0 if all are 0. */
  private static BigDecimal step(List<BigDecimal> numbers) {
    int places = Math.max(0, numbers.stream().mapToInt(BigDecimal::scale).max().orElse(0));
    BigInteger common = BigInteger.ZERO;
    for (BigDecimal number : numbers) {
      common = common.gcd(number.scaleByPowerOfTen(places).toBigInteger());
    }
    return new BigDecimal(common).scaleByPowerOfTen(-places);
  }
}
