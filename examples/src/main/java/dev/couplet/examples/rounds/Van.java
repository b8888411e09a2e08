package dev.couplet.examples.rounds;

/**
 * A van of the mobile library.
 *
 * @param name unique among the vans, without the word van: "small"
 * @param capacity how many crates it carries
 */
record Van(String name, int capacity) {
  @Override
  public String toString() {
    return "the " + name + " van";
  }
}
