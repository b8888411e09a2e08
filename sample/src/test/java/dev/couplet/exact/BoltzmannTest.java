package dev.couplet.exact;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import org.junit.jupiter.api.Test;

class BoltzmannTest {
  private static final Enumeration ENUMERATION = Enumeration.standard();

  /** The ring of n spins: Z = (2 cosh b)^n + (2 sinh b)^n (Ising 1925). */
  @Test
  void partitionFunctionOfARing() {
    int n = 14;
    Ising.Builder ring = Ising.builder(n);
    for (int i = 0; i < n; i++) {
      ring.addPair(i, (i + 1) % n, -1);
    }
    for (double b : new double[] {0, 0.3, 1, 4}) {
      double expected = Math.log(Math.pow(2 * Math.cosh(b), n) + Math.pow(2 * Math.sinh(b), n));
      Boltzmann boltzmann = ENUMERATION.boltzmann(ring.build().toQubo(), b);
      assertEquals(expected, boltzmann.logPartition(), 1e-11 * Math.abs(expected));
      assertEquals(0.5, boltzmann.mean(3), 1e-12);
    }
  }

  /** Against sums over all states, term by term. */
  @Test
  void agreesWithTheSlowTwin() {
    double b = 0.7;
    for (int size = 1; size <= 13; size += 3) {
      Qubo form = TestForms.random(Regime.REAL, size, size);
      Boltzmann boltzmann = ENUMERATION.boltzmann(form, b);
      double z = 0;
      double energy = 0;
      double square = 0;
      double entropy = 0;
      double[] mean = new double[size];
      for (long x = 0; x < 1L << size; x++) {
        State state = TestForms.state(size, x);
        double weight = Math.exp(-b * form.value(state));
        z += weight;
        energy += weight * form.value(state);
        square += weight * form.value(state) * form.value(state);
        double p = boltzmann.probability(state);
        entropy -= p * Math.log(p);
        for (int i = 0; i < size; i++) {
          mean[i] += weight * state.bit(i);
        }
      }
      assertEquals(Math.log(z), boltzmann.logPartition(), 1e-11);
      assertEquals(energy / z, boltzmann.meanEnergy(), 1e-10);
      assertEquals(square / z - energy / z * (energy / z), boltzmann.energyVariance(), 1e-9);
      assertEquals(entropy, boltzmann.entropy(), 1e-10);
      for (int i = 0; i < size; i++) {
        assertEquals(mean[i] / z, boltzmann.mean(i), 1e-11);
      }
      State some = TestForms.state(size, 1);
      assertEquals(Math.exp(-b * form.value(some)) / z, boltzmann.probability(some), 1e-12);
    }
  }

  @Test
  void coldAndFarFromZeroDoesNotOverflow() {
    Qubo form = Qubo.builder(2).addConstant(-1e6).addLinear(0, 1).addLinear(1, 1).build();
    Boltzmann boltzmann = ENUMERATION.boltzmann(form, 1e3);
    assertEquals(1e9, boltzmann.logPartition());
    assertEquals(0, boltzmann.entropy());
    assertEquals(1, boltzmann.probability(State.zeros(2)));
  }

  @Test
  void refusesWhatItCannotDo() {
    Qubo form = Qubo.builder(2).build();
    assertThrows(IllegalArgumentException.class, () -> ENUMERATION.boltzmann(form, -1));
    assertThrows(IllegalArgumentException.class, () -> ENUMERATION.boltzmann(form, Double.NaN));
    Qubo large = Qubo.builder(27).build();
    assertThrows(IllegalArgumentException.class, () -> ENUMERATION.boltzmann(large, 1));
    assertThrows(IllegalArgumentException.class, () -> ENUMERATION.boltzmann(form, 1).mean(2));
  }
}
