package dev.couplet.anneal;

import dev.couplet.form.State;
import dev.couplet.kernel.Descent;
import dev.couplet.kernel.LocalFields;
import dev.couplet.kernel.Metropolis;
import dev.couplet.kernel.Pace;
import dev.couplet.kernel.Reassignment;
import dev.couplet.kernel.SweepOrder;
import java.util.SplittableRandom;

/** One state that moves at the temperature of whatever rung it stands on. */
final class Replica {
  private final LocalFields fields;
  private final Metropolis metropolis;
  private final Reassignment reassignment;
  private final Descent descent;
  private double energy;

  Replica(LocalFields fields, SweepOrder order, Reassignment reassignment) {
    this.fields = fields;
    this.metropolis = new Metropolis(fields, order);
    this.reassignment = reassignment;
    this.descent = new Descent(fields);
  }

  LocalFields fields() {
    return fields;
  }

  /** Moves to a state; false if the pace ends that. */
  boolean begin(State state, Pace pace) {
    return fields.set(state, pace);
  }

  /** One sweep; false if the pace ends it. */
  boolean sweep(double inverseTemperature, SplittableRandom random, Pace pace) {
    boolean whole =
        metropolis.sweep(inverseTemperature, random, pace)
            && reassignment.sweep(inverseTemperature, random, pace);
    if (whole) {
      measure();
    }
    return whole;
  }

  /** Moves to a local minimum below a state; false if there was no time to get there at all. */
  boolean descend(State from, Pace pace) {
    if (!fields.set(from, pace)) {
      return false;
    }
    descent.run(pace);
    while (!pace.ended() && reassignment.descend(pace)) {
      descent.run(pace);
    }
    return true;
  }

  /** Takes down the energy of the state as it is now. */
  void measure() {
    energy = fields.energy();
  }

  /** The energy that was taken down last. */
  double energy() {
    return energy;
  }
}
