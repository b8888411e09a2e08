package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import java.util.Arrays;
import java.util.Optional;

/**
 * A polynomial with its auxiliary bits minimised away: each group of them that hang together is
 * looked at under every pattern of its neighbours, and the polynomial that takes the lowest values
 * found is put in its place.
 */
final class ObjectiveShare {
  private static final int MOST_NEIGHBOURS = 14;

  private ObjectiveShare() {}

  /** The polynomial over decision bits alone; nothing if a group has too many neighbours. */
  static Optional<Polynomial> minimised(Polynomial polynomial, int decisionBits) {
    Polynomial.Builder sum = Polynomial.builder(decisionBits);
    Polynomial.Builder rest = Polynomial.builder(polynomial.size());
    polynomial.forEachTerm(
        (coefficient, variables) -> {
          boolean decisions =
              variables.length == 0 || variables[variables.length - 1] < decisionBits;
          (decisions ? sum : rest).add(coefficient, variables);
        });
    Polynomial left = rest.build();
    for (Share group : AuxiliaryShares.of(left, decisionBits)) {
      if (group.bits().length > MOST_NEIGHBOURS) {
        return Optional.empty();
      }
      add(group, sum);
    }
    return Optional.of(sum.build());
  }

  /** Adds the polynomial through the lowest values, by differences over the lattice of subsets. */
  private static void add(Share group, Polynomial.Builder sum) {
    int n = group.bits().length;
    double[] value = new double[1 << n];
    Landscape landscape = new GroupedLandscape(group.renumbered(), n);
    for (int pattern = 0; pattern < value.length; pattern++) {
      landscape.reset(pattern);
      value[pattern] = landscape.value();
    }
    for (int k = 0; k < n; k++) {
      for (int pattern = 0; pattern < value.length; pattern++) {
        value[pattern] -= (pattern >>> k & 1) != 0 ? value[pattern ^ 1 << k] : 0;
      }
    }
    for (int pattern = 0; pattern < value.length; pattern++) {
      int own = pattern;
      int[] product =
          Arrays.stream(group.bits()).filter(bit -> in(group.bits(), bit, own)).toArray();
      if (value[pattern] != 0) {
        sum.add(value[pattern], product);
      }
    }
  }

  private static boolean in(int[] bits, int bit, int pattern) {
    return (pattern >>> Arrays.binarySearch(bits, bit) & 1) != 0;
  }
}
