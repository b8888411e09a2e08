package dev.couplet.exact;

import dev.couplet.form.Qubo;

/**
 * Sums over all states, each weighted by {@code exp(-b (E - lowest))}: of 1, of the energy above
 * lowest and its square, and of each variable.
 */
final class BoltzmannSums {
  private final StateSpace space;
  private final double inverseTemperature;
  private final double lowest;

  /** The weight of each lane, and of each lane with the middle variable 1, over all blocks. */
  private final double[] lane;

  private final double[] laneMiddle;

  private final double[] ones;
  private double weight;
  private double energy;
  private double square;

  private BoltzmannSums(Qubo form, double inverseTemperature, double lowest) {
    this.space = new StateSpace(form);
    this.inverseTemperature = inverseTemperature;
    this.lowest = lowest;
    this.lane = new double[1 << space.low];
    this.laneMiddle = new double[1 << space.low];
    this.ones = new double[form.size()];
  }

  static BoltzmannSums of(Qubo form, double inverseTemperature, double lowest) {
    BoltzmannSums sums = new BoltzmannSums(form, inverseTemperature, lowest);
    if (form.size() == 0) {
      sums.weight = 1;
    } else {
      sums.addBlocks();
      sums.addLanes();
    }
    return sums;
  }

  private void addBlocks() {
    Cursor cursor = new Cursor(space, 0);
    for (long block = 0; block < space.blocks(); block++) {
      if (block > 0) {
        cursor.next();
      }
      double before = weight;
      double[] energies = cursor.energies();
      double field = cursor.middleField();
      for (int j = 0; j < lane.length; j++) {
        lane[j] += add(energies[j]);
        laneMiddle[j] += add(energies[j] + (space.step[0][j] + field));
      }
      for (long rest = block; rest != 0; rest &= rest - 1) {
        ones[space.low + 1 + Long.numberOfTrailingZeros(rest)] += weight - before;
      }
    }
  }

  private double add(double value) {
    // A rounded walk may fall a little below the lowest energy.
    double above = Math.max(0, value - lowest);
    double share = StrictMath.exp(-inverseTemperature * above);
    weight += share;
    energy += share * above;
    square += share * above * above;
    return share;
  }

  private void addLanes() {
    for (int j = 0; j < lane.length; j++) {
      ones[space.low] += laneMiddle[j];
      for (int i = 0; i < space.low; i++) {
        if ((j >>> i & 1) != 0) {
          ones[i] += lane[j] + laneMiddle[j];
        }
      }
    }
  }

  double weight() {
    return weight;
  }

  double energy() {
    return energy;
  }

  double square() {
    return square;
  }

  /** Of each variable; a new array. */
  double[] ones() {
    return ones.clone();
  }
}
