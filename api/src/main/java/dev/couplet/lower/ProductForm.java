package dev.couplet.lower;

import java.util.List;

/**
 * A way to replace a single product of three and more literals by a quadratic form with auxiliary
 * bits: minimised over these it is 1 (or -1, for products with a negative coefficient) where all
 * literals hold, and 0 elsewhere.
 *
 * <p>A new way is one new file and its place in {@link #ALL}. Implementations are immutable.
 */
interface ProductForm {
  /** Every way there is; of equally good ones the first is taken. */
  List<ProductForm> ALL = List.of(new ConjunctionForm(), new ThresholdForm(), new CountForm());

  /** The sign of the coefficients that it is for, 1 or -1. */
  int sign();

  /** How many auxiliary bits it takes. */
  int auxiliaries(int degree);

  /** The form for products of so many literals. */
  SymmetricQuadratic of(int degree);

  /** What an auxiliary bit is at its best when so many of the literals hold. */
  boolean best(int auxiliary, int ones, int degree);
}
