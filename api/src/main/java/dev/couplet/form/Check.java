package dev.couplet.form;

/** Argument checks of this package; one place, so that the messages read alike. */
final class Check {
  /** Energies are multiples of 1/4 of a unit: beyond this sum, a double no longer holds them. */
  static final double EXACT_LIMIT = 0x1p51;

  private Check() {}

  static void size(int size) {
    if (size < 0) {
      throw new IllegalArgumentException("size is " + size + ", it must be 0 or more");
    }
  }

  static int variable(int variable, int size) {
    if (variable < 0 || variable >= size) {
      throw new IllegalArgumentException(
          "variable " + variable + " is not one of the " + size + " variables 0.." + (size - 1));
    }
    return variable;
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
