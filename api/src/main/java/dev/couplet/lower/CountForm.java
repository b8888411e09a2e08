package dev.couplet.lower;

/**
 * {@code ceil(log2 d) - 1} auxiliary bits for a positive product of degree d, the fewest that are
 * known: {@code l1..ld = min_w D (D - 1) / 2} with {@code D = S - sum_i c_i w_i} and S the number
 * of literals that hold.
 *
 * <p>For whole D the value is 0 if D is 0 or 1 and at least 1 elsewhere. So it is right if the sums
 * of c reach S or S - 1 for every S below d, and for S = d none above d - 2 but that itself. With k
 * the number of auxiliary bits, {@code 2^k < d <= 2^(k+1)}, let c be 2, 4, .., 2^(k-1) and a last
 * one of {@code t = d - 2^k}. Those before the last make all even numbers E up to 2^k - 2, which
 * serves S up to 2^k - 1; with the last they make t + E, up to d - 2, which serves S from t to d -
 * 1. As t is at most 2^k nothing is left out. All coefficients are whole.
 *
 * <p>Source: E. Boros, Y. Crama and E. Rodriguez-Heck, "Compact quadratizations for pseudo-Boolean
 * functions" (2020). There S is raised to a power of two by a constant; here the last coefficient
 * is cut, as for a slack, which keeps coefficients smaller.
 */
final class CountForm implements ProductForm {
  @Override
  public int sign() {
    return 1;
  }

  @Override
  public int auxiliaries(int degree) {
    return 31 - Integer.numberOfLeadingZeros(degree - 1);
  }

  @Override
  public SymmetricQuadratic of(int degree) {
    int auxiliaries = auxiliaries(degree);
    double[] alone = new double[auxiliaries];
    double[] each = new double[auxiliaries];
    double[][] together = new double[auxiliaries][auxiliaries];
    for (int i = 0; i < auxiliaries; i++) {
      double c = coefficient(i, degree);
      alone[i] = c * (c + 1) / 2;
      each[i] = -c;
      for (int j = 0; j < auxiliaries; j++) {
        together[i][j] = c * coefficient(j, degree);
      }
    }
    return new SymmetricQuadratic(1, alone, each, together);
  }

  private double coefficient(int auxiliary, int degree) {
    int last = auxiliaries(degree) - 1;
    return auxiliary < last ? 2 << auxiliary : degree - (2 << last);
  }

  @Override
  public boolean best(int auxiliary, int ones, int degree) {
    int last = auxiliaries(degree) - 1;
    boolean withLast = ones >= 2 << last;
    if (auxiliary == last) {
      return withLast;
    }
    int rest = withLast ? Math.min(ones - degree + (2 << last), (2 << last) - 1) : ones;
    return (rest & 2 << auxiliary) != 0;
  }
}
