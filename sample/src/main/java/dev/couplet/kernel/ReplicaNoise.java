package dev.couplet.kernel;

import java.util.Arrays;
import java.util.SplittableRandom;

/**
 * Words of 64 independent bits, each 1 with a given probability, many words at a time.
 *
 * <p>Every place of a block has a generator of its own, xorshift128+ (Vigna, "Further scramblings
 * of Marsaglia's xorshift generators", 2017), seeded from the run's stream; all of them step
 * together in loops that the compiler turns into vector instructions. A probability is taken as m /
 * 2^16, and a word is built from 16 random words r, from the lowest bit of m up: {@code word | r}
 * where the bit is 1, {@code word & r} where it is 0; that halves the probability so far and adds a
 * half or nothing. Bits below the lowest 1 of m need no words.
 *
 * <p>The rounding to m is up or down at random, once a block, so that each bit of a word is 1 with
 * exactly the probability that was asked for. No word is ever used twice, and none is shared
 * between bits: the 64 lanes stay independent.
 */
final class ReplicaNoise {
  private static final int BITS = 16;
  private static final double ONE = 1 << BITS;

  private final long[] first;
  private final long[] second;
  private final SplittableRandom random;

  /** Blocks of so many words. */
  ReplicaNoise(int length, SplittableRandom random) {
    this.random = random;
    this.first = new long[length];
    this.second = new long[length];
    for (int k = 0; k < length; k++) {
      first[k] = random.nextLong();
      second[k] = random.nextLong() | 1;
    }
  }

  /** Fills the first words of a block with bits that are 1 with a probability. */
  void fill(long[] words, double probability, int length) {
    int m = (int) (probability * ONE + random.nextDouble());
    if (m <= 0 || m >= ONE) {
      Arrays.fill(words, m <= 0 ? 0 : -1);
      return;
    }
    Arrays.fill(words, 0);
    for (int b = Integer.numberOfTrailingZeros(m) & ~1; b < BITS; b += 2) {
      step(first, second, words, length, -(m >> b & 1), -(m >> (b + 1) & 1));
    }
  }

  /** Two steps of every generator, the first for bit {@code low} of m, then {@code high}. */
  private static void step(
      long[] first, long[] second, long[] words, int length, long low, long high) {
    for (int k = 0; k < length; k++) {
      long x = first[k];
      long y = second[k];
      long word = words[k];
      x ^= x << 23;
      x ^= y ^ (x >>> 17) ^ (y >>> 26);
      long r = x + y;
      word = (word & r) | (low & (word ^ r));
      y ^= y << 23;
      y ^= x ^ (y >>> 17) ^ (x >>> 26);
      r = x + y;
      word = (word & r) | (high & (word ^ r));
      first[k] = x;
      second[k] = y;
      words[k] = word;
    }
  }
}
