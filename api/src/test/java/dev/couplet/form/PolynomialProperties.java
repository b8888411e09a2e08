package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.Combinators;
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
}
