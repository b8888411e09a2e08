package dev.couplet.anneal;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.kernel.Adjacency;
import dev.couplet.kernel.Forms;
import dev.couplet.kernel.Pace;
import dev.couplet.kernel.ReplicaRows;
import dev.couplet.kernel.SamplerContract;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Structure;
import dev.couplet.sampling.Vigil;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Annealing with draws enough to be made 64 at once. */
class ManyDrawsTest extends SamplerContract {
  @Override
  protected Sampler sampler() {
    return Annealing.standard();
  }

  @Override
  protected Effort effort() {
    return Effort.draws(150).sweeps(50);
  }

  @Override
  protected int fewer() {
    return 70;
  }

  /** Written down once, to notice if a platform or a change gives other draws. */
  @Test
  void goldenDraws() {
    Qubo form = Forms.integers(60, 0.1, 7, 1);
    Annealing method = Annealing.standard().finish(Finish.NONE);
    Draws draws = method.sample(form, Effort.draws(32).sweeps(2));
    assertEquals(
        "101001001000101110101110000001101100111100010111111111111100",
        draws.rows().get(0).state().toString());
    assertEquals(
        "100001011001101010101101000011111100000000010010111111001100",
        draws.rows().get(20).state().toString());
  }

  @Test
  void everyDrawEndsInALocalMinimum() {
    Qubo form = Forms.integers(90, 0.05, 5, 1);
    Draws draws = Annealing.standard().hot(50).cold(20).sample(form, Effort.draws(100).sweeps(3));
    for (Draw draw : draws) {
      assertTrue(Forms.localMinimum(form, draw.state(), 0));
    }
  }

  @Test
  void drawsBeginFromTheStartsInTurn() {
    // Cold spins in fields that hold them: every state is left as it began.
    Qubo form = Forms.ferromagnet(8);
    State up = State.zeros(64);
    Run run = Run.of(Effort.draws(33).sweeps(2)).starts(List.of(up, up.flipped()));
    Draws draws = Annealing.standard().hot(0.01).cold(0.01).sample(form, run);
    assertEquals(List.of(new Draw(up, -128, 17), new Draw(up.flipped(), -128, 16)), draws.rows());
  }

  /** The same form, the same temperatures: one kernel is as good as the other. */
  @Test
  void energiesAreThoseOfSingleDraws() {
    Qubo form = Forms.spinGlass(6, 9);
    Annealing method = Annealing.standard().cooling(Cooling.inverseLinear()).hot(10).cold(1 / 3.0);
    Run many = Run.of(Effort.draws(640).sweeps(60));
    // What is known of the form, even if it is of no use, keeps draws single.
    Run single = many.effort(Effort.draws(640).sweeps(60).seed(2)).structure(oneBitKnown());
    double[] packed = meanAndError(method.sample(form, many));
    double[] separate = meanAndError(method.sample(form, single));
    double error = Math.hypot(packed[1], separate[1]);
    assertEquals(separate[0], packed[0], 3.5 * error);
  }

  /** Of a batch that is cut short, no more states come back than can be valued soon. */
  @Test
  void anEndedBatchGivesAsManyStatesAsThereIsTimeToValue() {
    for (int size : new int[] {1 << 10, 1 << 18, 1 << 19}) {
      Qubo form = Forms.ring(size);
      Adjacency rows = Adjacency.of(form);
      Temperatures ends = new Temperatures(2, 1);
      Schedule schedule = new Schedule(Cooling.linear(), ends, new Sweeps(100, 1));
      ReplicaAnnealer annealer =
          new ReplicaAnnealer(
              ReplicaRows.of(rows).orElseThrow(),
              Run.of(Effort.draws(64)),
              schedule,
              Finish.DESCENT);
      int[] looks = {0};
      List<State> states = annealer.draw(0, 64, new Pace(() -> ++looks[0] >= 3));
      assertEquals(Math.max(1, Math.min(64, Vigil.STEPS / (3 * size + 1))), states.size());
      assertTrue(states.stream().allMatch(state -> state.size() == size));
    }
  }

  private static Structure oneBitKnown() {
    return Structure.exactlyOne(List.of(List.of(0)));
  }

  private static double[] meanAndError(Draws draws) {
    double sum = 0;
    double squares = 0;
    for (Draw draw : draws) {
      sum += draw.multiplicity() * draw.energy();
      squares += draw.multiplicity() * draw.energy() * draw.energy();
    }
    double mean = sum / draws.total();
    double variance = squares / draws.total() - mean * mean;
    return new double[] {mean, Math.sqrt(variance / draws.total())};
  }
}
