package dev.couplet.audit;

import dev.couplet.form.Polynomial;

/**
 * The value of a polynomial in any number of literals, kept up to date while single ones change.
 *
 * <p>Invariant: {@code missing[t]} is the number of literals of term t that do not hold, and the
 * value the sum of the coefficients of the terms with none missing.
 */
final class RunningTerms {
  private final int[][] termsOf;
  private final double[] coefficient;
  private final int[] width;
  private final int[] missing;
  private double value;

  RunningTerms(Polynomial polynomial) {
    int terms = polynomial.terms();
    coefficient = new double[terms];
    width = new int[terms];
    missing = new int[terms];
    int[] count = new int[polynomial.size()];
    int[] next = {0};
    polynomial.forEachTerm(
        (amount, literals) -> {
          for (int literal : literals) {
            count[literal]++;
          }
        });
    termsOf = new int[polynomial.size()][];
    for (int literal = 0; literal < count.length; literal++) {
      termsOf[literal] = new int[count[literal]];
    }
    polynomial.forEachTerm(
        (amount, literals) -> {
          int term = next[0]++;
          coefficient[term] = amount;
          width[term] = literals.length;
          for (int literal : literals) {
            termsOf[literal][--count[literal]] = term;
          }
        });
  }

  /** The number of terms that name a literal. */
  int termsOf(int literal) {
    return termsOf[literal].length;
  }

  /** Sums up afresh. */
  void reset(boolean[] holds) {
    System.arraycopy(width, 0, missing, 0, width.length);
    for (int literal = 0; literal < holds.length; literal++) {
      if (holds[literal]) {
        for (int term : termsOf[literal]) {
          missing[term]--;
        }
      }
    }
    double sum = 0;
    for (int term = 0; term < missing.length; term++) {
      sum += missing[term] == 0 ? coefficient[term] : 0;
    }
    value = sum;
  }

  /** Takes a literal's change along. */
  void change(int literal, boolean holds) {
    for (int term : termsOf[literal]) {
      if (holds) {
        value += --missing[term] == 0 ? coefficient[term] : 0;
      } else {
        value -= missing[term]++ == 0 ? coefficient[term] : 0;
      }
    }
  }

  double value() {
    return value;
  }
}
