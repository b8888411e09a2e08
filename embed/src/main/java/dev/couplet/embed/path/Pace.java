package dev.couplet.embed.path;

import dev.couplet.sampling.Vigil;

/** Counts elementary steps, and asks the vigil every so many of them whether to go on. */
final class Pace {
  private static final int INTERVAL = Vigil.STEPS >> 4;

  private final Vigil vigil;
  private int left;
  private boolean over;

  Pace(Vigil vigil) {
    this.vigil = vigil;
  }

  /** Whether the run is over, after so many more steps. */
  boolean over(int steps) {
    left -= steps;
    if (left < 0) {
      left = INTERVAL;
      over = vigil.over();
    }
    return over;
  }
}
