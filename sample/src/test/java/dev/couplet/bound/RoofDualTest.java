package dev.couplet.bound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.TestForms;
import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class RoofDualTest {
  private static final Run RUN = Run.of(Effort.draws(1));

  @Test
  void fixesABitThatIsAlwaysWorthIt() {
    Qubo form = Qubo.builder(3).addLinear(0, -5).addPair(0, 1, 2).addPair(1, 2, -1).build();
    Roof roof = RoofDual.standard().roof(form, RUN);
    // x0 = 1 gains 5 and costs at most 2; then x1 costs 2 and gains at most 1; x2 is free.
    assertEquals(-5, roof.bound());
    assertEquals(State.parse("110"), roof.strong());
    assertEquals(State.parse("10"), State.of(roof.values().get(0), roof.values().get(1)));
    assertEquals(State.parse("111"), roof.weak());
  }

  @Test
  void stoppedBeforeTheStartItIsStillABound() {
    StopSignal signal = StopSignal.create();
    signal.stop();
    Qubo form = TestForms.random(Regime.DENSE, 10, 3);
    Roof roof = RoofDual.standard().roof(form, RUN.watch(Watch.stop(signal)));
    assertTrue(roof.bound() <= TestForms.minimum(form));
    assertEquals(0, roof.weak().ones());
  }

  @Test
  void formsNearTheLargestDoubleAreNoTrouble() {
    Qubo form = Qubo.builder(2).allowRounding().addLinear(0, 8e307).addLinear(1, -8e307).build();
    assertEquals(-8e307, RoofDual.standard().below(form), 1e295);
  }

  @Test
  void largeSparseFormsAreNoTrouble() {
    int size = 20_000;
    SplittableRandom random = new SplittableRandom(4);
    Qubo.Builder form = Qubo.builder(size);
    for (int i = 0; i < size; i++) {
      form.addLinear(i, random.nextInt(-10, 11));
    }
    for (int p = 0; p < 3 * size / 2; p++) {
      int i = random.nextInt(size);
      int j = (i + 1 + random.nextInt(size - 1)) % size;
      form.addPair(i, j, random.nextInt(-10, 11));
    }
    Qubo built = form.build();
    Roof roof = RoofDual.standard().roof(built, RUN);
    assertTrue(roof.strong().ones() > size / 2);
    assertTrue(roof.bound() <= built.value(roof.values()));
    assertTrue(roof.bound() >= SplitBound.standard().below(built));
  }
}
