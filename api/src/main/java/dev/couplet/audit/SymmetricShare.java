package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.util.Optional;
import java.util.function.LongPredicate;

/**
 * A share in which some literals are treated alike, so that only the number s of those that hold
 * matters: {@code a s + b s (s - 1) / 2}, and for each auxiliary bit a linear function of s. Every
 * s is looked at, under every pattern of the auxiliary bits.
 *
 * <p>At most one of some, at least one of some, exactly k of some are such shares.
 */
final class SymmetricShare {
  private static final int MOST_OTHERS = 14;
  private static final long MOST_STEPS = 1 << 24;

  private final int literals;
  private final Polynomial other;
  private final double alone;
  private final double pair;
  private final double[] each;

  private SymmetricShare(int literals, Polynomial other, double alone, double pair, double[] each) {
    this.literals = literals;
    this.other = other;
    this.alone = alone;
    this.pair = pair;
    this.each = each;
  }

  /**
   * The share as a function of the number of literals that hold.
   *
   * @param terms over bits 0 to n - 1, then auxiliary ones
   * @param negated which of the n bits are 0 where their literal holds
   */
  static Optional<SymmetricShare> of(Polynomial terms, boolean[] negated) {
    int n = negated.length;
    int others = terms.size() - n;
    if (others > MOST_OTHERS || (long) (n + 1) << others > MOST_STEPS || terms.degree() > 2) {
      return Optional.empty();
    }
    Polynomial flipped = flipped(terms, negated);
    double alone = flipped.coefficient(0);
    double pair = n > 1 ? flipped.coefficient(0, 1) : 0;
    double[] each = new double[others];
    for (int w = 0; w < others; w++) {
      each[w] = flipped.coefficient(0, n + w);
    }
    Polynomial.Builder other = Polynomial.builder(others);
    boolean[] alike = {true};
    long[] met = {0, 0, 0};
    flipped.forEachTerm(
        (coefficient, v) -> {
          int last = v.length == 0 ? n : v[v.length - 1];
          if (v.length > 0 && last < n) {
            alike[0] &= coefficient == (v.length == 1 ? alone : pair);
            met[v.length - 1]++;
          } else if (v.length == 2 && v[0] < n) {
            alike[0] &= coefficient == each[last - n];
            met[2]++;
          } else {
            for (int k = 0; k < v.length; k++) {
              v[k] -= n;
            }
            other.add(coefficient, v);
          }
        });
    alike[0] &= met[0] == (alone == 0 ? 0 : n);
    alike[0] &= met[1] == (pair == 0 ? 0 : n * (n - 1L) / 2);
    long coupled = 0;
    for (double one : each) {
      coupled += one == 0 ? 0 : n;
    }
    alike[0] &= met[2] == coupled;
    return alike[0]
        ? Optional.of(new SymmetricShare(n, other.build(), alone, pair, each))
        : Optional.empty();
  }

  private static Polynomial flipped(Polynomial terms, boolean[] negated) {
    Polynomial.Builder flipped = Polynomial.builder(terms.size());
    terms.forEachTerm((coefficient, v) -> flip(coefficient, v, 0, negated, flipped));
    return flipped.build();
  }

  /** Writes 1 - y in the place of each negated bit of a product, from position k on. */
  private static void flip(
      double coefficient, int[] product, int k, boolean[] negated, Polynomial.Builder sum) {
    int at = k;
    while (at < product.length && (product[at] >= negated.length || !negated[product[at]])) {
      at++;
    }
    if (at == product.length) {
      sum.add(coefficient, product);
      return;
    }
    int[] without = new int[product.length - 1];
    System.arraycopy(product, 0, without, 0, at);
    System.arraycopy(product, at + 1, without, at, without.length - at);
    flip(coefficient, without, at, negated, sum);
    flip(-coefficient, product, at + 1, negated, sum);
  }

  /** The lowest value where so many literals hold. */
  double value(long held) {
    double lowest = Double.POSITIVE_INFINITY;
    int bits = other.size();
    boolean[] on = new boolean[bits];
    for (int pattern = 0; pattern < 1 << bits; pattern++) {
      double sum = alone * held + pair * (held * (held - 1.0) / 2);
      for (int w = 0; w < bits; w++) {
        on[w] = (pattern >>> w & 1) != 0;
        sum += on[w] ? each[w] * held : 0;
      }
      lowest = Math.min(lowest, sum + other.value(State.of(on)));
    }
    return lowest;
  }

  /** The proof that the share is a penalty of what the number of held literals has to be. */
  Optional<ShareProof> penalty(LongPredicate reachable, LongPredicate kept) {
    double ofKept = Double.NaN;
    double least = Double.POSITIVE_INFINITY;
    double lowest = Double.POSITIVE_INFINITY;
    for (long held = 0; held <= literals; held++) {
      double value = value(held);
      lowest = Math.min(lowest, value);
      if (reachable.test(held) && kept.test(held)) {
        if (value != ofKept && !Double.isNaN(ofKept)) {
          return Optional.empty();
        }
        ofKept = value;
      } else if (reachable.test(held)) {
        least = Math.min(least, value);
      }
    }
    return least > ofKept && lowest >= ofKept
        ? Optional.of(
            new ShareProof(
                ofKept, least - ofKept, 0, "symmetric in " + literals + " literals, all counts"))
        : Optional.empty();
  }
}
