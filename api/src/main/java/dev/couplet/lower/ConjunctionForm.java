package dev.couplet.lower;

/**
 * One auxiliary bit for a negative product of any degree d: {@code -l1..ld = min_w w (d - 1 - S)}
 * with S the number of literals that hold. The factor is -1 if all hold, else at least 0.
 *
 * <p>Source: D. Freedman and P. Drineas, "Energy minimization via graph cuts: settling what is
 * possible" (2005).
 */
final class ConjunctionForm implements ProductForm {
  @Override
  public int sign() {
    return -1;
  }

  @Override
  public int auxiliaries(int degree) {
    return 1;
  }

  @Override
  public SymmetricQuadratic of(int degree) {
    return new SymmetricQuadratic(
        0, new double[] {degree - 1}, new double[] {-1}, new double[0][0]);
  }

  @Override
  public boolean best(int auxiliary, int ones, int degree) {
    return ones == degree;
  }
}
