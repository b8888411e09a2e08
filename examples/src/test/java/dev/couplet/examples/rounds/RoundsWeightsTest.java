package dev.couplet.examples.rounds;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.anneal.Annealing;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowered.Weight;
import dev.couplet.lower.Lowering;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import java.util.List;
import org.junit.jupiter.api.Test;

class RoundsWeightsTest {
  private static final RoundsModel ROUNDS = RoundsModel.of(RoundsReader.read(Folder.invented()));

  @Test
  void noRuleWeighsLessThanTheRangeBoundAsks() {
    List<Weight> own = RoundsWeights.lowering(ROUNDS).lower(ROUNDS.model()).weights();
    List<Weight> enough = Lowering.standard().lower(ROUNDS.model()).weights();
    for (int k = 0; k < own.size(); k++) {
      assertEquals(enough.get(k).rule(), own.get(k).rule());
      assertTrue(own.get(k).value() >= enough.get(k).value(), own.get(k).rule());
    }
  }

  /** Measured with seeds 1 to 5: 70 to 81 of 100 with these weights, 3 to 7 with equal ones. */
  @Test
  void mostDrawsKeepEveryRequiredRule() {
    for (int seed = 1; seed <= 5; seed++) {
      long own = feasible(RoundsWeights.lowering(ROUNDS), seed);
      long alike = feasible(Lowering.standard(), seed);
      assertTrue(own >= 40, "seed " + seed + ": " + own);
      assertTrue(alike < 40, "seed " + seed + ": " + alike);
    }
  }

  private static long feasible(Lowering lowering, int seed) {
    Lowered lowered = lowering.lower(ROUNDS.model());
    Run run = Run.of(Effort.draws(100).seed(seed)).structure(lowered.structure());
    return DrawsPage.feasible(lowered, Annealing.standard().sample(lowered.qubo(), run));
  }
}
