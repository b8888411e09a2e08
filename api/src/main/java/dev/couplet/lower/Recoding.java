package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Writes polynomials over the digits of one count over the bits of another code of it.
 *
 * <p>The polynomial must be one in the number, as sums and products of counts are. What stands
 * beside one product of other literals is a function f of the number v, given over the digits. If
 * its longest product of digits is shorter than there are digits, f is a polynomial in v of that
 * degree (a power of v has products of as many digits as its degree); else of degree width at most.
 * So f(v) is the sum of the j-th forward difference of f at 0 times C(v, j), and C(v, j) over bits
 * with amounts a is the coefficient of t^j in the product of {@code 1 + x ((1 + t)^a - 1)}
 * (Vandermonde): whole numbers stay whole.
 */
final class Recoding {
  private final Recoded count;
  private final int firstBit;

  /** Bits are numbered from {@code firstBit} on, in one numbering with the literals. */
  Recoding(Recoded count, int firstBit) {
    this.count = count;
    this.firstBit = firstBit;
  }

  /** The same polynomial with no digit in it. */
  Polynomial of(Polynomial polynomial) {
    Map<List<Integer>, Polynomial.Builder> besides = new LinkedHashMap<>();
    int size = polynomial.size();
    polynomial.forEachTerm(
        (coefficient, product) -> {
          int[] own = Arrays.stream(product).filter(count::hasDigit).toArray();
          List<Integer> others =
              Arrays.stream(product).filter(v -> !count.hasDigit(v)).boxed().toList();
          besides.computeIfAbsent(others, key -> Polynomial.builder(size)).add(coefficient, own);
        });
    Polynomial.Builder sum = Polynomial.builder(size);
    besides.forEach(
        (others, function) -> {
          int[] product = others.stream().mapToInt(Integer::intValue).toArray();
          overBits(function.build())
              .forEachTerm(
                  (coefficient, bits) -> {
                    int[] all = Arrays.copyOf(product, product.length + bits.length);
                    System.arraycopy(bits, 0, all, product.length, bits.length);
                    sum.add(coefficient, all);
                  });
        });
    return sum.build();
  }

  private Polynomial overBits(Polynomial function) {
    CountEncoding.Code digits = count.digits();
    long width = count.width();
    int degree = function.degree();
    if (degree == digits.amounts().size()) {
      degree = (int) Math.min(width, Integer.MAX_VALUE);
    }
    double[] differences = new double[degree + 1];
    for (int v = 0; v <= degree && v <= width; v++) {
      boolean[] set = digits.pattern(v);
      differences[v] = Terms.value(function, digit -> set[digit - count.first()]);
    }
    int known = (int) Math.min(degree, width);
    for (int order = 1; order <= known; order++) {
      for (int v = known; v >= order; v--) {
        differences[v] -= differences[v - 1];
      }
    }
    while (known > 0 && differences[known] == 0) {
      known--;
    }
    List<Polynomial> binomials = binomials(known, function.size());
    Polynomial.Builder sum = Polynomial.builder(function.size());
    for (int j = 0; j <= known; j++) {
      sum.add(binomials.get(j), differences[j]);
    }
    return sum.build();
  }

  /** C(v, j) over the bits, for j from 0 on. */
  private List<Polynomial> binomials(int highest, int size) {
    CountEncoding.Code code = count.code();
    List<Polynomial> powers = new ArrayList<>();
    for (int j = 0; j <= highest; j++) {
      powers.add(Polynomial.builder(size).add(j == 0 ? 1 : 0).build());
    }
    for (int bit = 0; bit < code.amounts().size(); bit++) {
      long amount = code.amounts().get(bit);
      Polynomial x = Polynomial.builder(size).add(1, firstBit + bit).build();
      for (int j = highest; j >= 1; j--) {
        Polynomial.Builder next = Polynomial.builder(size);
        double choose = 1;
        for (int i = 1; i <= Math.min(j, amount); i++) {
          choose = choose * (amount - i + 1) / i;
          next.add(powers.get(j - i), choose);
        }
        powers.set(j, powers.get(j).plus(next.build().times(x)));
      }
    }
    return powers;
  }
}
