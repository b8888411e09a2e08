package dev.couplet.audit;

import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.StopSignal;
import dev.couplet.sampling.Watch;
import java.util.List;

/** Starts are honoured, and refused if they do not fit. */
final class StartChecks {
  private StartChecks() {}

  static void examine(Trials trials) {
    for (Specimen specimen : trials.specimens()) {
      int size = specimen.size();
      State fits = State.zeros(size);
      expectRefusal(trials, specimen, List.of(State.zeros(size + 1)));
      expectRefusal(trials, specimen, List.of(fits, State.zeros(size + 1)));
      trials.draws(specimen, Trials.SHORT).ifPresent(draws -> from(trials, specimen, draws));
    }
  }

  private static void expectRefusal(Trials trials, Specimen specimen, List<State> starts) {
    Outcome outcome = trials.call(specimen, () -> Run.of(Trials.SHORT).starts(starts));
    String has = String.valueOf(specimen.size());
    String given = String.valueOf(specimen.size() + 1);
    boolean refused =
        outcome
            .thrown()
            .filter(IllegalArgumentException.class::isInstance)
            .map(Throwable::getMessage)
            .filter(message -> message.contains(has) && message.contains(given))
            .isPresent();
    trials
        .notes()
        .expect(
            "starts",
            refused,
            () ->
                specimen
                    + ": a start of "
                    + given
                    + " variables has to be refused with an"
                    + " IllegalArgumentException that names both sizes, got "
                    + outcome
                    + "; call run.requireStartsOf(form.size()) first");
  }

  private static void from(Trials trials, Specimen specimen, Draws known) {
    State best = known.best().state();
    List<State> starts = List.of(best, best.flipped(), State.zeros(specimen.size()));
    Run run = Run.of(Trials.SHORT).starts(starts);
    trials
        .draws(specimen, run)
        .ifPresent(
            draws -> {
              SeedChecks.expectSame(trials, "starts", "and starts again", specimen, draws, run);
              Run threaded = run.effort(Trials.SHORT.threads(3));
              SeedChecks.expectSame(
                  trials, "starts", "and starts on 3 threads", specimen, draws, threaded);
            });
    StopSignal stop = StopSignal.create();
    stop.stop();
    trials
        .draws(specimen, run.watch(Watch.stop(stop)))
        .ifPresent(
            draws ->
                trials
                    .notes()
                    .expect(
                        "starts",
                        draws.best().energy() <= known.best().energy(),
                        () ->
                            specimen
                                + ": stopped before it began, the run lost its first start of energy "
                                + known.best().energy()
                                + ": "
                                + draws));
  }
}
