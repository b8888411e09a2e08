package dev.couplet.examples.rounds;

import java.util.List;

/**
 * Where the vans start and where they return.
 *
 * @param east metres east of the map's corner
 * @param north metres north of it
 */
record Library(int east, int north) implements Place {
  /** Amid some villages: their mean, in whole metres. */
  static Library amid(List<Village> villages) {
    double east = villages.stream().mapToInt(Village::east).average().orElse(0);
    double north = villages.stream().mapToInt(Village::north).average().orElse(0);
    return new Library((int) Math.rint(east), (int) Math.rint(north));
  }

  /** From here to a village and back. */
  int outAndBack(Village village) {
    return 2 * distanceTo(village);
  }
}
