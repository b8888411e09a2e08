package dev.couplet.audit;

import java.util.Comparator;
import java.util.List;
import java.util.function.IntUnaryOperator;
import java.util.function.LongConsumer;
import java.util.stream.IntStream;

/**
 * Goes through all patterns of n bits, one flip at a time, in the order of a Gray code whose lowest
 * positions, which flip most often, are the bits that cost least.
 */
final class Walk {
  /** After so many flips all is computed afresh: bounds what rounding errors add up to. */
  static final int STRETCH = 64;

  private final int bits;
  private final int[] bitAt;

  Walk(int bits, IntUnaryOperator effort) {
    this.bits = bits;
    this.bitAt =
        IntStream.range(0, bits)
            .boxed()
            .sorted(Comparator.comparingInt(effort::applyAsInt))
            .mapToInt(Integer::intValue)
            .toArray();
  }

  /** Takes all that is given along; the visitor sees each pattern once, after its flip. */
  void over(List<? extends Flips> along, LongConsumer visitor) {
    Flips[] all = along.toArray(new Flips[0]);
    long pattern = 0;
    for (long step = 0; step < 1L << bits; step++) {
      int bit = step == 0 ? -1 : bitAt[Long.numberOfTrailingZeros(step)];
      pattern ^= bit < 0 ? 0 : 1L << bit;
      for (Flips one : all) {
        if (step % STRETCH == 0) {
          one.reset(pattern);
        } else {
          one.flip(bit, pattern);
        }
      }
      visitor.accept(pattern);
    }
  }
}
