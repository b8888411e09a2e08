package dev.couplet.audit;

import dev.couplet.form.Polynomial;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.function.IntPredicate;

/**
 * Writes polynomials over bits, and over literals, as functions of plans: two that agree under
 * every plan get the same terms.
 *
 * <p>Bits that are literals stay. In the place of those of another code stand the indicators of its
 * valid patterns but the first one: a product of bits of one code is worth 0 or 1 under each, so
 * that it is a constant and a sum of these, and a function has one such sum. Only the condition
 * that exactly one of several plain literals holds is not made use of.
 */
final class PlanBasis {
  private static final long MOST_TERMS = 1 << 22;

  private final CodedUnits units;
  private final Map<Integer, Integer> firstOf = new LinkedHashMap<>();
  private final int size;
  private long made;

  PlanBasis(CodedUnits units, int literals) {
    this.units = units;
    int next = literals;
    for (CodedUnit unit : units.all()) {
      if (!unit.plain()) {
        firstOf.put(unit.firstLiteral(), next);
        next += unit.values().size();
      }
    }
    this.size = next;
  }

  /** Whether the polynomials so far were small enough to be written out. */
  boolean fits() {
    return made <= MOST_TERMS;
  }

  /** A polynomial over decision bits. */
  Polynomial ofBits(Polynomial bits) {
    Polynomial.Builder sum = Polynomial.builder(size);
    bits.forEachTerm(
        (coefficient, product) -> {
          Map<Integer, Integer> masks = new LinkedHashMap<>();
          int plain = 0;
          for (int bit : product) {
            CodedUnit unit = units.ofBit(bit);
            if (unit.plain()) {
              product[plain++] = unit.firstLiteral() + bit - unit.firstBit();
            } else {
              masks.merge(unit.firstLiteral(), 1 << (bit - unit.firstBit()), (a, b) -> a | b);
            }
          }
          Polynomial own = term(coefficient, Arrays.copyOf(product, plain));
          for (Map.Entry<Integer, Integer> one : masks.entrySet()) {
            int mask = one.getValue();
            own = times(own, units.ofLiteral(one.getKey()), pattern -> (pattern & mask) == mask);
          }
          add(sum, own);
        });
    return sum.build();
  }

  /** A polynomial over literals. */
  Polynomial ofLiterals(Polynomial literals) {
    Polynomial.Builder sum = Polynomial.builder(size);
    literals.forEachTerm(
        (coefficient, product) -> {
          Map<Integer, List<Integer>> wanted = new LinkedHashMap<>();
          int plain = 0;
          for (int literal : product) {
            CodedUnit unit = units.ofLiteral(literal);
            if (unit.plain()) {
              product[plain++] = literal;
            } else {
              wanted.computeIfAbsent(unit.firstLiteral(), u -> new ArrayList<>()).add(literal);
            }
          }
          Polynomial own = term(coefficient, Arrays.copyOf(product, plain));
          for (Map.Entry<Integer, List<Integer>> one : wanted.entrySet()) {
            CodedUnit unit = units.ofLiteral(one.getKey());
            own = times(own, unit, p -> unit.values().get(p).containsAll(one.getValue()));
          }
          add(sum, own);
        });
    return sum.build();
  }

  private Polynomial term(double coefficient, int[] product) {
    return Polynomial.builder(size).add(coefficient, product).build();
  }

  private void add(Polynomial.Builder sum, Polynomial own) {
    made += own.terms();
    if (fits()) {
      sum.add(own, 1);
    }
  }

  private Polynomial times(Polynomial own, CodedUnit unit, IntPredicate oneUnder) {
    if (!fits()) {
      return own;
    }
    Polynomial.Builder indicators = Polynomial.builder(size);
    int first = Objects.requireNonNull(firstOf.get(unit.firstLiteral()));
    double ofFirst = Double.NaN;
    for (int pattern = 0; pattern < unit.values().size(); pattern++) {
      if (unit.valid(pattern)) {
        double value = oneUnder.test(pattern) ? 1 : 0;
        if (Double.isNaN(ofFirst)) {
          ofFirst = value;
          indicators.add(value);
        } else if (value != ofFirst) {
          indicators.add(value - ofFirst, first + pattern);
        }
      }
    }
    return own.times(indicators.build());
  }
}
