package dev.couplet.form;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.TreeMap;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.Combinators;

/**
 * The coefficients of a form as they arrive, and a plain evaluator in decimal arithmetic that
 * rounds nowhere.
 *
 * @param regime what kind of coefficients these are
 * @param size the number of variables
 * @param list the entries: i below j a pair, i = j linear, i = -1 the constant
 */
record Entries(Regime regime, int size, List<Entry> list) {
  /** One coefficient. */
  record Entry(int i, int j, double value) {}

  /** Kinds of coefficients that break different things. */
  enum Regime {
    INTEGERS(true),
    TIES(true),
    QUARTERS(true),
    LARGE_INTEGERS(true),
    ALL_ZERO(true),
    REALS(false),
    WIDE_RANGE(false);

    final boolean exact;

    Regime(boolean exact) {
      this.exact = exact;
    }

    Arbitrary<Double> coefficients() {
      return switch (this) {
        case INTEGERS -> Arbitraries.integers().between(-20, 20).map(v -> (double) v);
        case TIES -> Arbitraries.of(-1.0, 1.0);
        case QUARTERS -> Arbitraries.integers().between(-99, 99).map(v -> v / 4.0);
        case LARGE_INTEGERS ->
            Arbitraries.longs().between(-1L << 44, 1L << 44).map(v -> (double) v);
        case ALL_ZERO -> Arbitraries.of(0.0, -0.0);
        case REALS -> Arbitraries.doubles().between(-10, 10);
        case WIDE_RANGE ->
            Combinators.combine(
                    Arbitraries.doubles().between(1, 10),
                    Arbitraries.integers().between(-300, 300),
                    Arbitraries.of(-1, 1))
                .as((digits, power, sign) -> sign * digits * StrictMath.pow(10, power));
      };
    }
  }

  /** Forms of up to {@code most} variables, of every regime, from empty to dense with repeats. */
  static Arbitrary<Entries> upTo(int most) {
    return Arbitraries.of(Regime.class)
        .flatMap(
            regime -> Arbitraries.integers().between(0, most).flatMap(size -> of(regime, size)));
  }

  private static Arbitrary<Entries> of(Regime regime, int size) {
    int places = size * (size + 1) / 2;
    Arbitrary<Integer> counts = Arbitraries.of(0, 1, size, places, 2 * places);
    Arbitrary<Integer> variables = Arbitraries.integers().between(-1, size - 1);
    Arbitrary<Entry> entries =
        Combinators.combine(variables, variables, regime.coefficients())
            .as((a, b, value) -> entry(a, b, value));
    return counts.flatMap(
        count ->
            entries
                .list()
                .ofSize(count)
                .withoutEdgeCases()
                .map(list -> new Entries(regime, size, list)));
  }

  private static Entry entry(int a, int b, double value) {
    boolean constant = a < 0 || b < 0;
    return constant ? new Entry(-1, -1, value) : new Entry(Math.min(a, b), Math.max(a, b), value);
  }

  Qubo qubo() {
    Qubo.Builder form = Qubo.builder(size).allowRounding();
    for (Entry e : list) {
      if (e.i < 0) {
        form.addConstant(e.value);
      } else if (e.i == e.j) {
        form.addLinear(e.i, e.value);
      } else {
        form.addPair(e.j, e.i, e.value);
      }
    }
    return form.build();
  }

  Ising ising() {
    Ising.Builder form = Ising.builder(size).allowRounding();
    for (Entry e : list) {
      if (e.i < 0) {
        form.addConstant(e.value);
      } else if (e.i == e.j) {
        form.addLinear(e.i, e.value);
      } else {
        form.addPair(e.i, e.j, e.value);
      }
    }
    return form.build();
  }

  Polynomial polynomial() {
    Polynomial.Builder form = Polynomial.builder(size);
    for (Entry e : list) {
      if (e.i < 0) {
        form.add(e.value);
      } else {
        form.add(e.value, e.i, e.j);
      }
    }
    return form.build();
  }

  Entries shuffled(long seed) {
    List<Entry> other = new ArrayList<>(list);
    SplittableRandom random = new SplittableRandom(seed);
    for (int k = other.size() - 1; k > 0; k--) {
      Collections.swap(other, k, random.nextInt(k + 1));
    }
    return new Entries(regime, size, other);
  }

  /** The energy over 0/1 variables. */
  BigDecimal bitValue(State state) {
    BigDecimal sum = BigDecimal.ZERO;
    for (Entry e : list) {
      boolean counts = e.i < 0 || (state.get(e.i) && state.get(e.j));
      sum = counts ? sum.add(new BigDecimal(e.value)) : sum;
    }
    return sum;
  }

  /** The energy over spins; here an entry with i = j is a field. */
  BigDecimal spinValue(State state) {
    BigDecimal sum = BigDecimal.ZERO;
    for (Entry e : list) {
      boolean negative = e.i >= 0 && state.get(e.i) != (e.i != e.j && state.get(e.j));
      BigDecimal value = new BigDecimal(e.value);
      sum = negative ? sum.subtract(value) : sum.add(value);
    }
    return sum;
  }

  /** The sum of all magnitudes: the scale that rounding goes by. */
  double magnitude() {
    return list.stream().mapToDouble(e -> Math.abs(e.value)).sum();
  }

  /** The sums by place, in the order of a form's pairs; zero sums left out. */
  Map<List<Integer>, Double> sums() {
    Map<List<Integer>, Double> sums = new TreeMap<>(Entries::compare);
    list.forEach(e -> sums.merge(List.of(e.i, e.j), e.value, Double::sum));
    sums.values().removeIf(sum -> sum == 0);
    return sums;
  }

  private static int compare(List<Integer> left, List<Integer> right) {
    int byRow = Integer.compare(left.get(0), right.get(0));
    return byRow != 0 ? byRow : Integer.compare(left.get(1), right.get(1));
  }

  /** All states of so many variables. */
  static List<State> states(int size) {
    List<State> states = new ArrayList<>();
    for (long word = 0; word < 1L << size; word++) {
      states.add(State.ofWords(size, word));
    }
    return states;
  }
}
