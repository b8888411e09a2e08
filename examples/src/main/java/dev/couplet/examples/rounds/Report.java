package dev.couplet.examples.rounds;

import dev.couplet.anneal.Annealing;
import dev.couplet.audit.LoweringAudit;
import dev.couplet.embed.Picture;
import dev.couplet.lower.Lowered;
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
import java.util.Optional;
import java.util.function.Function;

/** Goes the way from data to answer, and prints a page after each step. */
final class Report {
  private static final int DRAWS = 100;

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
    RoundsModel copy = RoundsModel.of(SmallCopy.of(data));
    Lowered loweredCopy = lower(copy);
    LoweringAudit.Report audit = LoweringAudit.exhaustive(loweredCopy);
    page(AuditPage.of(copy, loweredCopy, audit));
    Draws draws = draw(lowered);
    page(DrawsPage.of(lowered, draws));
    Answer answer = solve(rounds, lowered.read(draws).best());
    page(PlanPage.of(rounds, answer.plan()));
    page(AnswerPage.of(rounds, answer));
    Optional<OrderRun> ordered = order(rounds, answer.plan());
    page(ordered.map(OrderPage::of).orElse(OrderPage.without(answer.plan().feasible())));
    HostRun hosted = host(loweredCopy);
    out.print(HostPage.of(hosted));
    options.svg().ifPresent(file -> drawMap(file, rounds, answer, ordered));
    options.hostSvg().ifPresent(file -> drawHost(file, hosted));
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
      return RoundsWeights.lowering(rounds).lower(rounds.model());
    } catch (IllegalArgumentException tooLarge) {
      throw new BadInput("the numbers are too large together: " + tooLarge.getMessage());
    }
  }

  private Draws draw(Lowered lowered) {
    Run run = Run.of(draws()).structure(lowered.structure());
    return watched(
        "drawing", watch -> Annealing.standard().sample(lowered.qubo(), run.watch(watch)));
  }

  private Answer solve(RoundsModel rounds, Plan start) {
    Effort effort = Effort.within(half()).seed(options.seed()).threads(options.threads());
    return watched("solving", watch -> solver(rounds, start).solve(rounds.model(), effort, watch));
  }

  /** Takes as long again as draws and solver together, if need be. */
  private Optional<OrderRun> order(RoundsModel rounds, Plan plan) {
    if (!OrderRun.possible(rounds, plan)) {
      return Optional.empty();
    }
    Effort effort = draws().limit(options.time(1));
    return Optional.of(watched("ordering", watch -> OrderRun.of(rounds, plan, effort, watch)));
  }

  private HostRun host(Lowered copy) {
    return watched("hosting", watch -> HostRun.of(copy, draws(), watch));
  }

  private Effort draws() {
    return Effort.draws(DRAWS).limit(half()).seed(options.seed()).threads(options.threads());
  }

  private Duration half() {
    return options.time(0.5);
  }

  /** A plan that leaves no village open is worth beginning from. */
  private static Solver solver(RoundsModel rounds, Plan start) {
    Solver solver = Solver.standard().with(RoundsWeights.lowering(rounds));
    return start.feasible() ? solver.from(start) : solver;
  }

  /** Shows the progress of a step on a terminal, and wipes it away afterwards. */
  private <T> T watched(String doing, Function<Watch, T> step) {
    if (!onTerminal) {
      return step.apply(Watch.none());
    }
    ProgressBar bar = new ProgressBar(err, doing, half());
    try {
      return step.apply(Watch.none().progress(bar::show));
    } finally {
      bar.clear();
    }
  }

  private void drawMap(Path file, RoundsModel rounds, Answer answer, Optional<OrderRun> ordered) {
    String map =
        ordered
            .map(run -> RoundsMap.svg(rounds.data(), run.rounds(), OrderPage.summary(run)))
            .orElseGet(
                () ->
                    RoundsMap.withoutWays(
                        rounds.data(), rounds.rounds(answer.plan()), AnswerPage.summary(answer)));
    write(file, map);
    out.println();
    out.println("The map is drawn in " + file);
  }

  private void drawHost(Path file, HostRun hosted) {
    Picture picture = hosted.fit().embedding().map(Picture::of).orElse(Picture.of(hosted.host()));
    write(file, picture.title("The small copy on a sparse host").toSvg());
    out.println("The host is drawn in " + file);
  }

  private static void write(Path file, String text) {
    try {
      Files.writeString(file, text);
    } catch (IOException e) {
      throw new BadInput("--svg " + file + ": the file cannot be written");
    }
  }
}
