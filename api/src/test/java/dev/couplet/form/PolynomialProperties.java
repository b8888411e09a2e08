package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Set;
import java.util.SplittableRandom;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.Combinators;
import net.jqwik.api.Example;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;

/** Polynomials with whole coefficients against sums over their terms as they arrived. */
class PolynomialProperties {
  private static final int SIZE = 6;

  /** A coefficient and the variables it is multiplied by, with repeats. */
  record Term(long coefficient, List<Integer> variables) {
    long value(State state) {
      return variables.stream().allMatch(state::get) ? coefficient : 0;
    }

    int[] product() {
      return variables.stream().mapToInt(v -> v).toArray();
    }
  }

  @Provide
  Arbitrary<List<Term>> terms() {
    Arbitrary<Long> coefficients =
        Arbitraries.oneOf(
            Arbitraries.longs().between(-9, 9),
            Arbitraries.of(-1L, 1L),
            Arbitraries.just(0L),
            Arbitraries.longs().between(-1L << 20, 1L << 20));
    Arbitrary<List<Integer>> variables =
        Arbitraries.integers().between(0, SIZE - 1).list().ofMaxSize(5);
    Arbitrary<Term> term = Combinators.combine(coefficients, variables).as(Term::new);
    return term.list().ofMaxSize(40).withoutEdgeCases();
  }

  private static Polynomial polynomial(List<Term> terms) {
    Polynomial.Builder builder = Polynomial.builder(SIZE);
    terms.forEach(term -> builder.add(term.coefficient(), term.product()));
    return builder.build();
  }

  private static long value(List<Term> terms, State state) {
    return terms.stream().mapToLong(term -> term.value(state)).sum();
  }

  @Property
  void valuesAreSumsOverTheTerms(@ForAll("terms") List<Term> terms) {
    Polynomial polynomial = polynomial(terms);
    for (State state : Entries.states(SIZE)) {
      assertEquals(value(terms, state), polynomial.value(state));
    }
    assertEquals(value(terms, State.zeros(SIZE)), polynomial.constant());
  }

  @Property
  void sumsAndProductsAreThoseOfTheValues(
      @ForAll("terms") List<Term> left, @ForAll("terms") List<Term> right) {
    Polynomial ours = polynomial(left);
    Polynomial theirs = polynomial(right);
    Polynomial sum = ours.plus(theirs);
    Polynomial product = ours.times(theirs);
    for (State state : Entries.states(SIZE)) {
      assertEquals(value(left, state) + value(right, state), sum.value(state));
      assertEquals(value(left, state) * value(right, state), product.value(state));
    }
    assertEquals(sum, theirs.plus(ours));
    assertEquals(product, theirs.times(ours));
    assertEquals(product.hashCode(), theirs.times(ours).hashCode());
  }

  /** A square equals the form itself where all its values are 0 or 1. */
  @Property
  void aProductOfVariablesIsItsOwnSquare(@ForAll("terms") List<Term> terms) {
    for (Term term : terms) {
      Polynomial product = Polynomial.builder(SIZE).add(1, term.product()).build();
      assertEquals(product, product.times(product));
    }
  }

  @Property
  void termsStandByDegreeThenVariablesOnceEach(@ForAll("terms") List<Term> terms) {
    Polynomial polynomial = polynomial(terms);
    List<int[]> products = new ArrayList<>();
    polynomial.forEachTerm(
        (coefficient, variables) -> {
          assertTrue(coefficient != 0);
          assertEquals(coefficient, polynomial.coefficient(variables));
          products.add(variables);
        });
    assertEquals(polynomial.terms(), products.size());
    for (int t = 0; t < products.size(); t++) {
      int[] product = products.get(t);
      assertTrue(Arrays.equals(product, Arrays.stream(product).distinct().sorted().toArray()));
      if (t > 0) {
        int[] before = products.get(t - 1);
        assertTrue(
            before.length < product.length
                || (before.length == product.length && Arrays.compare(before, product) < 0));
      }
    }
    int degree = products.isEmpty() ? 0 : products.get(products.size() - 1).length;
    assertEquals(degree, polynomial.degree());
  }

  @Property
  void theOrderOfArrivalDoesNotMatter(@ForAll("terms") List<Term> terms) {
    List<Term> reversed = new ArrayList<>(terms);
    Collections.reverse(reversed);
    assertEquals(polynomial(terms), polynomial(reversed));
    assertEquals(polynomial(terms).hashCode(), polynomial(reversed).hashCode());
  }

  @Property
  void coefficientsAreFoundInAnyOrderOfTheVariables(@ForAll("terms") List<Term> terms) {
    Polynomial polynomial = polynomial(terms);
    for (Term term : terms) {
      List<Integer> distinct = term.variables().stream().distinct().sorted().toList();
      double sum =
          terms.stream()
              .filter(t -> t.variables().stream().distinct().sorted().toList().equals(distinct))
              .mapToLong(Term::coefficient)
              .sum();
      assertEquals(sum, polynomial.coefficient(term.product()));
    }
  }

  @Property
  void aFormOfDegreeTwoIsAQuboAndOthersAreRefused(@ForAll("terms") List<Term> terms) {
    Polynomial polynomial = polynomial(terms);
    if (polynomial.degree() > 2) {
      assertThrows(IllegalArgumentException.class, polynomial::toQubo);
      return;
    }
    Qubo qubo = polynomial.toQubo();
    for (State state : Entries.states(SIZE)) {
      assertEquals(value(terms, state), qubo.value(state));
    }
    assertEquals(polynomial, qubo.toPolynomial());
  }

  @Property
  void moreVariablesChangeNoTerm(@ForAll("terms") List<Term> terms) {
    Polynomial polynomial = polynomial(terms);
    Polynomial wider = polynomial.inVariables(SIZE + 3);
    assertEquals(SIZE + 3, wider.size());
    assertEquals(wider, Polynomial.builder(SIZE + 3).add(polynomial, 1).build());
    for (State state : Entries.states(SIZE)) {
      State longer = State.parse(state.toText() + "101");
      assertEquals(polynomial.value(state), wider.value(longer));
    }
  }

  /** All pairs of terms, one by one: the square of a linear polynomial takes a shorter way. */
  @Property
  void squaresAreTheProductsOfAllPairs(@ForAll long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Polynomial.Builder linear = Polynomial.builder(SIZE);
    for (int t = random.nextInt(7); t > 0; t--) {
      double value = random.nextBoolean() ? random.nextInt(-3, 4) : random.nextDouble(-1, 1);
      if (random.nextInt(4) == 0) {
        linear.add(value);
      } else {
        linear.add(value, random.nextInt(SIZE));
      }
    }
    Polynomial built = linear.build();
    Polynomial.Builder slow = Polynomial.builder(SIZE);
    built.forEachTerm(
        (a, left) -> built.forEachTerm((b, right) -> slow.add(a * b, TermOrder.join(left, right))));
    assertEquals(slow.build(), built.times(built));
  }

  @Property
  void magnitudeAndSignsBoundEveryValue(@ForAll("terms") List<Term> terms) {
    Polynomial polynomial = polynomial(terms);
    double[] sums = new double[3];
    boolean[] whole = {true};
    polynomial.forEachTerm(
        (coefficient, variables) -> {
          boolean constant = variables.length == 0;
          sums[0] += Math.abs(coefficient);
          sums[1] += constant || coefficient < 0 ? coefficient : 0;
          sums[2] += constant || coefficient > 0 ? coefficient : 0;
        });
    assertEquals(sums[0], polynomial.magnitude());
    assertEquals(sums[1], polynomial.lowest());
    assertEquals(sums[2], polynomial.highest());
    assertTrue(polynomial.whole());
    Polynomial finer = Polynomial.builder(SIZE).add(polynomial, 1).add(0.5, 0, 1).build();
    assertFalse(finer.whole());
  }

  /** Scaling by a number, adding scaled and adding term by term are the same. */
  @Property
  void scaledTermsAreTheSameInEveryWay(
      @ForAll("terms") List<Term> terms, @ForAll("terms") List<Term> others, @ForAll long seed) {
    double number = new SplittableRandom(seed).nextInt(-2, 3) / 2.0;
    Polynomial first = polynomial(terms);
    Polynomial second = polynomial(others);
    Polynomial.Builder slow = Polynomial.builder(SIZE);
    first.forEachTerm((coefficient, variables) -> slow.add(coefficient, variables));
    second.forEachTerm((coefficient, variables) -> slow.add(number * coefficient, variables));
    assertEquals(slow.build(), Polynomial.builder(SIZE).add(first, 1).add(second, number).build());
    assertEquals(slow.build(), first.plus(second.times(number)));
  }

  /** A form of polynomials is the same as one of their terms. */
  @Property
  void formsAddPolynomials(@ForAll("terms") List<Term> terms, @ForAll("terms") List<Term> others) {
    List<Polynomial> parts = new ArrayList<>();
    for (List<Term> list : List.of(terms, others)) {
      List<Term> quadratic =
          list.stream().filter(term -> Set.copyOf(term.variables()).size() <= 2).toList();
      parts.add(polynomial(quadratic));
    }
    Qubo.Builder slow = Qubo.builder(SIZE);
    for (int k = 0; k < 2; k++) {
      double factor = k + 0.5;
      parts
          .get(k)
          .forEachTerm(
              (coefficient, variables) -> {
                switch (variables.length) {
                  case 0 -> slow.addConstant(factor * coefficient);
                  case 1 -> slow.addLinear(variables[0], factor * coefficient);
                  default -> slow.addPair(variables[0], variables[1], factor * coefficient);
                }
              });
    }
    Qubo fast = Qubo.builder(SIZE).add(parts.get(0), 0.5).add(parts.get(1), 1.5).build();
    assertEquals(slow.build(), fast);
  }

  @Example
  void formsRefuseWhatDoesNotFit() {
    Polynomial cubic = Polynomial.builder(3).add(1, 0, 1, 2).build();
    assertThrows(IllegalArgumentException.class, () -> Qubo.builder(3).add(cubic, 1));
    Polynomial wide = Polynomial.builder(3).add(1, 2).build();
    assertThrows(IllegalArgumentException.class, () -> Qubo.builder(2).add(wide, 1));
    assertThrows(IllegalArgumentException.class, () -> Qubo.builder(3).add(wide, Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> wide.times(Double.POSITIVE_INFINITY));
  }
}
