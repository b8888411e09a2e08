package dev.couplet.lower;

import dev.couplet.form.Polynomial;

/**
 * A quadratic form in literals, all treated alike, and auxiliary bits w: {@code pair S2 + sum_i
 * (alone_i + each_i S) w_i + sum_{i<j} together_ij w_i w_j}, with S the number of literals that
 * hold and S2 that of their pairs.
 */
final class SymmetricQuadratic {
  private final double pair;
  private final double[] alone;
  private final double[] each;
  private final double[][] together;

  /**
   * The coefficients.
   *
   * @param pair what two literals count that both hold
   * @param alone what each auxiliary bit counts
   * @param each what each auxiliary bit counts for each literal that holds
   * @param together what two auxiliary bits count; read where the first index is the lower, empty
   *     if none are coupled
   */
  SymmetricQuadratic(double pair, double[] alone, double[] each, double[][] together) {
    this.pair = pair;
    this.alone = alone;
    this.each = each;
    this.together = together;
  }

  /**
   * Adds so many times this form in literals, each a variable v or, written {@code ~v}, the
   * negation {@code 1 - v}; no two may be of one variable. Auxiliary bits are numbered from {@code
   * first}.
   */
  void addTo(Polynomial.Builder terms, double factor, int[] literals, int first) {
    for (int k = 0; k < literals.length && pair != 0; k++) {
      for (int l = k + 1; l < literals.length; l++) {
        add(terms, factor * pair, literals[k], literals[l]);
      }
    }
    for (int i = 0; i < alone.length; i++) {
      terms.add(factor * alone[i], first + i);
      for (int literal : literals) {
        add(terms, factor * each[i], literal, first + i);
      }
      for (int j = i + 1; j < together.length; j++) {
        terms.add(factor * together[i][j], first + i, first + j);
      }
    }
  }

  /** Adds the product of two literals. */
  static void add(Polynomial.Builder terms, double value, int k, int l) {
    if (k < 0) {
      add(terms, value, l);
      add(terms, -value, ~k, l);
    } else if (l < 0) {
      terms.add(value, k).add(-value, k, ~l);
    } else {
      terms.add(value, k, l);
    }
  }

  /** Adds a literal. */
  static void add(Polynomial.Builder terms, double value, int literal) {
    if (literal < 0) {
      terms.add(value).add(-value, ~literal);
    } else {
      terms.add(value, literal);
    }
  }

  int auxiliaries() {
    return alone.length;
  }

  /** The largest coefficient in so many literals, some of which are negated. */
  double largest(int degree, int negated) {
    double ofPlain = negated < degree ? pair * negated : 0;
    double ofNegated = negated > 0 ? pair * (negated - 1) : 0;
    double largest = Math.max(Math.abs(pair), Math.max(Math.abs(ofPlain), Math.abs(ofNegated)));
    for (int i = 0; i < alone.length; i++) {
      largest = Math.max(largest, Math.abs(alone[i] + negated * each[i]));
      largest = Math.max(largest, Math.abs(each[i]));
      for (int j = i + 1; j < together.length; j++) {
        largest = Math.max(largest, Math.abs(together[i][j]));
      }
    }
    return largest;
  }
}
