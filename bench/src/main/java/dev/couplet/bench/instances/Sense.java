package dev.couplet.bench.instances;

/** Whether the values of an instance are to be as low or as high as possible. */
public enum Sense {
  /** Lower values are better. */
  MINIMIZE,
  /** Higher values are better. */
  MAXIMIZE;

  /** What a value is multiplied by where everything is minimised: 1 or -1. */
  public int sign() {
    return this == MINIMIZE ? 1 : -1;
  }
}
