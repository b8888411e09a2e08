package dev.couplet.reduce;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.TestForms;
import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class ReductionTest {
  private static final Run RUN = Run.of(Effort.draws(1));

  @Test
  void reportsWhichRuleRemovedWhat() {
    Qubo sign = Qubo.builder(2).addLinear(0, -5).addLinear(1, 1).addPair(0, 1, 2).build();
    assertEquals(Map.of(Removal.SIGN, 2), Reduction.standard().reduce(sign, RUN).report());

    Ising.Builder ring = Ising.builder(5);
    for (int i = 0; i < 5; i++) {
      ring.addPair(i, (i + 1) % 5, 1);
    }
    Reduced frustrated = Reduction.standard().localOnly().reduce(ring.build().toQubo(), RUN);
    assertEquals(0, frustrated.size());
    // An odd ring of pairs that want to differ keeps one of them alike: -5 + 2.
    assertEquals(-3, frustrated.constant());
  }

  @Test
  void splitsIntoConnectedParts() {
    Ising.Builder two = Ising.builder(10);
    for (int part = 0; part < 2; part++) {
      for (int i = 0; i < 5; i++) {
        for (int j = 0; j < i; j++) {
          two.addPair(2 * i + part, 2 * j + part, 1);
        }
      }
    }
    Qubo form = two.build().toQubo();
    Reduced reduced = Reduction.standard().keepEveryMinimum().reduce(form, RUN);
    assertEquals(2, reduced.parts().size());
    assertEquals(5, reduced.parts().get(0).size());
    assertEquals(reduced.parts().get(0), reduced.parts().get(1));
    List<State> states = List.of(State.parse("11000"), State.parse("00111"));
    assertEquals(State.parse("1010010101"), reduced.restore(states));
    assertEquals(
        -4,
        reduced.constant()
            + reduced.parts().get(0).value(states.get(0))
            + reduced.parts().get(1).value(states.get(1)));
  }

  /** Sparse random forms: every bit that is left has three pairs or more. */
  @Test
  void largeSparseForms() {
    int size = 30_000;
    SplittableRandom random = new SplittableRandom(8);
    Ising.Builder spins = Ising.builder(size);
    for (int p = 0; p < 3 * size / 2; p++) {
      int i = random.nextInt(size);
      int j = (i + 1 + random.nextInt(size - 1)) % size;
      spins.addPair(i, j, random.nextInt(-10, 11));
    }
    Qubo form = spins.build().toQubo();
    Reduced reduced = Reduction.standard().localOnly().reduce(form, RUN);
    assertTrue(reduced.size() < size / 2, reduced::toString);
    int[] degree = new int[reduced.parts().get(0).size()];
    reduced
        .parts()
        .get(0)
        .forEachPair(
            (i, j, value) -> {
              degree[i]++;
              degree[j]++;
            });
    for (int pairs : degree) {
      assertTrue(pairs >= 3);
    }
  }

  @Test
  void stoppedBeforeTheStartNothingIsRemoved() {
    StopSignal signal = StopSignal.create();
    signal.stop();
    Qubo form = TestForms.random(Regime.SPARSE, 12, 3);
    Reduced reduced = Reduction.standard().reduce(form, RUN.watch(Watch.stop(signal)));
    assertEquals(12, reduced.size());
    assertEquals(Map.of(), reduced.report());
  }

  @Test
  void noBits() {
    Reduced reduced = Reduction.standard().reduce(Qubo.builder(0).addConstant(4).build(), RUN);
    assertEquals(4, reduced.constant());
    assertEquals(State.zeros(0), reduced.restore(List.of()));
  }

  @Test
  void refusesWhatItCannotDo() {
    Reduced reduced = Reduction.standard().reduce(Qubo.builder(2).build(), RUN);
    assertThrows(IllegalArgumentException.class, () -> reduced.restore(List.of(State.zeros(1))));
    assertThrows(IllegalArgumentException.class, () -> reduced.project(State.zeros(3)));
    Reduced kept = Reduction.standard().keepEveryMinimum().reduce(Qubo.builder(1).build(), RUN);
    assertThrows(IllegalArgumentException.class, () -> kept.restore(List.of(State.zeros(2))));
  }
}
