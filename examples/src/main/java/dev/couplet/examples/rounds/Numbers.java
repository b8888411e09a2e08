package dev.couplet.examples.rounds;

import java.math.BigDecimal;

/** How the report writes numbers: exactly, without trailing zeros or powers of ten. */
final class Numbers {
  private Numbers() {}

  static String shown(double value) {
    return Double.isFinite(value)
        ? new BigDecimal(value).stripTrailingZeros().toPlainString()
        : value > 0 ? "infinity" : value < 0 ? "-infinity" : "not a number";
  }

  static String metres(long value) {
    return value + " m";
  }

  static String metres(double value) {
    return shown(value) + " m";
  }
}
