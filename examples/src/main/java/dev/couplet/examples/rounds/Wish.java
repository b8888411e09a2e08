package dev.couplet.examples.rounds;

/**
 * A village would like to be served by a van.
 *
 * @param village whose wish it is
 * @param van the van it would like
 * @param metres what the wish is worth: a plan that does not grant it counts as so much longer
 */
record Wish(Village village, Van van, int metres) {
  /** As in "Elm by the small van". */
  @Override
  public String toString() {
    return village + " by " + van;
  }
}
