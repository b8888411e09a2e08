package dev.couplet.exact;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Ising;
import dev.couplet.form.Polynomial;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.time.Duration;
import java.util.List;
import java.util.OptionalDouble;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;

class EnumerationTest {
  private static final Enumeration ENUMERATION = Enumeration.standard();
  private static final Effort ANY = Effort.draws(1);

  /** Common practice: the frustrated triangle has minimum -1 and six ground states. */
  @Test
  void frustratedTriangle() {
    Levels levels = ENUMERATION.levels(TestForms.frustratedTriangle(), 5);
    assertEquals(List.of(new Levels.Level(-1, 6), new Levels.Level(3, 2)), levels.levels());
    assertEquals(OptionalDouble.of(4), levels.gap());
    assertEquals(6, ENUMERATION.sample(TestForms.frustratedTriangle(), ANY).rows().size());
  }

  /**
   * Glover, Kochenberger and Du, A tutorial on formulating and using QUBO models (2019), section 2:
   * minimum -11 at (1, 0, 0, 1); section 3.1, number partitioning: -6889, four optima (the number
   * by enumeration).
   */
  @Test
  void publishedForms() {
    Qubo.Builder small =
        Qubo.builder(4).addLinear(0, -5).addLinear(1, -3).addLinear(2, -8).addLinear(3, -6);
    small.addPair(0, 1, 4).addPair(0, 2, 8).addPair(1, 2, 2).addPair(2, 3, 10);
    Draws draws = ENUMERATION.sample(small.build(), ANY);
    assertEquals(-11, draws.best().energy());
    assertEquals(List.of(State.parse("1001")), draws.rows().stream().map(d -> d.state()).toList());

    int[] numbers = {25, 7, 13, 31, 42, 17, 21, 10};
    Qubo.Builder partition = Qubo.builder(8);
    for (int i = 0; i < 8; i++) {
      partition.addLinear(i, numbers[i] * (numbers[i] - 166.0));
      for (int j = i + 1; j < 8; j++) {
        partition.addPair(i, j, 2.0 * numbers[i] * numbers[j]);
      }
    }
    Levels levels = ENUMERATION.levels(partition.build(), 1);
    assertEquals(-6889, levels.minimum());
    assertEquals(4, levels.minima());
    assertTrue(levels.lowest().contains(State.parse("00011001")));
  }

  /**
   * Low-autocorrelation sequences, optimal energies for N = 3..7 (Packebusch and Mertens 2016). The
   * energy has degree 4: an auxiliary bit z = x y for each pair of spins, with the penalty xy -
   * 2z(x + y) + 3z (Rosenberg 1975), brings it to degree 2.
   */
  @Test
  void lowAutocorrelation() {
    int[] optimal = {1, 2, 2, 7, 3};
    for (int n = 3; n <= 7; n++) {
      assertEquals(optimal[n - 3], ENUMERATION.levels(autocorrelation(n), 1).minimum(), "N = " + n);
    }
  }

  private static Qubo autocorrelation(int n) {
    int size = n + n * (n - 1) / 2;
    int[][] product = new int[n][n];
    int next = n;
    double penalty = 1 << 12;
    Polynomial spins = Polynomial.builder(n).build();
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        product[i][j] = next++;
      }
    }
    for (int k = 1; k < n; k++) {
      Polynomial.Builder sum = Polynomial.builder(n);
      for (int i = 0; i + k < n; i++) {
        // The product of two spins 1 - 2x and 1 - 2y.
        sum.add(1).add(-2, i).add(-2, i + k).add(4, i, i + k);
      }
      Polynomial correlation = sum.build();
      spins = spins.plus(correlation.times(correlation));
    }
    Qubo.Builder form = Qubo.builder(size);
    spins.forEachTerm((value, variables) -> addLowered(form, value, variables, product));
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        int z = product[i][j];
        form.addPair(i, j, penalty).addPair(i, z, -2 * penalty).addPair(j, z, -2 * penalty);
        form.addLinear(z, 3 * penalty);
      }
    }
    return form.build();
  }

  private static void addLowered(Qubo.Builder form, double value, int[] x, int[][] product) {
    switch (x.length) {
      case 0 -> form.addConstant(value);
      case 1 -> form.addLinear(x[0], value);
      case 2 -> form.addPair(x[0], x[1], value);
      case 3 -> form.addPair(product[x[0]][x[1]], x[2], value);
      default -> form.addPair(product[x[0]][x[1]], product[x[2]][x[3]], value);
    }
  }

  @Test
  void noBitsAndOneBit() {
    Draws none = ENUMERATION.sample(Qubo.builder(0).addConstant(3).build(), ANY);
    assertEquals(3, none.best().energy());
    assertTrue(none.proved());
    assertEquals(1, ENUMERATION.levels(Qubo.builder(0).build(), 3).levels().size());

    Qubo one = Qubo.builder(1).addConstant(1).addLinear(0, -0.5).build();
    Levels levels = ENUMERATION.levels(one, 2);
    assertEquals(List.of(new Levels.Level(0.5, 1), new Levels.Level(1, 1)), levels.levels());
    assertEquals(List.of(State.parse("1")), levels.lowest());
  }

  @Test
  void allStatesTie() {
    Levels levels = Enumeration.standard().keep(3).levels(Qubo.builder(20).build(), 2);
    assertEquals(List.of(new Levels.Level(0, 1 << 20)), levels.levels());
    assertEquals(3, levels.lowest().size());
    assertTrue(levels.gap().isEmpty());
  }

  /** Energies that cancel to zero are one level, whatever the sign of the zero. */
  @Test
  void negativeZeroIsZero() {
    Qubo form =
        Qubo.builder(2)
            .addConstant(-0.0)
            .addLinear(0, -1)
            .addLinear(1, -0.0)
            .addPair(0, 1, 1)
            .build();
    assertEquals(
        List.of(new Levels.Level(-1, 1), new Levels.Level(0, 3)),
        ENUMERATION.levels(form, 4).levels());
  }

  /** One large coefficient must not hide small ones, though their sum is rounded. */
  @Test
  void hugeRange() {
    Qubo form =
        Qubo.builder(13)
            .allowRounding()
            .addLinear(0, 1e300)
            .addLinear(3, -1e-300)
            .addLinear(12, -1)
            .build();
    assertFalse(form.exact());
    Levels levels = ENUMERATION.levels(form, 1);
    assertEquals(-1, levels.minimum());
    // Of the variables that change nothing to the value in double arithmetic: all but 0 and 12.
    assertEquals(1 << 11, levels.minima());
  }

  @Test
  void refusesWhatItCannotDo() {
    Qubo large = Qubo.builder(35).build();
    String told =
        assertThrows(IllegalArgumentException.class, () -> ENUMERATION.sample(large, ANY))
            .getMessage();
    assertTrue(told.contains("35") && told.contains("34") && told.contains("reduce"), told);
    Qubo huge = Qubo.builder(2).allowRounding().addLinear(0, 8e307).addLinear(1, -8e307).build();
    assertEquals(-8e307, ENUMERATION.levels(huge, 1).minimum());
    assertThrows(IllegalArgumentException.class, () -> ENUMERATION.keep(0));
    assertThrows(IllegalArgumentException.class, () -> ENUMERATION.levels(large, 1));
    Qubo small = Qubo.builder(2).build();
    assertThrows(IllegalArgumentException.class, () -> ENUMERATION.levels(small, 0));
    Run run = Run.of(ANY).starts(List.of(State.zeros(3)));
    assertThrows(IllegalArgumentException.class, () -> ENUMERATION.sample(small, run));
  }

  @Test
  void aTargetEndsTheRun() {
    Qubo form = TestForms.random(Regime.DENSE, 16, 5);
    double minimum = TestForms.minimum(form);
    Draws draws = ENUMERATION.sample(form, ANY.target(minimum / 2));
    assertEquals(End.TARGET, draws.end());
    assertTrue(draws.best().energy() <= minimum / 2);
    assertTrue(draws.bound().isEmpty());
    Draws missed = ENUMERATION.sample(form, ANY.target(minimum - 1));
    assertEquals(End.DONE, missed.end());
    assertTrue(missed.proved());
  }

  @Test
  void aStopBeforeTheStartIsHonoured() {
    StopSignal signal = StopSignal.create();
    signal.stop();
    State start = State.parse("101");
    Run run = Run.of(ANY).watch(Watch.stop(signal)).starts(List.of(start));
    Draws draws = ENUMERATION.sample(TestForms.frustratedTriangle(), run);
    assertEquals(End.STOPPED, draws.end());
    assertEquals(start, draws.best().state());
    assertTrue(draws.bound().isEmpty());
    assertFalse(ENUMERATION.levels(TestForms.frustratedTriangle(), 1, run).complete());
  }

  /** The clock moves 1 ms a look: after the deadline there is not one look more a thread. */
  @Test
  void aDeadlineEndsTheRun() {
    AtomicLong looks = new AtomicLong();
    Watch watch = Watch.none().clock(() -> looks.getAndIncrement() * 1_000_000);
    Run run = Run.of(Effort.within(Duration.ofMillis(20))).watch(watch);
    Draws draws = ENUMERATION.sample(TestForms.random(Regime.DENSE, 30, 1), run);
    assertEquals(End.DEADLINE, draws.end());
    assertTrue(draws.bound().isEmpty());
    assertEquals(21, looks.get());
  }

  @Test
  void whatAListenerThrowsReachesTheCaller() {
    IllegalStateException thrown = new IllegalStateException("enough");
    Watch watch =
        Watch.none()
            .progress(
                p -> {
                  throw thrown;
                });
    Run run = Run.of(ANY.threads(2)).watch(watch);
    assertSame(
        thrown,
        assertThrows(
            IllegalStateException.class,
            () -> ENUMERATION.sample(TestForms.random(Regime.DENSE, 20, 1), run)));
  }

  /** A chain of ferromagnetic pairs has two ground states and n - 1 pairs to break (n large). */
  @Test
  void ferromagneticChain() {
    Ising.Builder chain = Ising.builder(24);
    for (int i = 0; i + 1 < 24; i++) {
      chain.addPair(i, i + 1, -1);
    }
    Levels levels = ENUMERATION.levels(chain.build().toQubo(), 3);
    // Breaking k of the 23 pairs costs 2 k: 2 binomial(23, k) states each.
    assertEquals(
        List.of(new Levels.Level(-23, 2), new Levels.Level(-21, 46), new Levels.Level(-19, 506)),
        levels.levels());
  }
}
