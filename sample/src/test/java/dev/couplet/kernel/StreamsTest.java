package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.HashSet;
import java.util.Set;
import org.junit.jupiter.api.Test;

class StreamsTest {
  /** Written down once, to notice if a platform or a change gives other numbers. */
  @Test
  void goldenNumbers() {
    assertEquals(0xa041bfcde228e7c7L, Streams.of(1, 0).nextLong());
    assertEquals(0x3aecbcb9b8b26a9aL, Streams.of(1, 1).nextLong());
    assertEquals(0xded835ce0dc29277L, Streams.of(-7, 123456789).nextLong());
  }

  @Test
  void neighbouringStreamsShareNoNumber() {
    Set<Long> seen = new HashSet<>();
    for (int seed = 0; seed < 40; seed++) {
      for (int k = 0; k < 40; k++) {
        assertTrue(seen.add(Streams.of(seed, k).nextLong()), "seed " + seed + ", stream " + k);
      }
    }
  }

  /**
   * First numbers of neighbouring streams, xored, have each bit set half the time: 64 counts of
   * 10,000 tosses, standard deviation 50. Outside 5 standard deviations by chance: 64 * 5.7e-7 =
   * 4e-5.
   */
  @Test
  void neighbouringStreamsAgreeInHalfTheirBits() {
    int[] ones = new int[64];
    for (int k = 0; k < 10_000; k++) {
      long differing = Streams.of(5, k).nextLong() ^ Streams.of(5, k + 1).nextLong();
      for (int b = 0; b < 64; b++) {
        ones[b] += (int) (differing >>> b & 1);
      }
    }
    for (int count : ones) {
      assertEquals(5000, count, 250);
    }
  }
}
