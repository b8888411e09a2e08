package dev.couplet.anneal;

import java.util.Arrays;

/** A path of temperature through given points, spread evenly over the draw. */
final class GivenPath implements Cooling {
  private final double[] temperature;

  private GivenPath(double[] temperature) {
    this.temperature = temperature;
  }

  static GivenPath of(double... temperatures) {
    if (temperatures.length == 0) {
      throw new IllegalArgumentException("there is no temperature; give one at least");
    }
    double[] checked = new double[temperatures.length];
    for (int k = 0; k < checked.length; k++) {
      checked[k] = Check.temperature("temperature " + k + " of the path", temperatures[k]);
    }
    return new GivenPath(checked);
  }

  @Override
  public double temperature(double hot, double cold, double passed) {
    double place = passed * (temperature.length - 1);
    int before = Math.min((int) place, temperature.length - 1);
    int after = Math.min(before + 1, temperature.length - 1);
    double share = place - before;
    return temperature[before] * (1 - share) + temperature[after] * share;
  }

  @Override
  public String toString() {
    return "through " + Arrays.toString(temperature);
  }
}
