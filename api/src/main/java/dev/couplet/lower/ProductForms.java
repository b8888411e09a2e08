package dev.couplet.lower;

import java.util.Comparator;
import java.util.HashMap;
import java.util.Map;

/** The way to replace a product that suits an aim best, by sign and degree. One thread. */
final class ProductForms {
  /** A way, worked out for one degree. */
  record Fitted(ProductForm way, SymmetricQuadratic form, int degree) {
    int auxiliaries() {
      return form.auxiliaries();
    }

    /** Adds the auxiliary bits to a table, with what sets them; gives the number of the first. */
    int addTo(BitTable bits, int[] literals, String where) {
      int first = bits.size();
      for (int i = 1; i <= auxiliaries(); i++) {
        String part = auxiliaries() == 1 ? "" : "part " + i + " of ";
        bits.add(part + "a product of " + degree + " in " + where);
      }
      bits.completeWith(values -> complete(literals, first, values));
      return first;
    }

    /** Sets the auxiliary bits from {@code first} on to their best values. */
    private void complete(int[] literals, int first, boolean[] bits) {
      int ones = 0;
      for (int literal : literals) {
        ones += (literal >= 0 ? bits[literal] : !bits[~literal]) ? 1 : 0;
      }
      for (int i = 0; i < auxiliaries(); i++) {
        bits[first + i] = way.best(i, ones, degree);
      }
    }
  }

  private final Aim aim;
  private final Map<Integer, Fitted> positive = new HashMap<>();
  private final Map<Integer, Fitted> negative = new HashMap<>();

  ProductForms(Aim aim) {
    this.aim = aim;
  }

  /** How many auxiliary bits a product takes; none up to degree 2. */
  int auxiliaries(double coefficient, int degree) {
    return degree <= 2 ? 0 : of(coefficient, degree).auxiliaries();
  }

  /** The best way for a product of at least three literals, none of them negated. */
  Fitted of(double coefficient, int degree) {
    Map<Integer, Fitted> known = coefficient > 0 ? positive : negative;
    return known.computeIfAbsent(degree, d -> of(coefficient, d, 0));
  }

  /** The best way for a product of at least three literals, so many of them negated. */
  Fitted of(double coefficient, int degree, int negated) {
    Comparator<Fitted> byBits = Comparator.comparingInt(Fitted::auxiliaries);
    Comparator<Fitted> bySize =
        Comparator.comparingDouble(fitted -> fitted.form().largest(degree, negated));
    Comparator<Fitted> order =
        aim == Aim.AUXILIARIES ? byBits.thenComparing(bySize) : bySize.thenComparing(byBits);
    return ProductForm.ALL.stream()
        .filter(way -> way.sign() == Math.signum(coefficient))
        .map(way -> new Fitted(way, way.of(degree), degree))
        .min(order)
        .orElseThrow();
  }
}
