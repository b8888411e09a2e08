package dev.couplet.examples.rounds;

/**
 * A village that the mobile library serves.
 *
 * @param name unique among the villages
 * @param crates how many crates of books it gets
 * @param east metres east of the map's corner
 * @param north metres north of it
 */
record Village(String name, int crates, int east, int north) {
  /** The straight line to another village, in whole metres. */
  int distanceTo(Village other) {
    double across = (double) east - other.east;
    double along = (double) north - other.north;
    return Math.toIntExact(Math.round(Math.sqrt(across * across + along * along)));
  }

  @Override
  public String toString() {
    return name;
  }
}
