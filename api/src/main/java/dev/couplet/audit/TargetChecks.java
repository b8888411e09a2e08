package dev.couplet.audit;

import dev.couplet.form.State;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import java.util.HashSet;
import java.util.List;
import java.util.Set;

/** A target ends the run at the lowest-numbered draw that reaches it; later draws are dropped. */
final class TargetChecks {
  private TargetChecks() {}

  static void examine(Trials trials) {
    for (Specimen specimen : trials.specimens()) {
      trials.draws(specimen, Trials.SHORT).ifPresent(full -> against(trials, specimen, full));
    }
  }

  private static void against(Trials trials, Specimen specimen, Draws full) {
    Run never = Run.of(Trials.SHORT.target(Double.NEGATIVE_INFINITY));
    SeedChecks.expectSame(trials, "target", "and a target out of reach", specimen, full, never);
    List<Draw> rows = full.rows();
    at(trials, specimen, rows.get(0).energy(), full);
    at(trials, specimen, rows.get(rows.size() / 2).energy(), full);
    at(trials, specimen, rows.get(rows.size() - 1).energy(), full);
  }

  private static void at(Trials trials, Specimen specimen, double target, Draws full) {
    Effort effort = Trials.SHORT.target(target);
    trials
        .draws(specimen, effort)
        .ifPresent(
            draws -> {
              expectFirstHit(trials.notes(), specimen, target, full, draws);
              for (int threads = 2; threads <= 3; threads++) {
                Run run = Run.of(effort.threads(threads));
                String how = "and target on " + threads + " threads";
                SeedChecks.expectSame(trials, "target", how, specimen, draws, run);
              }
            });
  }

  private static void expectFirstHit(
      Notes notes, Specimen specimen, double target, Draws full, Draws draws) {
    notes.expect(
        "target",
        draws.end() == End.TARGET && draws.best().energy() <= target,
        () -> specimen + ": target " + target + " can be reached, got " + draws);
    int first = firstAt(full, target);
    notes.expect(
        "target",
        draws.total() == first + 1,
        () ->
            specimen
                + ": draw "
                + first
                + " is the first that reaches target "
                + target
                + ", so the run ends there and drops all later draws; got "
                + draws);
    List<State> known = full.inOrder();
    List<State> got = draws.inOrder();
    for (int k = 0; k < Math.min(first, got.size()); k++) {
      int draw = k;
      notes.expect(
          "target",
          got.get(k).equals(known.get(k)),
          () ->
              specimen + ": draw " + draw + " before target " + target + " is not so without one");
    }
  }

  /** The number of the first draw at the target or below, by the energies that the result names. */
  private static int firstAt(Draws draws, double target) {
    Set<State> hits = new HashSet<>();
    for (Draw row : draws) {
      if (row.energy() <= target) {
        hits.add(row.state());
      }
    }
    int draw = 0;
    while (!hits.contains(draws.inOrder().get(draw))) {
      draw++;
    }
    return draw;
  }
}
