package dev.couplet.examples.rounds;

/**
 * A village that the mobile library serves.
 *
 * @param name unique among the villages
 * @param crates how many crates of books it gets
 * @param east metres east of the map's corner
 * @param north metres north of it
 */
record Village(String name, int crates, int east, int north) implements Place {
  @Override
  public String toString() {
    return name;
  }
}
