package dev.couplet.anneal;

/** The inverse temperature of every sweep of every draw. */
record Schedule(Cooling cooling, Temperatures ends, Sweeps sweeps) {
  int sweeps(int draw) {
    return sweeps.of(draw);
  }

  /** The inverse temperature of sweep {@code t} of {@code count}. */
  double inverseTemperature(int t, int count) {
    double passed = count == 1 ? 1 : t / (double) (count - 1);
    return 1 / cooling.temperature(ends.hot(), ends.cold(), passed);
  }
}
