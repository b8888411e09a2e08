package dev.couplet.model;

import dev.couplet.form.Polynomial;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.Map;

/** The decisions of a model that are fixed, each with the pattern of its literals. Immutable. */
final class Fixing {
  private static final byte FREE = -1;

  private final Map<Decision, boolean[]> patterns;
  private final byte[] value;

  Fixing(Map<Decision, boolean[]> patterns, int literals) {
    this.patterns = new LinkedHashMap<>(patterns);
    this.value = new byte[patterns.isEmpty() ? 0 : literals];
    Arrays.fill(value, FREE);
    patterns.forEach(
        (decision, pattern) -> {
          int first = Slot.of(decision).first();
          for (int k = 0; k < pattern.length; k++) {
            value[first + k] = (byte) (pattern[k] ? 1 : 0);
          }
        });
  }

  boolean isEmpty() {
    return patterns.isEmpty();
  }

  boolean has(Decision decision) {
    return patterns.containsKey(decision);
  }

  /** Whether a decision is fixed to another pattern than this. */
  boolean contradicts(Decision decision, boolean[] pattern) {
    boolean[] own = patterns.get(decision);
    return own != null && !Arrays.equals(own, pattern);
  }

  /** Writes the fixed patterns over those of the given literals. */
  void write(boolean[] literals) {
    patterns.forEach(
        (decision, pattern) ->
            System.arraycopy(pattern, 0, literals, Slot.of(decision).first(), pattern.length));
  }

  /** The polynomial in the literals that are left; what is fixed has become coefficients. */
  Polynomial in(Polynomial polynomial) {
    if (isEmpty()) {
      return polynomial;
    }
    Polynomial.Builder left = Polynomial.builder(polynomial.size());
    polynomial.forEachTerm(
        (coefficient, product) -> {
          int[] kept = new int[product.length];
          int count = 0;
          for (int literal : product) {
            if (value[literal] == 0) {
              return;
            }
            if (value[literal] == FREE) {
              kept[count++] = literal;
            }
          }
          left.add(coefficient, Arrays.copyOf(kept, count));
        });
    return left.build();
  }
}
