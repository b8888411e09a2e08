package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;

/**
 * Replaces terms of degree 3 and more by quadratic ones with auxiliary bits; minimised over these,
 * the value is unchanged for every pattern of the other bits.
 *
 * <p>A negative term of degree d takes one auxiliary bit w: {@code -a x1..xd = min_w a w (d - 1 -
 * S)} with S the sum of the x (Freedman and Drineas, "Energy minimization via graph cuts: settling
 * what is possible", 2005). A positive one takes {@code floor((d - 1) / 2)}: {@code a x1..xd =
 * min_w a (S2 + sum_i w_i (c_i (2i - S) - 1))} with S2 the sum of products of pairs, and c_i = 1
 * for the last i of an odd d, else 2 (Ishikawa, "Transformation of general binary MRF minimization
 * to the first-order case", 2011).
 */
final class DegreeReduction {
  private final BitTable bits;
  private final String source;
  private final List<Consumer<Polynomial.Builder>> reduced = new ArrayList<>();

  private DegreeReduction(BitTable bits, String source) {
    this.bits = bits;
    this.source = source;
  }

  static Polynomial of(Polynomial polynomial, String source, BitTable bits) {
    if (polynomial.degree() <= 2) {
      return polynomial;
    }
    DegreeReduction reduction = new DegreeReduction(bits, source);
    polynomial.forEachTerm(reduction::take);
    Polynomial.Builder quadratic = Polynomial.builder(bits.size());
    reduction.reduced.forEach(term -> term.accept(quadratic));
    return quadratic.build();
  }

  private void take(double coefficient, int[] variables) {
    if (variables.length <= 2) {
      add(coefficient, variables);
    } else if (coefficient < 0) {
      negative(-coefficient, variables);
    } else {
      positive(coefficient, variables);
    }
  }

  private void negative(double a, int[] variables) {
    int degree = variables.length;
    int w = bits.add("a product of " + degree + " in '" + source + "'");
    add(a * (degree - 1), w);
    for (int x : variables) {
      add(-a, w, x);
    }
    bits.completeWith(values -> values[w] = ones(variables, values) == degree);
  }

  private void positive(double a, int[] variables) {
    int degree = variables.length;
    int auxiliaries = (degree - 1) / 2;
    for (int x = 0; x < degree; x++) {
      for (int y = x + 1; y < degree; y++) {
        add(a, variables[x], variables[y]);
      }
    }
    for (int i = 1; i <= auxiliaries; i++) {
      int w = bits.add("part " + i + " of a product of " + degree + " in '" + source + "'");
      int c = degree % 2 == 1 && i == auxiliaries ? 1 : 2;
      add(a * (2.0 * c * i - 1), w);
      for (int x : variables) {
        add(-a * c, w, x);
      }
      int atLeast = 2 * i;
      bits.completeWith(values -> values[w] = ones(variables, values) >= atLeast);
    }
  }

  private void add(double coefficient, int... variables) {
    reduced.add(quadratic -> quadratic.add(coefficient, variables));
  }

  private static int ones(int[] variables, boolean[] values) {
    int ones = 0;
    for (int variable : variables) {
      ones += values[variable] ? 1 : 0;
    }
    return ones;
  }
}
