package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import dev.couplet.form.Qubo;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;

/** The numbers that one audit adds up: whether that is exact, else how far it can be off. */
final class Numbers {
  private final List<Double> numbers = new ArrayList<>();

  void add(double number) {
    numbers.add(number);
  }

  void add(Polynomial polynomial) {
    polynomial.forEachTerm((coefficient, variables) -> numbers.add(coefficient));
  }

  /**
   * 0 if every partial sum of the numbers is exact; else a bound on the error of a sum of so many
   * of them.
   */
  double error(long additions) {
    Qubo.Builder form = Qubo.builder(numbers.size()).allowRounding();
    for (int k = 0; k < numbers.size(); k++) {
      form.addLinear(k, numbers.get(k));
    }
    Qubo sum = form.build();
    return sum.exact() ? 0 : Math.ulp(sum.magnitude()) * (additions + 1);
  }

  /** A number in few digits that are the same on every JDK. */
  static String shown(double value) {
    if (value == Math.rint(value) && Math.abs(value) < 1e15) {
      return Long.toString((long) value);
    }
    return Double.isFinite(value)
        ? new BigDecimal(value).round(new MathContext(9)).stripTrailingZeros().toString()
        : String.valueOf(value);
  }
}
