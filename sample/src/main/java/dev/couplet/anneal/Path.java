package dev.couplet.anneal;

/** The paths of temperature between two ends. */
enum Path implements Cooling {
  GEOMETRIC {
    @Override
    public double temperature(double hot, double cold, double passed) {
      // In logarithms, since the quotient of the ends may be beyond the range of a double.
      double from = StrictMath.log(hot);
      return StrictMath.exp(from + passed * (StrictMath.log(cold) - from));
    }
  },
  LINEAR {
    @Override
    public double temperature(double hot, double cold, double passed) {
      return hot * (1 - passed) + cold * passed;
    }
  },
  INVERSE_LINEAR {
    @Override
    public double temperature(double hot, double cold, double passed) {
      return 1 / ((1 - passed) / hot + passed / cold);
    }
  }
}
