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
    double[] sum = {0};
    polynomial.forEachTerm(
        (coefficient, variables) ->
            sum[0] += variables.length == 0 ? coefficient : Math.min(0, coefficient));
    return sum[0];
  }

  /** The highest value over all bit patterns that the coefficients' signs allow. */
  static double highest(Polynomial polynomial) {
    return -lowest(polynomial.times(-1));
  }

  static double magnitude(Polynomial polynomial) {
    double[] sum = {0};
    polynomial.forEachTerm((coefficient, variables) -> sum[0] += Math.abs(coefficient));
    return sum[0];
  }

  static boolean whole(Polynomial polynomial) {
    boolean[] whole = {true};
    polynomial.forEachTerm(
        (coefficient, variables) -> whole[0] &= coefficient == Math.rint(coefficient));
    return whole[0];
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
