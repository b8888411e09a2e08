package dev.couplet.reduce;

/** The ways in which a bit can leave a form. */
public enum Removal {
  /** Its linear coefficient outweighs all its pairs: it has one value whatever the others are. */
  SIGN,
  /** It has one pair or none: its best value follows from the other bit. */
  LEAF,
  /** It has two pairs: its best value follows from the two others, which become a pair. */
  CHAIN,
  /** One pair outweighs all the rest: it equals the other bit, or its negation. */
  COPY,
  /** The roof dual fixes it. */
  ROOF
}
