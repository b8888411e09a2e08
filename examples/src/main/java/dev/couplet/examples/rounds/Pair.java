package dev.couplet.examples.rounds;

/** Two different villages, in the order in which they were named. */
record Pair(Village one, Village other) {
  /** The same two the other way round. */
  Pair turned() {
    return new Pair(/* one= */ other, /* other= */ one);
  }

  @Override
  public String toString() {
    return one + " and " + other;
  }
}
