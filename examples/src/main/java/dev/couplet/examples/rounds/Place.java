package dev.couplet.examples.rounds;

/** Somewhere on the map. */
interface Place {
  /** Metres east of the map's corner. */
  int east();

  /** Metres north of it. */
  int north();

  /** The straight line to another place, in whole metres. */
  default int distanceTo(Place other) {
    double across = (double) east() - other.east();
    double along = (double) north() - other.north();
    return Math.toIntExact(Math.round(Math.sqrt(across * across + along * along)));
  }
}
