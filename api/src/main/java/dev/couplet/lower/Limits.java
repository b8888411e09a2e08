package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Rule.Part;
import dev.couplet.model.Statement.Range;

/**
 * What a part of a rule limits, over bits and tightened: {@code lowest <= terms <= highest}, all
 * whole, in steps above 1 only between finite limits. A limit that every plan keeps is infinite.
 *
 * @param terms the polynomial over bits, without a constant
 * @param lowest whole, or minus infinity
 * @param highest whole, or infinity
 * @param step the terms lie on {@code lowest + k step}
 * @param range between what the terms lie under any plan
 */
record Limits(Polynomial terms, double lowest, double highest, double step, Range range) {
  /**
   * The limits of a required rule, divided by the coefficients' common factor and rounded inwards.
   */
  static Limits tightened(Part part, Coding coding) {
    return divided(part).over(coding).withoutImplied();
  }

  /** The same over literals instead of bits. */
  static Limits overLiterals(Part part) {
    return divided(part).withoutImplied();
  }

  /** The limits of a preferred rule, as they are: rounding would change the amount of a miss. */
  static Limits exact(Part part, Coding coding) {
    return asStated(part).over(coding).withoutImplied();
  }

  private static Limits asStated(Part part) {
    return new Limits(part.terms(), part.lowest(), part.highest(), part.step(), part.range());
  }

  private static Limits divided(Part part) {
    double divisor = part.divisor();
    if (divisor <= 1 || part.step() > 1) {
      return asStated(part);
    }
    Polynomial.Builder divided = Polynomial.builder(part.terms().size());
    part.terms()
        .forEachTerm((coefficient, literals) -> divided.add(coefficient / divisor, literals));
    return new Limits(
        divided.build(),
        Math.ceil(part.lowest() / divisor),
        Math.floor(part.highest() / divisor),
        1,
        new Range(
            Math.ceil(part.range().lowest() / divisor),
            Math.floor(part.range().highest() / divisor)));
  }

  /** From literals to bits, the constants that literals bring along moved into the limits. */
  private Limits over(Coding coding) {
    Polynomial bits = coding.overBits(terms);
    double constant = bits.constant();
    if (constant != 0) {
      bits = Polynomial.builder(bits.size()).add(bits, 1).add(-constant).build();
    }
    Range moved = new Range(range.lowest() - constant, range.highest() - constant);
    return new Limits(bits, lowest - constant, highest - constant, step, moved);
  }

  private Limits withoutImplied() {
    if (step > 1) {
      return this;
    }
    return new Limits(
        terms,
        lowest <= range.lowest() ? Double.NEGATIVE_INFINITY : lowest,
        highest >= range.highest() ? Double.POSITIVE_INFINITY : highest,
        step,
        range);
  }

  boolean hasLowest() {
    return lowest != Double.NEGATIVE_INFINITY;
  }

  boolean hasHighest() {
    return highest != Double.POSITIVE_INFINITY;
  }

  /** By how much a value of the terms misses the nearest one that keeps the limits. */
  double violation(double value) {
    if (step == 1 || value <= lowest || value >= highest) {
      return Math.max(0, Math.max(value - highest, lowest - value));
    }
    double beyond = (value - lowest) % step;
    return Math.min(beyond, step - beyond);
  }
}
