package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;

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
    TermsByBit left = new TermsByBit(form, decisionBits);
    for (int w = form.size() - 1; w >= decisionBits; w--) {
      Optional<Found> one = found(left.of(w), w, error);
      if (one.isPresent()) {
        found.add(one.get());
        left.replace(w, one.get().x(), one.get().y());
      }
    }
    boolean none = found.isEmpty();
    return new ProductBits(none || separable(left.build(), decisionBits) ? found : List.of());
  }

  /** A part of the form with products in the place of the bits. */
  Polynomial replacedIn(Polynomial part) {
    if (found.isEmpty()) {
      return part;
    }
    TermsByBit left = new TermsByBit(part, found.get(found.size() - 1).w());
    found.forEach(one -> left.replace(one.w(), one.x(), one.y()));
    return left.build();
  }

  /** The bits that w stands for the product of, from its terms without it. */
  private static Optional<Found> found(Map<List<Integer>, Double> terms, int w, double error) {
    List<Integer> lowest =
        terms.entrySet().stream()
            .filter(term -> term.getKey().size() == 1 && term.getKey().get(0) < w)
            .filter(term -> term.getValue() < 0)
            .sorted(
                Comparator.comparingDouble((Map.Entry<List<Integer>, Double> t) -> t.getValue())
                    .thenComparing(t -> t.getKey().get(0)))
            .limit(2)
            .map(term -> term.getKey().get(0))
            .toList();
    if (lowest.size() < 2) {
      return Optional.empty();
    }
    int x = lowest.get(0);
    int y = lowest.get(1);
    double alone = terms.getOrDefault(List.of(), 0.0);
    double ofX = terms.getOrDefault(List.of(x), 0.0);
    double ofY = terms.getOrDefault(List.of(y), 0.0);
    double below = 0;
    double above = 0;
    for (Map.Entry<List<Integer>, Double> term : terms.entrySet()) {
      List<Integer> others = term.getKey();
      if (!others.isEmpty() && !others.equals(List.of(x)) && !others.equals(List.of(y))) {
        below += Math.min(0, term.getValue());
        above += Math.max(0, term.getValue());
      }
    }
    boolean oneWhereBoth = alone + ofX + ofY + above <= error;
    boolean zeroElsewhere = alone + Math.min(ofX, ofY) + below >= -error;
    return oneWhereBoth && zeroElsewhere ? Optional.of(new Found(w, x, y)) : Optional.empty();
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
