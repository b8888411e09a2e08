package dev.couplet.anneal;

/** How a draw ends after its last sweep. */
public enum Finish {
  /** As the last sweep left it: a sample at the last temperature. */
  NONE,
  /** With single flips that lower the energy, until there is none: a local minimum. */
  DESCENT
}
