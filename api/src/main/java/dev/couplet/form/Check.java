package dev.couplet.form;

/** Argument checks of this package; one place, so that the messages read alike. */
final class Check {
  /** Energies are multiples of 1/4 of a unit: beyond this sum, a double no longer holds them. */
  static final double EXACT_LIMIT = 0x1p51;

  /** The length that every Java machine grants an array. */
  private static final long LONGEST_ARRAY = Integer.MAX_VALUE - 8L;

  private Check() {}

  static void size(int size) {
    if (size < 0) {
      throw new IllegalArgumentException("size is " + size + ", it must be 0 or more");
    }
  }

  static int variable(int variable, int size) {
    if (variable < 0 || variable >= size) {
      throw new IllegalArgumentException(
          size == 0
              ? "variable " + variable + " is named, the form has none"
              : "variable " + variable + " is not one of the " + size + " from 0 to " + (size - 1));
    }
    return variable;
  }

  /** The length of an array that grows by half as often as it must, to hold so many entries. */
  static int capacity(int length, long needed) {
    if (needed <= length) {
      return length;
    }
    entries(needed);
    return (int) Math.min(LONGEST_ARRAY, Math.max(needed, length + (length >> 1)));
  }

  static void entries(long needed) {
    if (needed > LONGEST_ARRAY) {
      throw new IllegalArgumentException("a form holds at most " + LONGEST_ARRAY + " entries");
    }
  }

  static double finite(String what, double value) {
    if (!Double.isFinite(value)) {
      throw new IllegalArgumentException(what + " is " + value + ", it must be a finite number");
    }
    return value;
  }

  static void stateSize(State state, int size) {
    if (state.size() != size) {
      throw new IllegalArgumentException(
          "the state has " + state.size() + " variables, the form has " + size);
    }
  }
}
