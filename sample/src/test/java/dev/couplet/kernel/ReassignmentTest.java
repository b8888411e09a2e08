package dev.couplet.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.anneal.Annealing;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Structure;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class ReassignmentTest {
  private static final int SETS = 3;
  private static final int OPTIONS = 3;

  /** Three choices of three, small costs under heavy codes, and costs between neighbours. */
  private static Qubo choices(double heavy) {
    SplittableRandom random = new SplittableRandom(5);
    Qubo.Builder form = Qubo.builder(SETS * OPTIONS);
    for (int s = 0; s < SETS; s++) {
      form.addConstant(heavy);
      for (int a = 0; a < OPTIONS; a++) {
        form.addLinear(OPTIONS * s + a, random.nextInt(4) - heavy);
        for (int b = a + 1; b < OPTIONS; b++) {
          form.addPair(OPTIONS * s + a, OPTIONS * s + b, 2 * heavy);
        }
        for (int b = 0; s > 0 && b < OPTIONS; b++) {
          form.addPair(OPTIONS * (s - 1) + a, OPTIONS * s + b, random.nextInt(4));
        }
      }
    }
    return form.build();
  }

  private static Structure structure() {
    List<List<Integer>> sets = new ArrayList<>();
    for (int s = 0; s < SETS; s++) {
      sets.add(List.of(OPTIONS * s, OPTIONS * s + 1, OPTIONS * s + 2));
    }
    return Structure.exactlyOne(sets);
  }

  @Test
  void visitsCodesWithTheirBoltzmannWeights() {
    Qubo form = choices(1e6);
    LocalFields fields = new LocalFields(Adjacency.of(form));
    fields.set(State.parse("100100100"));
    Reassignment moves = new Reassignment(fields, structure());
    SplittableRandom random = new SplittableRandom(11);
    double inverse = 0.4;
    int codes = 27;
    long[] seen = new long[codes];
    int samples = 60_000;
    for (int k = 0; k < samples; k++) {
      // Four sweeps apart, so that one visit hardly depends on the one before.
      for (int t = 0; t < 4; t++) {
        moves.sweep(inverse, random, Pace.free());
      }
      seen[code(fields.state())]++;
    }
    double[] weight = new double[codes];
    double total = 0;
    for (int c = 0; c < codes; c++) {
      weight[c] = StrictMath.exp(-inverse * form.value(state(c)));
      total += weight[c];
    }
    double chiSquare = 0;
    for (int c = 0; c < codes; c++) {
      double expected = samples * weight[c] / total;
      chiSquare += (seen[c] - expected) * (seen[c] - expected) / expected;
    }
    // 26 degrees of freedom: independent samples exceed 54.05 once in a thousand (tables of the
    // chi-square distribution, from memory); what dependence is left is allowed a factor of 2.
    assertTrue(chiSquare < 2 * 54.05, "chi-square " + chiSquare);
  }

  @Test
  void neverLeavesTheCodeAndKeepsTheFields() {
    Qubo form = choices(50);
    LocalFields fields = new LocalFields(Adjacency.of(form));
    fields.set(State.parse("010001100"));
    Reassignment moves = new Reassignment(fields, structure());
    SplittableRandom random = new SplittableRandom(3);
    for (int t = 0; t < 1000; t++) {
      moves.sweep(0.1, random, Pace.free());
      assertEquals(SETS, fields.state().ones());
      code(fields.state());
    }
    State state = fields.state();
    for (int i = 0; i < form.size(); i++) {
      assertEquals(form.value(state.with(i, !state.get(i))) - form.value(state), fields.gain(i));
    }
  }

  @Test
  void theDescentEndsWhereNoReassignmentGains() {
    Qubo form = choices(50);
    LocalFields fields = new LocalFields(Adjacency.of(form));
    for (int start = 0; start < 27; start++) {
      fields.set(state(start));
      Reassignment moves = new Reassignment(fields, structure());
      while (moves.descend(Pace.free())) {
        assertEquals(SETS, fields.state().ones());
      }
      double reached = form.value(fields.state());
      int code = code(fields.state());
      for (int s = 0, unit = 1; s < SETS; s++, unit *= OPTIONS) {
        for (int a = 0; a < OPTIONS; a++) {
          int other = code + (a - code / unit % OPTIONS) * unit;
          assertTrue(form.value(state(other)) >= reached);
        }
      }
    }
  }

  @Test
  void brokenSetsAreLeftAlone() {
    LocalFields fields = new LocalFields(Adjacency.of(choices(50)));
    State broken = State.parse("110000111");
    fields.set(broken);
    Reassignment moves = new Reassignment(fields, structure());
    for (int t = 0; t < 100; t++) {
      moves.sweep(0, new SplittableRandom(t), Pace.free());
    }
    assertEquals(broken, fields.state());
  }

  @Test
  void aStructureOfAnotherFormIsRefused() {
    Run run = Run.of(Effort.draws(1)).structure(Structure.exactlyOne(List.of(List.of(2, 9))));
    IllegalArgumentException refused =
        assertThrows(
            IllegalArgumentException.class, () -> Annealing.standard().sample(choices(5), run));
    assertTrue(refused.getMessage().contains("bit 9"), refused.getMessage());
  }

  private static State state(int code) {
    boolean[] bits = new boolean[SETS * OPTIONS];
    for (int s = 0, rest = code; s < SETS; s++, rest /= OPTIONS) {
      bits[OPTIONS * s + rest % OPTIONS] = true;
    }
    return State.of(bits);
  }

  private static int code(State state) {
    int code = 0;
    for (int s = SETS - 1; s >= 0; s--) {
      int option = -1;
      for (int a = 0; a < OPTIONS; a++) {
        if (state.get(OPTIONS * s + a)) {
          assertEquals(-1, option, "two options of set " + s);
          option = a;
        }
      }
      assertTrue(option >= 0, "no option of set " + s);
      code = OPTIONS * code + option;
    }
    return code;
  }
}
