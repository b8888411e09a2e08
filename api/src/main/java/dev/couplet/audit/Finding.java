package dev.couplet.audit;

/**
 * One thing that an audit found wrong.
 *
 * @param check the name of the check that failed
 * @param message what happened, on what input, and how to mend it
 */
public record Finding(String check, String message) {
  @Override
  public String toString() {
    return "[" + check + "] " + message;
  }
}
