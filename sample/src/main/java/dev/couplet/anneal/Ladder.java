package dev.couplet.anneal;

import dev.couplet.kernel.Boltzmann;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.SplittableRandom;

/**
 * Replicas on the rungs of a ladder of temperatures, the coldest on rung 0.
 *
 * <p>Two neighbours change places with probability {@code min(1, exp((b - b')(E - E')))}, b the
 * inverse temperatures of their rungs: that keeps the product of the Boltzmann distributions.
 */
final class Ladder {
  private final double[] inverse;
  private final List<Replica> replica = new ArrayList<>();

  /** A ladder of empty rungs. */
  Ladder(double[] inverse) {
    this.inverse = inverse;
  }

  int rungs() {
    return inverse.length;
  }

  /** Whether a rung has its replica; rungs get theirs from the coldest on. */
  boolean has(int rung) {
    return rung < replica.size();
  }

  /** Puts a replica on the next rung. */
  void add(Replica next) {
    replica.add(next);
  }

  Replica at(int rung) {
    return replica.get(rung);
  }

  double inverseTemperature(int rung) {
    return inverse[rung];
  }

  /** Tries to exchange rungs 0 and 1, 2 and 3, ... in even rounds, 1 and 2, 3 and 4, ... in odd. */
  void exchange(int round, SplittableRandom random) {
    for (int rung = round & 1; rung + 1 < replica.size(); rung += 2) {
      double x = (inverse[rung + 1] - inverse[rung]) * (at(rung).energy() - at(rung + 1).energy());
      if (x <= 0
          || (x < Boltzmann.NEVER && (random.nextLong() >>> 11) * 0x1p-53 < Boltzmann.factor(x))) {
        Collections.swap(replica, rung, rung + 1);
      }
    }
  }
}
