package dev.couplet.model;

/**
 * Two numbers between which a quantity lies, both included.
 *
 * @param lowest the lower one
 * @param highest the higher one
 */
public record Range(double lowest, double highest) {
  /** The difference of the two. */
  public double width() {
    return highest - lowest;
  }
}
