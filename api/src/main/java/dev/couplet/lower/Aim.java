package dev.couplet.lower;

/** What a lowering saves first where one can be had for the other. */
enum Aim {
  /** Auxiliary bits, then the size of the largest coefficient. */
  AUXILIARIES,
  /** The size of the largest coefficient, then auxiliary bits. */
  COEFFICIENTS
}
