package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;

/**
 * The terms of a polynomial, found by their bits from a first one on, while products are put in the
 * place of single bits. Linear in the terms that are touched.
 */
final class TermsByBit {
  private final int size;
  private final int first;
  private final List<int[]> products = new ArrayList<>();
  private final List<Double> coefficients = new ArrayList<>();
  private final Map<Integer, List<Integer>> termsOf = new LinkedHashMap<>();

  TermsByBit(Polynomial polynomial, int first) {
    this.size = polynomial.size();
    this.first = first;
    polynomial.forEachTerm(this::add);
  }

  private void add(double coefficient, int[] product) {
    for (int bit : product) {
      if (bit >= first) {
        termsOf.computeIfAbsent(bit, b -> new ArrayList<>()).add(products.size());
      }
    }
    products.add(product);
    coefficients.add(coefficient);
  }

  /** What the bit is multiplied by: products of other bits, and their coefficients. */
  Map<List<Integer>, Double> of(int bit) {
    Map<List<Integer>, Double> others = new LinkedHashMap<>();
    for (int term : termsOf.getOrDefault(bit, List.of())) {
      List<Integer> rest = Arrays.stream(products.get(term)).filter(b -> b != bit).boxed().toList();
      others.merge(rest, coefficients.get(term), Double::sum);
    }
    return others;
  }

  /** Puts the product of x and y in the place of a bit; all three bits are different. */
  void replace(int bit, int x, int y) {
    List<Integer> own = termsOf.remove(bit);
    if (own == null) {
      return;
    }
    for (int term : own) {
      double coefficient = coefficients.get(term);
      if (coefficient != 0) {
        IntStream rest = Arrays.stream(products.get(term)).filter(b -> b != bit);
        int[] product = IntStream.concat(rest, IntStream.of(x, y)).sorted().distinct().toArray();
        coefficients.set(term, 0.0);
        add(coefficient, product);
      }
    }
  }

  /** The polynomial as it is now. */
  Polynomial build() {
    Polynomial.Builder sum = Polynomial.builder(size);
    for (int term = 0; term < products.size(); term++) {
      sum.add(coefficients.get(term), products.get(term));
    }
    return sum.build();
  }
}
