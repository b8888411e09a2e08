package dev.couplet.audit;

import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The same seed gives the same draws, whatever the threads; draws are drawn each by itself. */
final class SeedChecks {
  private static final int AT_ONCE = 4;

  private SeedChecks() {}

  static void examine(Trials trials) {
    for (Specimen specimen : trials.specimens()) {
      trials.draws(specimen, Trials.SHORT).ifPresent(first -> against(trials, specimen, first));
    }
    together(trials);
  }

  private static void against(Trials trials, Specimen specimen, Draws first) {
    Notes notes = trials.notes();
    notes.expect(
        "end",
        first.end() == End.DONE,
        () -> specimen + ": a counted run that nobody stopped ended " + first.end());
    expectSame(trials, "repeat", "again", specimen, first, Run.of(Trials.SHORT));
    for (int threads = 2; threads <= 3; threads++) {
      Run run = Run.of(Trials.SHORT.threads(threads));
      expectSame(trials, "threads", "on " + threads + " threads", specimen, first, run);
    }
    if (!specimen.structure().exactlyOne().isEmpty()) {
      structured(trials, specimen);
    }
    apart(trials, specimen, first);
  }

  static void expectSame(
      Trials trials, String check, String how, Specimen specimen, Draws first, Run run) {
    trials
        .draws(specimen, run)
        .ifPresent(
            second ->
                trials
                    .notes()
                    .expect(
                        check,
                        second.equals(first),
                        () ->
                            specimen
                                + ": the same seed "
                                + how
                                + " gave "
                                + difference(first, second)
                                + "; draws may depend on form, counts, seed and starts alone"));
  }

  private static String difference(Draws first, Draws second) {
    if (first.toString().equals(second.toString())) {
      return "other states (" + first + " both times)";
    }
    return second + " after " + first;
  }

  private static void structured(Trials trials, Specimen specimen) {
    Run run = Run.of(Trials.SHORT).structure(specimen.structure());
    Optional<Draws> draws = trials.draws(specimen, run);
    draws.ifPresent(
        first -> expectSame(trials, "repeat", "and structure again", specimen, first, run));
  }

  /** A method that its seed does not matter to may well end in one state; another must not. */
  private static void apart(Trials trials, Specimen specimen, Draws first) {
    boolean flat = specimen.form().magnitude() == 0;
    if (!flat || specimen.size() < 8 || first.rows().size() > 1) {
      return;
    }
    Effort other = Trials.SHORT.seed(Trials.SHORT.seed() + 1);
    trials
        .draws(specimen, other)
        .ifPresent(
            second ->
                trials
                    .notes()
                    .expect(
                        "apart",
                        second.best().state().equals(first.best().state()),
                        () ->
                            specimen
                                + ": all draws of a run are the same state, another with another"
                                + " seed; draws must not share random numbers"));
  }

  /** One instance, called on several threads at once, gives each caller what it gives alone. */
  private static void together(Trials trials) {
    List<Specimen> specimens = new ArrayList<>();
    List<Run> runs = new ArrayList<>();
    List<Optional<Draws>> alone = new ArrayList<>();
    for (int k = 0; k < Math.max(AT_ONCE, trials.specimens().size()); k++) {
      Specimen specimen = trials.specimens().get(k % trials.specimens().size());
      Run run = Run.of(Trials.SHORT.seed(100 + k));
      specimens.add(specimen);
      runs.add(run);
      alone.add(trials.draws(specimen, run));
    }
    List<Outcome> outcomes = trials.together(specimens, runs);
    for (int k = 0; k < outcomes.size(); k++) {
      Specimen specimen = specimens.get(k);
      Optional<Draws> expected = alone.get(k);
      Outcome outcome = outcomes.get(k);
      trials
          .notes()
          .expect(
              "shared instance",
              outcome.draws().equals(expected),
              () ->
                  specimen
                      + ": called on several threads at once, "
                      + outcome
                      + ", alone "
                      + expected.map(Draws::toString).orElse("nothing")
                      + "; keep nothing of a run in the sampler");
    }
  }
}
