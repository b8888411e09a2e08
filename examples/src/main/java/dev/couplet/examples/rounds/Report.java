package dev.couplet.examples.rounds;

import dev.couplet.anneal.Annealing;
import dev.couplet.audit.LoweringAudit;
import dev.couplet.audit.LoweringReport;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowering;
import dev.couplet.model.Plan;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.solve.Answer;
import dev.couplet.solve.Solver;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;

/** Goes the way from data to answer, and prints a page after each step. */
final class Report {
  private static final int DRAWS = 100;
  private static final double SHARE_OF_DRAWS = 0.5;

  private final Options options;
  private final PrintStream out;
  private final PrintStream err;
  private final boolean onTerminal;

  Report(Options options, PrintStream out, PrintStream err, boolean onTerminal) {
    this.options = options;
    this.out = out;
    this.err = err;
    this.onTerminal = onTerminal;
  }

  /** Prints the report and returns the exit status. */
  int print() {
    RoundsData data = RoundsReader.read(options.folder());
    RoundsCheck.check(data);
    RoundsModel rounds = RoundsModel.of(data);
    Lowered lowered = lower(rounds);
    page(title(data));
    page(ModelPage.of(rounds));
    page(LoweringPage.of(rounds, lowered));
    LoweringReport audit = audit(RoundsModel.of(SmallCopy.of(data)));
    Draws draws = draw(lowered);
    page(DrawsPage.of(lowered, draws));
    Answer answer = solve(rounds, lowered.read(draws).best());
    page(PlanPage.of(rounds, answer.plan()));
    out.print(AnswerPage.of(rounds, answer));
    options.svg().ifPresent(file -> draw(file, rounds, answer));
    return answer.plan().feasible() && audit.passed() ? 0 : 1;
  }

  private void page(String text) {
    out.print(text);
    out.println();
    out.flush();
  }

  private String title(RoundsData data) {
    String question =
        data.villages().size()
            + " villages and "
            + data.vans().size()
            + " vans: which van serves which village, so that the villages of a van lie close"
            + " together?";
    String source =
        options
            .folder()
            .directory()
            .map(directory -> "Data: " + directory)
            .orElse("All names and numbers are invented for this example.");
    return new Sheet()
        .line("Rounds of a mobile library")
        .line("==========================")
        .paragraph(question)
        .paragraph(source)
        .toString();
  }

  /** Coordinates and crates may each be in range and still be too much together. */
  private static Lowered lower(RoundsModel rounds) {
    try {
      return Lowering.standard().lower(rounds.model());
    } catch (IllegalArgumentException tooLarge) {
      throw new BadInput("the numbers are too large together: " + tooLarge.getMessage());
    }
  }

  private LoweringReport audit(RoundsModel copy) {
    Lowered lowered = lower(copy);
    LoweringReport report = LoweringAudit.exhaustive(lowered);
    page(AuditPage.of(copy, lowered, report));
    return report;
  }

  private Draws draw(Lowered lowered) {
    Duration limit = options.time(SHARE_OF_DRAWS);
    Effort effort =
        Effort.draws(DRAWS).limit(limit).seed(options.seed()).threads(options.threads());
    ProgressBar bar = new ProgressBar(err, "drawing", limit);
    Run run = Run.of(effort).watch(watch(bar)).structure(lowered.structure());
    try {
      return Annealing.standard().sample(lowered.qubo(), run);
    } finally {
      bar.clear();
    }
  }

  private Answer solve(RoundsModel rounds, Plan start) {
    Duration limit = options.time(1 - SHARE_OF_DRAWS);
    Effort effort = Effort.within(limit).seed(options.seed()).threads(options.threads());
    ProgressBar bar = new ProgressBar(err, "solving", limit);
    try {
      return solver(start).solve(rounds.model(), effort, watch(bar));
    } finally {
      bar.clear();
    }
  }

  /** A plan that leaves no village open is worth beginning from. */
  private static Solver solver(Plan start) {
    return start.feasible() ? Solver.standard().from(start) : Solver.standard();
  }

  private Watch watch(ProgressBar bar) {
    return onTerminal ? Watch.none().progress(bar::show) : Watch.none();
  }

  private void draw(Path file, RoundsModel rounds, Answer answer) {
    String svg =
        RoundsMap.svg(rounds.data(), rounds.rounds(answer.plan()), AnswerPage.summary(answer));
    try {
      Files.writeString(file, svg);
    } catch (IOException e) {
      throw new BadInput("--svg " + file + ": the file cannot be written");
    }
    out.println();
    out.println("The map is drawn in " + file);
  }
}
