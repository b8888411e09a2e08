package dev.couplet.lower;

/**
 * {@code floor((d - 1) / 2)} auxiliary bits for a positive product of degree d, none of them
 * coupled: {@code l1..ld = min_w S2 + sum_i w_i (c_i (2i - S) - 1)} with S the number of literals
 * that hold, S2 that of their pairs, and c_i = 1 for the last i of an odd d, else 2.
 *
 * <p>Source: H. Ishikawa, "Transformation of general binary MRF minimization to the first-order
 * case" (2011).
 */
final class ThresholdForm implements ProductForm {
  @Override
  public int sign() {
    return 1;
  }

  @Override
  public int auxiliaries(int degree) {
    return (degree - 1) / 2;
  }

  @Override
  public SymmetricQuadratic of(int degree) {
    int auxiliaries = auxiliaries(degree);
    double[] alone = new double[auxiliaries];
    double[] each = new double[auxiliaries];
    for (int i = 1; i <= auxiliaries; i++) {
      double c = degree % 2 == 1 && i == auxiliaries ? 1 : 2;
      alone[i - 1] = 2 * c * i - 1;
      each[i - 1] = -c;
    }
    return new SymmetricQuadratic(1, alone, each, new double[0][0]);
  }

  @Override
  public boolean best(int auxiliary, int ones, int degree) {
    return ones >= 2 * (auxiliary + 1);
  }
}
