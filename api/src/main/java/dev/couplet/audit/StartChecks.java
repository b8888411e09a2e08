package dev.couplet.audit;

import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Structure;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.StopSignal;
import java.util.List;

/** Starts are honoured; starts and structures that do not fit are refused. */
final class StartChecks {
  private StartChecks() {}

  static void examine(Trials trials) {
    for (Specimen specimen : trials.specimens()) {
      int size = specimen.size();
      State fits = State.zeros(size);
      State longer = State.zeros(size + 1);
      expectRefusal(trials, specimen, run(List.of(longer)), "a start of " + (size + 1));
      expectRefusal(trials, specimen, run(List.of(fits, longer)), "a start of " + (size + 1));
      Run structured = run(List.of()).structure(Structure.exactlyOne(List.of(List.of(size))));
      expectRefusal(trials, specimen, structured, "a structure with bit " + size + " of");
      trials.draws(specimen, Trials.SHORT).ifPresent(draws -> from(trials, specimen, draws));
    }
  }

  private static Run run(List<State> starts) {
    return Run.of(Trials.SHORT).starts(starts);
  }

  private static void expectRefusal(Trials trials, Specimen specimen, Run run, String misfit) {
    Outcome outcome = trials.call(specimen, () -> run);
    boolean refused =
        outcome
            .thrown()
            .filter(IllegalArgumentException.class::isInstance)
            .filter(refusal -> Trials.names(refusal, specimen.size()))
            .isPresent();
    trials
        .notes()
        .expect(
            run.starts().isEmpty() ? "structure" : "starts",
            refused,
            () ->
                specimen
                    + ": "
                    + misfit
                    + " variables has to be refused with an IllegalArgumentException that names"
                    + " the size of the form, got "
                    + outcome
                    + "; call run.requireFit(form.size()) first");
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
