package dev.couplet.audit;

import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import java.util.regex.Pattern;

/**
 * Runs of one sampler on the forms it takes; what has to hold of every run is checked on each.
 * Belongs to one thread.
 */
final class Trials {
  /** A counted effort that ends by itself. */
  static final Effort SHORT = Effort.draws(12).sweeps(12).seed(11);

  /** Work for many looks at the clock; no run that watches its clock comes to the end of it. */
  static final Effort LONG = Effort.draws(200_000).sweeps(20).seed(5);

  private final Callers callers;
  private final Notes notes;
  private final List<Specimen> accepted = new ArrayList<>();

  Trials(Sampler sampler, Duration patience, Notes notes) {
    this.callers = new Callers(sampler, patience);
    this.notes = notes;
  }

  Notes notes() {
    return notes;
  }

  /** The forms that the sampler takes. */
  List<Specimen> specimens() {
    return accepted;
  }

  /** The largest form that the sampler takes. */
  Specimen largest() {
    Specimen largest = accepted.get(0);
    for (Specimen specimen : accepted) {
      largest = specimen.size() > largest.size() ? specimen : largest;
    }
    return largest;
  }

  /**
   * Finds out which forms the sampler takes; it must take all of at most {@code small} variables.
   */
  void accept(List<Specimen> specimens, int small) {
    for (Specimen specimen : specimens) {
      Outcome outcome = call(specimen, () -> Run.of(SHORT));
      boolean refused =
          outcome.thrown().filter(IllegalArgumentException.class::isInstance).isPresent();
      if (refused && specimen.size() > small) {
        expectReason(specimen, outcome.thrown().orElseThrow());
      } else if (examine(specimen, SHORT, outcome).isPresent()) {
        accepted.add(specimen);
      }
    }
    notes.expect("forms", !accepted.isEmpty(), () -> "the sampler takes none of the forms");
  }

  private void expectReason(Specimen specimen, Throwable refusal) {
    notes.expect(
        "forms",
        names(refusal, specimen.size()),
        () -> specimen + " is refused with " + refusal + "; say which size is too large");
  }

  /** Whether a message holds a number, not as part of a longer one. */
  static boolean names(Throwable refusal, int number) {
    String message = String.valueOf(refusal.getMessage());
    return Pattern.compile("(?<!\\d)" + number + "(?!\\d)").matcher(message).find();
  }

  /** A run that has to return draws, all of it checked; empty if it did not. */
  Optional<Draws> draws(Specimen specimen, Run run) {
    return examine(specimen, run.effort(), call(specimen, () -> run));
  }

  /** A run that nobody watches. */
  Optional<Draws> draws(Specimen specimen, Effort effort) {
    return draws(specimen, Run.of(effort));
  }

  /** A run of which anything may come; only the threads are checked. */
  Outcome call(Specimen specimen, Supplier<Run> run) {
    Outcome outcome = attempt(specimen, run);
    expectNoThreadLeft(() -> "a run on " + specimen);
    return outcome;
  }

  private Outcome attempt(Specimen specimen, Supplier<Run> run) {
    try {
      return callers.call(specimen.form(), run);
    } catch (Callers.Lost lost) {
      throw new Callers.Lost(specimen + ": " + lost.getMessage());
    }
  }

  /** Runs at the same time, one a specimen. */
  List<Outcome> together(List<Specimen> specimens, List<Run> runs) {
    List<Outcome> outcomes =
        callers.together(specimens.stream().map(Specimen::form).toList(), runs);
    expectNoThreadLeft(() -> "runs at the same time");
    return outcomes;
  }

  private void expectNoThreadLeft(Supplier<String> after) {
    List<String> left = callers.threadsLeft();
    notes.expect(
        "threads end",
        left.isEmpty(),
        () ->
            after.get()
                + " left threads running: "
                + left
                + "; end and join them before returning");
  }

  private Optional<Draws> examine(Specimen specimen, Effort effort, Outcome outcome) {
    notes.expect(
        "returns",
        outcome.draws().isPresent(),
        () -> specimen + " with " + effort + ": " + outcome + "; a form that is taken gives draws");
    notes.expect(
        "interrupt",
        !outcome.interrupted(),
        () -> specimen + " with " + effort + ": nobody interrupted the run, yet the flag is set");
    outcome.draws().ifPresent(draws -> Results.examine(notes, specimen, effort, draws));
    return outcome.draws();
  }

  /** Whether a run may be done before it could see a reason to end: it proved its answer. */
  static boolean doneByProof(Specimen specimen, Draws draws) {
    return draws.end() == End.DONE && Results.proved(specimen, draws);
  }
}
