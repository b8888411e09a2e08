package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Rule;
import java.util.Arrays;
import java.util.Optional;

/**
 * A share that is the square of a whole number: the terms of one linear part, divided by their
 * common factor, plus a constant and auxiliary bits times coefficients. It is 0 where the auxiliary
 * bits can make up for what is missing, else at least 1.
 *
 * <p>The number is read off the coefficients, squared anew and compared; which amounts the
 * auxiliary bits can make up, and which the part allows, is compared for every amount that the
 * terms can have.
 */
final class SquareShare {
  private static final long MOST_AMOUNTS = 1 << 22;

  private final Polynomial terms;
  private final Rule.Part part;
  private final double divisor;
  private final double[] coefficient;
  private double constant;

  /**
   * The share's terms over own numbers; {@code amounts} are the part's coefficients of the bits.
   */
  private SquareShare(Polynomial terms, Rule.Part part, double[] amounts) {
    this.terms = terms;
    this.part = part;
    this.divisor = part.divisor();
    this.coefficient = Arrays.copyOf(amounts, terms.size());
    for (int k = 0; k < amounts.length; k++) {
      coefficient[k] /= divisor;
    }
  }

  /** The proof, if the share is such a square. */
  static Optional<ShareProof> penalty(Polynomial terms, Rule.Part part, double[] amounts) {
    return new SquareShare(terms, part, amounts).penalty(amounts.length);
  }

  private Optional<ShareProof> penalty(int bits) {
    if (bits == 0 || coefficient[0] == 0 || part.step() > 1) {
      return Optional.empty();
    }
    for (int w = bits; w < coefficient.length; w++) {
      coefficient[w] = terms.coefficient(0, w) / (2 * coefficient[0]);
    }
    double first = coefficient[0];
    constant = (terms.coefficient(0) - first * first) / (2 * first);
    if (constant != Math.rint(constant) || !isSquare()) {
      return Optional.empty();
    }
    double[] slack = Arrays.copyOfRange(coefficient, bits, coefficient.length);
    if (!contiguous(slack) || !agrees(slack)) {
      return Optional.empty();
    }
    String how = "a square of whole numbers in " + bits + " bits, slack " + slack.length + " bits";
    return Optional.of(new ShareProof(-constant * constant, 1, 0, how));
  }

  private boolean isSquare() {
    Polynomial.Builder number = Polynomial.builder(terms.size()).add(constant);
    boolean whole = true;
    for (int k = 0; k < coefficient.length; k++) {
      whole &= coefficient[k] == Math.rint(coefficient[k]);
      number.add(coefficient[k], k);
    }
    Polynomial built = number.build();
    Polynomial wanted =
        Polynomial.builder(terms.size()).add(terms, 1).add(constant * constant).build();
    return whole && built.times(built).equals(wanted);
  }

  /** Whether the sums of the coefficients are all whole numbers from 0 to the largest one. */
  private static boolean contiguous(double[] slack) {
    double[] sizes = Arrays.stream(slack).map(Math::abs).sorted().toArray();
    double held = 0;
    boolean contiguous = true;
    for (double size : sizes) {
      contiguous &= size <= held + 1;
      held += size;
    }
    boolean up = Arrays.stream(slack).allMatch(one -> one > 0);
    boolean down = Arrays.stream(slack).allMatch(one -> one < 0);
    return contiguous && (up || down);
  }

  private boolean agrees(double[] slack) {
    double sum = Arrays.stream(slack).sum();
    double lowest = Math.ceil(part.range().lowest() / divisor);
    double highest = Math.floor(part.range().highest() / divisor);
    double zeroFrom = -constant - Math.max(0, sum);
    double zeroTo = -constant - Math.min(0, sum);
    if (highest - lowest > MOST_AMOUNTS) {
      return false;
    }
    boolean agrees = true;
    for (double amount = lowest; amount <= highest; amount++) {
      boolean zero = zeroFrom <= amount && amount <= zeroTo;
      agrees &= zero == (part.violation(amount * divisor) == 0);
    }
    return agrees;
  }
}
