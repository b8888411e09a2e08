package dev.couplet.kernel;

/**
 * Loops over int arrays in the shapes that the compiler turns into vector instructions: one index
 * for all arrays, or a constant distance within one array, and no branch. A minimum is taken by
 * sign arithmetic, since the library's own is compiled to scalar code here; it asks that no
 * difference of two numbers overflows.
 */
final class Lanes {
  /** Folding leaves this many lanes. The distance of a fold must exceed what is done at once. */
  static final int COUNT = 128;

  private static final int FAR = 512;

  private Lanes() {}

  /** Adds one strand of a packed row. */
  static void add(int[] field, int[] row, int left, int right, int common) {
    for (int k = 0; k < field.length; k++) {
      field[k] += ((row[k] << left) >> right) << common;
    }
  }

  /** Subtracts one strand of a packed row. */
  static void subtract(int[] field, int[] row, int left, int right, int common) {
    for (int k = 0; k < field.length; k++) {
      field[k] -= ((row[k] << left) >> right) << common;
    }
  }

  /**
   * Keys of moves: the gain, raised by 2^30 if the move is blocked. Bit 31 of a code says that the
   * spin is -1, bit 30 that the move is blocked.
   */
  static void keys(int[] field, int[] code, int[] key) {
    for (int k = 0; k < field.length; k++) {
      int c = code[k];
      int negative = c >> 31;
      key[k] = (field[k] ^ negative) - negative + (c & (1 << 30));
    }
  }

  /** As {@link #keys}, but keeps the lower of the new and the old key. */
  static void lowerKeys(int[] field, int[] code, int[] key) {
    for (int k = 0; k < field.length; k++) {
      int c = code[k];
      int negative = c >> 31;
      int old = key[k];
      int difference = (field[k] ^ negative) - negative + (c & (1 << 30)) - old;
      key[k] = old + (difference & (difference >> 31));
    }
  }

  /**
   * Folds keys forward over each other, until the last {@link #COUNT} places hold the lowest of all
   * places that are the same modulo COUNT.
   */
  static void fold(int[] key) {
    if (key.length > 2 * FAR) {
      foldFar(key);
      foldNear(key, key.length - FAR);
    } else {
      foldNear(key, 0);
    }
  }

  private static void foldFar(int[] key) {
    for (int k = 0; k < key.length - FAR; k++) {
      int old = key[k + FAR];
      int difference = key[k] - old;
      key[k + FAR] = old + (difference & (difference >> 31));
    }
  }

  private static void foldNear(int[] key, int from) {
    for (int k = from; k < key.length - COUNT; k++) {
      int old = key[k + COUNT];
      int difference = key[k] - old;
      key[k + COUNT] = old + (difference & (difference >> 31));
    }
  }
}
