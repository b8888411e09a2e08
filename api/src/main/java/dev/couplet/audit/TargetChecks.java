package dev.couplet.audit;

import dev.couplet.form.State;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;

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
    double best = full.best().energy();
    at(trials, specimen, best)
        .ifPresent(draws -> expectEarlierDraws(trials.notes(), specimen, best, full, draws));
    double worst = full.rows().get(full.rows().size() - 1).energy();
    at(trials, specimen, worst)
        .ifPresent(draws -> expectFirstOnly(trials.notes(), specimen, worst, draws));
  }

  private static Optional<Draws> at(Trials trials, Specimen specimen, double target) {
    Effort effort = Trials.SHORT.target(target);
    Optional<Draws> alone = trials.draws(specimen, effort);
    alone.ifPresent(
        draws -> {
          expectOneHit(trials.notes(), specimen, target, draws);
          for (int threads = 2; threads <= 3; threads++) {
            Run run = Run.of(effort.threads(threads));
            String how = "and target on " + threads + " threads";
            SeedChecks.expectSame(trials, "target", how, specimen, draws, run);
          }
        });
    return alone;
  }

  private static void expectOneHit(Notes notes, Specimen specimen, double target, Draws draws) {
    notes.expect(
        "target",
        draws.end() == End.TARGET && draws.best().energy() <= target,
        () -> specimen + ": target " + target + " can be reached, got " + draws);
    int hits =
        draws.rows().stream()
            .filter(row -> row.energy() <= target)
            .mapToInt(Draw::multiplicity)
            .sum();
    notes.expect(
        "target",
        hits <= 1,
        () ->
            specimen
                + ": "
                + hits
                + " draws reach target "
                + target
                + "; keep the lowest-numbered of them and drop all later draws");
  }

  private static void expectEarlierDraws(
      Notes notes, Specimen specimen, double target, Draws full, Draws draws) {
    Map<State, Integer> known = new HashMap<>();
    full.forEach(row -> known.put(row.state(), row.multiplicity()));
    for (Draw row : draws) {
      notes.expect(
          "target",
          row.energy() <= target || row.multiplicity() <= known.getOrDefault(row.state(), 0),
          () -> specimen + ": " + row + " before target " + target + " is not so without a target");
    }
  }

  private static void expectFirstOnly(Notes notes, Specimen specimen, double target, Draws draws) {
    notes.expect(
        "target",
        draws.total() == 1,
        () ->
            specimen
                + ": every draw reaches target "
                + target
                + ", so the run ends at the first; got "
                + draws);
  }
}
