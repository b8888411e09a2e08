package dev.couplet.kernel;

/**
 * Logic on arrays of words, place by place, in loops that the compiler turns into vector
 * instructions: one index for all arrays and no branch.
 */
final class WordLoops {
  private WordLoops() {}

  /** Digit {@code b} of each number, as a whole word. */
  static void digit(long[] number, int b, long[] digit, int length) {
    for (int k = 0; k < length; k++) {
      digit[k] = -((number[k] >> b) & 1);
    }
  }

  /** Digit {@code b} of {@code zero} where a bit of x is 0, of {@code one} where it is 1. */
  static void digit(long[] zero, long[] one, int b, long[] x, long[] digit, int length) {
    for (int k = 0; k < length; k++) {
      long first = -((zero[k] >> b) & 1);
      long second = -((one[k] >> b) & 1);
      digit[k] = first ^ (x[k] & (first ^ second));
    }
  }

  /** Adds y xor x and z xor x to a digit, and gives the carry. */
  static void addTwo(long[] digit, long[] y, long[] z, long[] x, long[] carry, int length) {
    for (int k = 0; k < length; k++) {
      long a = y[k] ^ x[k];
      long b = z[k] ^ x[k];
      long either = a ^ b;
      carry[k] = (a & b) | (either & digit[k]);
      digit[k] ^= either;
    }
  }

  /** Adds y xor x to a digit, and gives the carry. */
  static void addOne(long[] digit, long[] y, long[] x, long[] carry, int length) {
    for (int k = 0; k < length; k++) {
      long a = y[k] ^ x[k];
      carry[k] = digit[k] & a;
      digit[k] ^= a;
    }
  }

  /** Adds y xor x, where a mask is 1, to a digit, and gives the carry. */
  static void addFirstMasked(
      long[] digit, long[] y, long[] x, long[] mask, long[] carry, int length) {
    for (int k = 0; k < length; k++) {
      long a = (y[k] ^ x[k]) & mask[k];
      carry[k] = digit[k] & a;
      digit[k] ^= a;
    }
  }

  /** Adds y xor x, where a mask is 1, and the carry to a digit, and gives the new carry. */
  static void addMasked(long[] digit, long[] y, long[] x, long[] mask, long[] carry, int length) {
    for (int k = 0; k < length; k++) {
      long a = (y[k] ^ x[k]) & mask[k];
      long either = a ^ digit[k];
      long both = (a & digit[k]) | (either & carry[k]);
      digit[k] = either ^ carry[k];
      carry[k] = both;
    }
  }

  /** Adds the carry to a digit, and gives the new carry. */
  static void addCarry(long[] digit, long[] carry, int length) {
    for (int k = 0; k < length; k++) {
      long both = digit[k] & carry[k];
      digit[k] ^= carry[k];
      carry[k] = both;
    }
  }

  /** Adds the carry to the last digit, that of the sign; nothing is carried on. */
  static void addLast(long[] digit, long[] carry, int length) {
    for (int k = 0; k < length; k++) {
      digit[k] ^= carry[k];
    }
  }

  /** Keeps a bit accepted only where the digit is 0, or is itself accepted. */
  static void accept(long[] accepted, long[] digit, long[] bits, int length) {
    for (int k = 0; k < length; k++) {
      accepted[k] &= bits[k] | ~digit[k];
    }
  }

  /** Flips x where the sign is 1 or a bit is accepted, and gives its complement. */
  static void flip(long[] x, long[] sign, long[] accepted, long[] complement, int length) {
    for (int k = 0; k < length; k++) {
      long flipped = x[k] ^ (sign[k] | accepted[k]);
      x[k] = flipped;
      complement[k] = ~flipped;
    }
  }
}
