package dev.couplet.bound;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.TestForms;
import dev.couplet.exact.TestForms.Regime;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

class SplitBoundTest {
  /**
   * The linear relaxation of the frustrated triangle has its optimum -3 at the half-integral point;
   * but energies are a whole number of fours from the constant, and the next of these is -1. A
   * field on a fourth spin that may take any sign takes that step away.
   */
  @Test
  void frustratedTriangle() {
    assertEquals(-1, SplitBound.standard().below(TestForms.frustratedTriangle()));
    Ising.Builder withField = Ising.builder(4).addLinear(3, 0.5);
    withField.addPair(0, 1, 1).addPair(1, 2, 1).addPair(0, 2, 1);
    assertEquals(-3.5, SplitBound.standard().below(withField.build().toQubo()));
  }

  @Test
  void noBits() {
    assertEquals(2.5, SplitBound.standard().below(Qubo.builder(0).addConstant(2.5).build()));
    assertEquals(0, SplitBound.standard().below(Qubo.builder(0).build()));
  }

  @Test
  void formsNearTheLargestDoubleAreNoTrouble() {
    Qubo form = Qubo.builder(2).allowRounding().addLinear(0, 8e307).addLinear(1, -8e307).build();
    assertEquals(-8e307, SplitBound.standard().below(form), 1e295);
  }

  @Test
  void smallestNumbers() {
    Qubo form = Qubo.builder(2).addLinear(0, -Double.MIN_VALUE).addPair(0, 1, 1e-320).build();
    assertEquals(-Double.MIN_VALUE, SplitBound.standard().below(form));
  }

  @Test
  void stoppedBeforeTheStartItIsStillABound() {
    StopSignal signal = StopSignal.create();
    signal.stop();
    Qubo form = TestForms.random(Regime.DENSE, 10, 3);
    double stopped =
        SplitBound.standard().below(form, Run.of(Effort.draws(1)).watch(Watch.stop(signal)));
    assertEquals(SplitBound.standard().rounds(0).below(form), stopped);
  }

  @Test
  void reportsARisingBound() {
    List<Double> heard = new ArrayList<>();
    long[] now = {0};
    Watch watch =
        Watch.none()
            .clock(() -> now[0] += 100_000_000)
            .progress(p -> heard.add(p.bound().orElseThrow()));
    Qubo form = TestForms.random(Regime.SPARSE, 40, 3);
    double bound = SplitBound.standard().below(form, Run.of(Effort.draws(1)).watch(watch));
    assertTrue(heard.size() > 1);
    assertEquals(heard.stream().sorted().toList(), heard);
    assertEquals(bound, heard.get(heard.size() - 1));
  }

  @Test
  void refusesNegativeRounds() {
    assertThrows(IllegalArgumentException.class, () -> SplitBound.standard().rounds(-1));
  }
}
