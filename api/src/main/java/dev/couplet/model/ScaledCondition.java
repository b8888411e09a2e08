package dev.couplet.model;

import dev.couplet.form.Polynomial;
import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * A condition brought to whole numbers: constants moved into the limits, decimals multiplied by a
 * power of ten, common factors taken out. Nothing is rounded; what does not fit is refused.
 *
 * @param terms the polynomial over literals, whole coefficients, no constant
 * @param lowest whole, or minus infinity
 * @param highest whole, or infinity
 * @param step whole; 1 where every whole number between the limits will do
 * @param unit what one whole unit is in the condition's own units
 */
record ScaledCondition(
    Polynomial terms, double lowest, double highest, double step, BigDecimal unit) {
  private static final BigDecimal LIMIT = BigDecimal.valueOf(1L << 51);

  /** The terms of the condition as they come, in exact decimals. */
  private static final class Terms {
    final List<BigDecimal> coefficients = new ArrayList<>();
    final List<int[]> products = new ArrayList<>();

    static Terms of(String rule, Condition.Part condition) {
      Terms terms = new Terms();
      try {
        Expansion.walk(
            condition.expr(),
            Arithmetic.DECIMALS,
            (coefficient, product) -> {
              terms.coefficients.add(coefficient);
              terms.products.add(product);
            });
      } catch (ArithmeticException tooLong) {
        throw new IllegalArgumentException(
            "rule '" + rule + "', multiplied out, has " + tooLong.getMessage() + ", beyond 2^51",
            tooLong);
      }
      return terms;
    }
  }

  static ScaledCondition of(String rule, Condition.Part condition, int literals) {
    Terms given = Terms.of(rule, condition);
    int places = places(given.coefficients, condition);
    BigDecimal constant = BigDecimal.ZERO;
    BigDecimal magnitude = BigDecimal.ZERO;
    Polynomial.Builder terms = Polynomial.builder(literals);
    for (int t = 0; t < given.products.size(); t++) {
      BigDecimal scaled = scaled(rule, given.coefficients.get(t), places);
      if (given.products.get(t).length == 0) {
        constant = constant.add(scaled);
      } else {
        magnitude = magnitude.add(scaled.abs());
        terms.add(scaled.doubleValue(), given.products.get(t));
      }
    }
    double lowest = limit(rule, condition.lowest(), constant, places);
    double highest = limit(rule, condition.highest(), constant, places);
    double step = scaled(rule, Text.decimal(condition.step()), places).doubleValue();
    requireExact(rule, magnitude);
    BigDecimal unit = BigDecimal.ONE.scaleByPowerOfTen(-places);
    return new ScaledCondition(terms.build(), lowest, highest, step, unit).reduced();
  }

  private static int places(List<BigDecimal> coefficients, Condition.Part condition) {
    int places = 0;
    for (BigDecimal coefficient : coefficients) {
      places = Math.max(places, coefficient.stripTrailingZeros().scale());
    }
    for (double limit : new double[] {condition.lowest(), condition.highest(), condition.step()}) {
      if (Double.isFinite(limit)) {
        places = Math.max(places, Text.decimal(limit).stripTrailingZeros().scale());
      }
    }
    return places;
  }

  private static double limit(String rule, double limit, BigDecimal constant, int places) {
    if (!Double.isFinite(limit)) {
      return limit;
    }
    return fitting(rule, limit, scaled(rule, Text.decimal(limit), places).subtract(constant));
  }

  private static BigDecimal scaled(String rule, BigDecimal number, int places) {
    BigDecimal scaled = number.scaleByPowerOfTen(places);
    double shown = number.doubleValue();
    fitting(rule, shown, scaled);
    return scaled;
  }

  private static double fitting(String rule, double original, BigDecimal scaled) {
    if (scaled.abs().compareTo(LIMIT) >= 0) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "rule '%s' cannot be kept in whole numbers: %s becomes %s, beyond 2^51, once all"
                  + " decimals of the rule are whole; round its numbers to fewer decimals or"
                  + " choose a larger unit",
              rule,
              Text.number(original),
              shown(scaled)));
    }
    return scaled.doubleValue();
  }

  /** Below 2^51 every sum of the coefficients is exact, also while equal products add up. */
  static void requireExact(String rule, BigDecimal magnitude) {
    if (magnitude.compareTo(LIMIT) >= 0) {
      throw new IllegalArgumentException(
          "the whole coefficients of rule '"
              + rule
              + "' add up to "
              + shown(magnitude)
              + ", beyond 2^51; round its numbers to fewer decimals or choose a larger unit");
    }
  }

  private static String shown(BigDecimal number) {
    return number.round(new MathContext(20)).toString();
  }

  /** Without the largest factor common to all coefficients and limits. */
  ScaledCondition reduced() {
    BigInteger[] factor = {BigInteger.ZERO};
    terms.forEachTerm((coefficient, literals) -> factor[0] = factor[0].gcd(whole(coefficient)));
    for (double limit : new double[] {lowest, highest, step}) {
      factor[0] = Double.isFinite(limit) ? factor[0].gcd(whole(limit)) : factor[0];
    }
    double common = factor[0].doubleValue();
    if (common <= 1) {
      return new ScaledCondition(terms, lowest, highest, Math.max(1, step), unit);
    }
    Polynomial.Builder divided = Polynomial.builder(terms.size());
    terms.forEachTerm((coefficient, literals) -> divided.add(coefficient / common, literals));
    return new ScaledCondition(
        divided.build(),
        lowest / common,
        highest / common,
        Math.max(1, step / common),
        unit.multiply(new BigDecimal(factor[0])));
  }

  /** The same in a model that has more literals by now. */
  ScaledCondition inLiterals(int literals) {
    return new ScaledCondition(terms.inVariables(literals), lowest, highest, step, unit);
  }

  /** What is left where literals are fixed: what they add moves into the limits. */
  ScaledCondition fixed(Fixing fixing) {
    Polynomial left = fixing.in(terms);
    double constant = left.constant();
    Polynomial free = Polynomial.builder(left.size()).add(left, 1).add(-constant).build();
    return new ScaledCondition(free, lowest - constant, highest - constant, step, unit);
  }

  private static BigInteger whole(double number) {
    return BigInteger.valueOf((long) number);
  }
}
