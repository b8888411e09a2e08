package dev.couplet.kernel;

/**
 * Sums the gains of the variables of one block, for 64 states at once, digit by digit.
 *
 * <p>A gain is twice the number in the digits plus its half step. Invariant while neighbours are
 * added: the digits hold, in two's complement modulo 2^(digits + 1), the base and the neighbours so
 * far; the whole sum fits, so that what overflows on the way does no harm.
 */
final class ReplicaGains {
  private final long[] spins;
  private final int size;
  private final int weightDigits;
  private final long[][] digit;
  private final long[] x;
  private final long[] y;
  private final long[] z;
  private final long[] carry;

  /** Works on the given words, those of the variables and then their complements. */
  ReplicaGains(ReplicaRows rows, long[] spins) {
    this.spins = spins;
    this.size = rows.size();
    this.weightDigits = rows.weightDigits();
    int longest = rows.longestBlock();
    this.digit = new long[rows.gainDigits() + 1][longest];
    this.x = new long[longest];
    this.y = new long[longest];
    this.z = new long[longest];
    this.carry = new long[longest];
  }

  /** Digit {@code b} of the gains summed last; the one after the last is their sign. */
  long[] digit(int b) {
    return digit[b];
  }

  /** The half steps of the gains. */
  long[] halves(ReplicaBlock block) {
    WordLoops.digit(block.baseZero, 0, y, block.length);
    return y;
  }

  void sum(ReplicaBlock block) {
    int length = block.length;
    System.arraycopy(spins, block.from, x, 0, length);
    begin(block);
    int[][] place = block.place;
    if (weightDigits > 1) {
      for (int q = 0; q < place.length; q++) {
        gather(place[q], y);
        add(block.mask[q], length);
      }
      return;
    }
    int q = 0;
    for (; q + 1 < place.length; q += 2) {
      gather(place[q], y);
      gather(place[q + 1], z);
      WordLoops.addTwo(digit[0], y, z, x, carry, length);
      carryFrom(1, length);
    }
    if (q < place.length) {
      gather(place[q], y);
      WordLoops.addOne(digit[0], y, x, carry, length);
      carryFrom(1, length);
    }
  }

  private void begin(ReplicaBlock block) {
    for (int b = 0; b < digit.length; b++) {
      if (block.lopsided) {
        WordLoops.digit(block.baseZero, block.baseOne, b + 1, x, digit[b], block.length);
      } else {
        WordLoops.digit(block.baseZero, b + 1, digit[b], block.length);
      }
    }
  }

  private void gather(int[] place, long[] to) {
    for (int k = 0; k < place.length; k++) {
      to[k] = spins[place[k]];
    }
  }

  private void add(long[][] mask, int length) {
    WordLoops.addFirstMasked(digit[0], y, x, mask[0], carry, length);
    for (int b = 1; b < weightDigits; b++) {
      WordLoops.addMasked(digit[b], y, x, mask[b], carry, length);
    }
    carryFrom(weightDigits, length);
  }

  private void carryFrom(int first, int length) {
    int sign = digit.length - 1;
    for (int b = first; b < sign; b++) {
      WordLoops.addCarry(digit[b], carry, length);
    }
    if (first <= sign) {
      WordLoops.addLast(digit[sign], carry, length);
    }
  }

  /** Whether any gain summed last is below zero. */
  boolean anyBelowZero(ReplicaBlock block) {
    long[] sign = digit[digit.length - 1];
    long any = 0;
    for (int k = 0; k < block.length; k++) {
      any |= sign[k];
    }
    return any != 0;
  }

  /** Flips where the gain is below zero, and where accepted. */
  void flip(ReplicaBlock block, long[] accepted) {
    int length = block.length;
    WordLoops.flip(x, digit[digit.length - 1], accepted, y, length);
    System.arraycopy(x, 0, spins, block.from, length);
    System.arraycopy(y, 0, spins, size + block.from, length);
  }
}
