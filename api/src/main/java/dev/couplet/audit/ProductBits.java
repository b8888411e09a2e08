package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Auxiliary bits that are best at the product of two bits before them, whatever the other bits are:
 * the product can then stand in their place, and many bits that hang together come apart.
 *
 * <p>A bit w whose terms are {@code w G} is best at 1 where G is at most 0, and at 0 where it is at
 * least 0. It is the product of x and y if, by the signs of its other coefficients alone, G is
 * never above 0 where both are 1 and never below 0 elsewhere. The last bits are looked at first,
 * since bits may build on earlier ones.
 */
final class ProductBits {
  private record Found(int w, int x, int y) {}

  private final List<Found> found;

  private ProductBits(List<Found> found) {
    this.found = found;
  }

  /** Those of a form of degree 2; G may be on the wrong side of 0 by {@code error}. */
  static ProductBits of(Polynomial form, int decisionBits, double error) {
    List<Found> found = new ArrayList<>();
    Polynomial left = form;
    for (int w = form.size() - 1; w >= decisionBits; w--) {
      Optional<Found> one = found(left, w, error);
      if (one.isPresent()) {
        found.add(one.get());
        left = without(left, one.get());
      }
    }
    return new ProductBits(separable(left, decisionBits) ? found : List.of());
  }

  /** A part of the form with products in the place of the bits. */
  Polynomial replacedIn(Polynomial part) {
    Polynomial left = part;
    for (Found one : found) {
      left = without(left, one);
    }
    return left;
  }

  private static Optional<Found> found(Polynomial form, int w, double error) {
    int[] lowest =
        IntStream.range(0, w)
            .filter(other -> form.coefficient(other, w) < 0)
            .boxed()
            .sorted((a, b) -> Double.compare(form.coefficient(a, w), form.coefficient(b, w)))
            .mapToInt(Integer::intValue)
            .limit(2)
            .toArray();
    if (lowest.length < 2) {
      return Optional.empty();
    }
    int x = lowest[0];
    int y = lowest[1];
    double alone = form.coefficient(w);
    double ofX = form.coefficient(x, w);
    double ofY = form.coefficient(y, w);
    double[] rest = {0, 0};
    form.forEachTerm(
        (coefficient, variables) -> {
          boolean own =
              variables.length == 1
                  || (variables.length == 2 && (variables[0] == x || variables[0] == y));
          if (!own && has(variables, w)) {
            rest[coefficient < 0 ? 0 : 1] += coefficient;
          }
        });
    boolean oneWhereBoth = alone + ofX + ofY + rest[1] <= error;
    boolean zeroElsewhere = alone + Math.min(ofX, ofY) + rest[0] >= -error;
    return oneWhereBoth && zeroElsewhere ? Optional.of(new Found(w, x, y)) : Optional.empty();
  }

  private static boolean has(int[] variables, int variable) {
    return Arrays.binarySearch(variables, variable) >= 0;
  }

  private static Polynomial without(Polynomial form, Found one) {
    Polynomial.Builder left = Polynomial.builder(form.size());
    boolean[] changed = {false};
    form.forEachTerm(
        (coefficient, variables) -> {
          if (has(variables, one.w())) {
            IntStream rest = Arrays.stream(variables).filter(v -> v != one.w());
            IntStream both = IntStream.of(one.x(), one.y());
            left.add(coefficient, IntStream.concat(rest, both).toArray());
            changed[0] = true;
          } else {
            left.add(coefficient, variables);
          }
        });
    return changed[0] ? left.build() : form;
  }

  /** Whether no term of degree 3 or more has two bits that are left to be minimised. */
  private static boolean separable(Polynomial form, int decisionBits) {
    boolean[] separable = {true};
    form.forEachTerm(
        (coefficient, variables) ->
            separable[0] &=
                variables.length <= 2 || variables[variables.length - 2] < decisionBits);
    return separable[0];
  }
}
