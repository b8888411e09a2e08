package dev.couplet.sampling;

/** Why a run ended: a fact of its own, apart from what was found and what is proved. */
public enum End {
  /** All the work asked for was done. */
  DONE,
  /** A draw reached the target. */
  TARGET,
  /** The time was up. */
  DEADLINE,
  /** The caller asked it to stop, or its thread was interrupted. */
  STOPPED
}
