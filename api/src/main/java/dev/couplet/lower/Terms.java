package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;

/** Small questions about polynomials that several steps of the lowering ask. */
final class Terms {
  private Terms() {}

  /** The value on the given bits, of which there may be more than the polynomial has variables. */
  static double value(Polynomial polynomial, boolean[] bits) {
    return value(polynomial, variable -> bits[variable]);
  }

  /** The value where the variables are 1 that the predicate says. */
  static double value(Polynomial polynomial, IntPredicate one) {
    double[] sum = {0};
    polynomial.forEachTerm(
        (coefficient, variables) -> {
          boolean all = true;
          for (int variable : variables) {
            all &= one.test(variable);
          }
          sum[0] += all ? coefficient : 0;
        });
    return sum[0];
  }

  /** The lowest value over all bit patterns that the coefficients' signs allow. */
  static double lowest(Polynomial polynomial) {
    return polynomial.lowest();
  }

  /** The highest value over all bit patterns that the coefficients' signs allow. */
  static double highest(Polynomial polynomial) {
    return polynomial.highest();
  }

  static double magnitude(Polynomial polynomial) {
    return polynomial.magnitude();
  }

  static boolean whole(Polynomial polynomial) {
    return polynomial.whole();
  }

  /** The variables that occur, ascending. */
  static int[] variables(Polynomial polynomial) {
    IntStream.Builder all = IntStream.builder();
    polynomial.forEachTerm(
        (coefficient, variables) -> {
          for (int variable : variables) {
            all.add(variable);
          }
        });
    return all.build().sorted().distinct().toArray();
  }
}
