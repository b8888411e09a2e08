package dev.couplet.form;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;

/** Quadratic forms against sums in decimal arithmetic over every state. */
class FormProperties {
  private static final int MOST = 6;

  /** 100 roundings, each of half a unit in the last place of a partial sum. */
  private static final double ROUNDING = 100 * 0x1p-53;

  @Provide
  Arbitrary<Entries> entries() {
    return Entries.upTo(MOST);
  }

  private static void assertEnergy(Entries entries, BigDecimal expected, double energy) {
    if (entries.regime().exact) {
      assertEquals(0, expected.compareTo(new BigDecimal(energy)), expected + " is not " + energy);
    } else {
      assertEquals(expected.doubleValue(), energy, ROUNDING * entries.magnitude());
    }
  }

  @Property
  void energiesAreThoseOfTheEntries(@ForAll("entries") Entries entries) {
    Qubo qubo = entries.qubo();
    Ising ising = entries.ising();
    for (State state : Entries.states(entries.size())) {
      assertEnergy(entries, entries.bitValue(state), qubo.value(state));
      assertEnergy(entries, entries.spinValue(state), ising.value(state));
    }
  }

  @Property
  void conversionsKeepEveryEnergy(@ForAll("entries") Entries entries) {
    Ising spins = entries.qubo().toIsing();
    Qubo bits = entries.ising().toQubo();
    for (State state : Entries.states(entries.size())) {
      assertEnergy(entries, entries.bitValue(state), spins.value(state));
      assertEnergy(entries, entries.spinValue(state), bits.value(state));
    }
  }

  @Property
  void conversionsThereAndBackGiveAnEqualForm(@ForAll("entries") Entries entries) {
    if (entries.regime().exact) {
      assertEquals(entries.qubo(), entries.qubo().toIsing().toQubo());
      assertEquals(entries.ising(), entries.ising().toQubo().toIsing());
    }
  }

  /** If a form says that it is exact, no energy of it is rounded, whatever the coefficients. */
  @Property
  void exactMeansExact(@ForAll("entries") Entries entries) {
    Qubo qubo = entries.qubo();
    Ising ising = entries.ising();
    for (State state : Entries.states(entries.size())) {
      if (qubo.exact()) {
        assertEquals(
            0, coefficients(qubo).bitValue(state).compareTo(new BigDecimal(qubo.value(state))));
      }
      if (ising.exact()) {
        assertEquals(
            0, coefficients(ising).spinValue(state).compareTo(new BigDecimal(ising.value(state))));
      }
    }
    assertTrue(qubo.exact() || !entries.regime().exact);
    assertTrue(ising.exact() || !entries.regime().exact);
  }

  private static Entries coefficients(Qubo form) {
    List<Entries.Entry> list = new ArrayList<>();
    list.add(new Entries.Entry(-1, -1, form.constant()));
    for (int i = 0; i < form.size(); i++) {
      list.add(new Entries.Entry(i, i, form.linear(i)));
    }
    form.forEachPair((i, j, value) -> list.add(new Entries.Entry(i, j, value)));
    return new Entries(Entries.Regime.REALS, form.size(), list);
  }

  private static Entries coefficients(Ising form) {
    List<Entries.Entry> list = new ArrayList<>();
    list.add(new Entries.Entry(-1, -1, form.constant()));
    for (int i = 0; i < form.size(); i++) {
      list.add(new Entries.Entry(i, i, form.linear(i)));
    }
    form.forEachPair((i, j, value) -> list.add(new Entries.Entry(i, j, value)));
    return new Entries(Entries.Regime.REALS, form.size(), list);
  }

  @Property
  void placesHoldTheSumsOfTheirEntries(@ForAll("entries") Entries entries) {
    Qubo form = entries.qubo();
    Map<List<Integer>, Double> sums = entries.sums();
    assertEquals(sums.getOrDefault(List.of(-1, -1), 0.0), form.constant());
    for (int i = 0; i < form.size(); i++) {
      assertEquals(sums.getOrDefault(List.of(i, i), 0.0), form.linear(i));
      for (int j = i + 1; j < form.size(); j++) {
        assertEquals(sums.getOrDefault(List.of(i, j), 0.0), form.pair(i, j));
        assertEquals(form.pair(i, j), form.pair(j, i));
      }
    }
    sums.keySet().removeIf(place -> place.get(0).equals(place.get(1)));
    List<List<Integer>> visited = new ArrayList<>();
    form.forEachPair((i, j, value) -> visited.add(List.of(i, j)));
    assertEquals(new ArrayList<>(sums.keySet()), visited);
    assertEquals(visited.size(), form.pairs());
  }

  @Property
  void theOrderOfArrivalDoesNotMatterWhereSumsAreExact(
      @ForAll("entries") Entries entries, @ForAll long seed) {
    Entries other = entries.regime().exact ? entries.shuffled(seed) : entries;
    assertEquals(entries.qubo(), other.qubo());
    assertEquals(entries.qubo().hashCode(), other.qubo().hashCode());
    assertEquals(entries.ising(), other.ising());
    assertEquals(entries.ising().hashCode(), other.ising().hashCode());
  }

  @Property
  void multiplesOfPowersOfTwoAreExact(@ForAll("entries") Entries entries) {
    Qubo qubo = entries.qubo();
    Ising ising = entries.ising();
    assertEquals(qubo, qubo.times(-4).times(-0.25));
    assertEquals(ising, ising.times(-4).times(-0.25));
    Qubo none = qubo.times(0);
    assertEquals(Qubo.builder(qubo.size()).build(), none);
    for (State state : Entries.states(entries.size())) {
      assertEquals(0.0, 2 * qubo.value(state) + qubo.times(-2).value(state));
      assertEquals(0.0, 2 * ising.value(state) + ising.times(-2).value(state));
    }
  }

  @Property
  void aBuilderTakesWholeForms(@ForAll("entries") Entries entries) {
    Qubo form = entries.qubo();
    Qubo.Builder again = Qubo.builder(form.size()).allowRounding().add(form, 1);
    assertEquals(form, again.build());
    assertEquals(form.times(2), again.add(form, 1).build());
    assertEquals(Qubo.builder(form.size()).build(), again.add(form, -2).build());
    Ising ising = entries.ising();
    assertEquals(
        ising.times(0.5),
        Ising.builder(ising.size()).allowRounding().add(ising, 1).add(ising, -0.5).build());
  }

  @Property
  void polynomialsThereAndBackGiveAnEqualForm(@ForAll("entries") Entries entries) {
    assertEquals(entries.qubo().toPolynomial(), entries.polynomial());
    if (entries.regime() != Entries.Regime.WIDE_RANGE) {
      assertEquals(entries.qubo(), entries.qubo().toPolynomial().toQubo());
    }
  }
}
