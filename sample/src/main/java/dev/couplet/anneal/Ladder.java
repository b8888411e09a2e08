package dev.couplet.anneal;

import dev.couplet.kernel.Boltzmann;
import java.util.SplittableRandom;

/**
 * Replicas on the rungs of a ladder of temperatures, the coldest on rung 0.
 *
 * <p>Two neighbours change places with probability {@code min(1, exp((b - b')(E - E')))}, b the
 * inverse temperatures of their rungs: that keeps the product of the Boltzmann distributions.
 */
final class Ladder {
  private final double[] inverse;
  private final Replica[] replica;

  Ladder(double[] inverse, Replica[] replica) {
    this.inverse = inverse;
    this.replica = replica;
  }

  int rungs() {
    return replica.length;
  }

  Replica at(int rung) {
    return replica[rung];
  }

  double inverseTemperature(int rung) {
    return inverse[rung];
  }

  /** Tries to exchange rungs 0 and 1, 2 and 3, ... in even rounds, 1 and 2, 3 and 4, ... in odd. */
  void exchange(int round, SplittableRandom random) {
    for (int rung = round & 1; rung + 1 < replica.length; rung += 2) {
      double x =
          (inverse[rung + 1] - inverse[rung])
              * (replica[rung].energy() - replica[rung + 1].energy());
      if (x <= 0
          || (x < Boltzmann.NEVER && (random.nextLong() >>> 11) * 0x1p-53 < Boltzmann.factor(x))) {
        Replica colder = replica[rung];
        replica[rung] = replica[rung + 1];
        replica[rung + 1] = colder;
      }
    }
  }
}
