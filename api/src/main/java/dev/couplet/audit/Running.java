package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.List;

/**
 * The value of a polynomial in at most 64 variables, kept up to date while single variables flip.
 *
 * <p>Invariant: for each variable, the terms that name it lie side by side, each as the mask of its
 * other variables: flipping it changes the value by the coefficients whose mask holds.
 */
final class Running implements Flips {
  private final long[] mask;
  private final double[] coefficient;
  private final long[][] othersOf;
  private final double[][] coefficientsOf;
  private double value;

  Running(Polynomial polynomial) {
    List<Long> masks = new ArrayList<>();
    List<Double> coefficients = new ArrayList<>();
    polynomial.forEachTerm(
        (amount, variables) -> {
          long product = 0;
          for (int variable : variables) {
            product |= 1L << variable;
          }
          masks.add(product);
          coefficients.add(amount);
        });
    mask = masks.stream().mapToLong(Long::longValue).toArray();
    coefficient = coefficients.stream().mapToDouble(Double::doubleValue).toArray();
    othersOf = new long[polynomial.size()][];
    coefficientsOf = new double[polynomial.size()][];
    for (int i = 0; i < polynomial.size(); i++) {
      gather(i);
    }
  }

  private void gather(int variable) {
    long bit = 1L << variable;
    int count = 0;
    for (long product : mask) {
      count += (product & bit) != 0 ? 1 : 0;
    }
    othersOf[variable] = new long[count];
    coefficientsOf[variable] = new double[count];
    int next = 0;
    for (int t = 0; t < mask.length; t++) {
      if ((mask[t] & bit) != 0) {
        othersOf[variable][next] = mask[t] & ~bit;
        coefficientsOf[variable][next++] = coefficient[t];
      }
    }
  }

  /** The number of terms that name a variable. */
  int termsOf(int variable) {
    return othersOf[variable].length;
  }

  @Override
  public void reset(long pattern) {
    double sum = 0;
    for (int t = 0; t < mask.length; t++) {
      if ((pattern & mask[t]) == mask[t]) {
        sum += coefficient[t];
      }
    }
    value = sum;
  }

  @Override
  public void flip(int bit, long pattern) {
    long[] others = othersOf[bit];
    double[] coefficients = coefficientsOf[bit];
    double change = 0;
    for (int t = 0; t < others.length; t++) {
      if ((pattern & others[t]) == others[t]) {
        change += coefficients[t];
      }
    }
    value += (pattern >>> bit & 1) != 0 ? change : -change;
  }

  double value() {
    return value;
  }
}
