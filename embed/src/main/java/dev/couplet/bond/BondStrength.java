package dev.couplet.bond;

/** A way to choose how strong the bonds inside branch sets are. Implementations are immutable. */
@FunctionalInterface
public interface BondStrength {
  /**
   * What is known of one bond of a branch set's tree. Without the bond the set falls into two
   * sides; a side weighs the sum of the magnitudes of its fields and of its couplings to other
   * sets.
   *
   * @param guest the guest vertex whose set it is
   * @param lighter the weight of the lighter side
   * @param heavier the weight of the heavier side
   */
  record Sides(int guest, double lighter, double heavier) {}

  /** The strength of a bond: positive and finite. */
  double of(Sides sides);

  /**
   * Strictly above the weight of the lighter side, by one part in 2^20: proved to tear no minimum.
   *
   * <p>Suppose a minimum tears the bond. Flipping all of the lighter side joins it again, which
   * wins twice the strength, and loses at most twice that side's weight. So it was no minimum. A
   * side that weighs nothing takes a strength of 2^-20 of the other side, or 1 if that weighs
   * nothing either.
   */
  static BondStrength certified() {
    return sides -> {
      if (sides.lighter() > 0) {
        return sides.lighter() * (1 + 0x1p-20);
      }
      return sides.heavier() > 0 ? sides.heavier() * 0x1p-20 : 1;
    };
  }

  /**
   * The same strength for every bond, set by hand; it may tear minima.
   *
   * @throws IllegalArgumentException unless it is positive and finite
   */
  static BondStrength fixed(double strength) {
    if (!(strength > 0) || !Double.isFinite(strength)) {
      throw new IllegalArgumentException(
          "the bond strength is " + strength + ", it must be positive and finite");
    }
    return sides -> strength;
  }
}
