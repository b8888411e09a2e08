package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.junit.jupiter.api.Test;

class ReplicaNoiseTest {
  private static final int LENGTH = 256;

  /** Written down once, to notice if a platform or a change gives other numbers. */
  @Test
  void goldenWords() {
    ReplicaNoise noise = new ReplicaNoise(3, Streams.of(1, 0));
    long[] words = new long[3];
    noise.fill(words, 0.3, 3);
    assertEquals("[8f08495006224850, 84491246c411a4b, 6108420688804208]", hex(words));
    noise.fill(words, 0.75, 3);
    assertEquals("[cbddd7beacc93471, ff8dfef7fbff78fd, ffffabbfe0dfbf7f]", hex(words));
  }

  private static String hex(long[] words) {
    return Arrays.toString(Arrays.stream(words).mapToObj(Long::toHexString).toArray());
  }

  /**
   * 400 blocks of 256 words: 6.5 million bits a probability. The number of ones is binomial; within
   * five standard deviations but for a chance of 6e-7 each.
   */
  @Test
  void bitsAreOneWithTheProbabilityAskedFor() {
    ReplicaNoise noise = new ReplicaNoise(LENGTH, Streams.of(2, 0));
    long[] words = new long[LENGTH];
    for (double p : new double[] {0.9, 0.5, 0.3, 0.1, 0.011, 0.0007, 1.0 / 3}) {
      long ones = 0;
      for (int block = 0; block < 400; block++) {
        noise.fill(words, p, LENGTH);
        ones += Arrays.stream(words).map(Long::bitCount).sum();
      }
      double bits = 400.0 * LENGTH * 64;
      assertEquals(p, ones / bits, 5 * Math.sqrt(p * (1 - p) / bits), "probability " + p);
    }
  }

  /**
   * A probability far below 2^-16 comes out right on average: 1.3 ones in a thousand blocks of
   * 2^14.
   */
  @Test
  void roundingIsUpOrDownAtRandom() {
    ReplicaNoise noise = new ReplicaNoise(LENGTH, Streams.of(3, 0));
    long[] words = new long[LENGTH];
    long ones = 0;
    for (int block = 0; block < 100_000; block++) {
      noise.fill(words, 1e-6, LENGTH);
      ones += Arrays.stream(words).map(Long::bitCount).sum();
    }
    // Expected 1,638; blocks that are rounded up number 6,554 and have 0.25 ones each: deviation
    // 46.
    assertEquals(1638, ones, 5 * 46);
  }

  @Test
  void certaintiesAreCertain() {
    ReplicaNoise noise = new ReplicaNoise(LENGTH, Streams.of(4, 0));
    long[] words = new long[LENGTH];
    noise.fill(words, 0, LENGTH);
    assertTrue(Arrays.stream(words).allMatch(word -> word == 0));
    noise.fill(words, 1, LENGTH);
    assertTrue(Arrays.stream(words).allMatch(word -> word == -1));
  }

  /**
   * Any two lanes agree in half their bits: 2,016 pairs, each binomial of 51,200 bits with standard
   * deviation 113. Outside five of it by chance: 2,016 * 5.7e-7 = 1e-3.
   */
  @Test
  void lanesAreIndependent() {
    ReplicaNoise noise = new ReplicaNoise(LENGTH, Streams.of(5, 0));
    int[][] agree = new int[64][64];
    long[] words = new long[LENGTH];
    for (int block = 0; block < 200; block++) {
      noise.fill(words, 0.5, LENGTH);
      for (long word : words) {
        for (int lane = 0; lane < 64; lane++) {
          long same = (word >>> lane & 1) != 0 ? word : ~word;
          for (int other = 0; other < lane; other++) {
            agree[lane][other] += (int) (same >>> other & 1);
          }
        }
      }
    }
    for (int lane = 0; lane < 64; lane++) {
      for (int other = 0; other < lane; other++) {
        assertEquals(25_600, agree[lane][other], 5 * 113, lane + " and " + other);
      }
    }
  }
}
