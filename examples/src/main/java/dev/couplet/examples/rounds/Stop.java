package dev.couplet.examples.rounds;

/**
 * A place in the round of a van.
 *
 * @param van the van
 * @param number counted from 1
 */
record Stop(Van van, int number) {
  @Override
  public String toString() {
    return "stop " + number + " of " + van;
  }
}
