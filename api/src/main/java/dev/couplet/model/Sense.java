package dev.couplet.model;

/** Whether a model's value is to be as low or as high as possible. */
public enum Sense {
  /** Lower values are better; also the sense of a model without an objective. */
  MINIMIZE,
  /** Higher values are better. */
  MAXIMIZE;

  /** What a value is multiplied by where everything is minimised: 1 or -1. */
  public int sign() {
    return this == MINIMIZE ? 1 : -1;
  }
}
