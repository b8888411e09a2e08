package dev.couplet.examples.rounds;

import dev.couplet.bond.HostedDraws;
import dev.couplet.embed.Embedding;
import dev.couplet.embed.Fit;
import dev.couplet.model.Plan;
import dev.couplet.solve.Proof;
import java.util.Locale;

/** The last page of the report: the small copy on a host where each bit meets few others. */
final class HostPage {
  private final HostRun run;

  private HostPage(HostRun run) {
    this.run = run;
  }

  static String of(HostRun run) {
    return new HostPage(run).text();
  }

  private String text() {
    Sheet sheet = Sheet.headed("8. The small copy on a sparse host");
    sheet.paragraph(
        "The copy of page 3 once more, where a bit meets only its neighbours on a lattice. Each bit"
            + " becomes a branch set of vertices that are bound to agree.");
    sheet.blank();
    Columns table = new Columns("lrl");
    host(table);
    run.fit().embedding().ifPresentOrElse(found -> embedding(table, found), () -> noFit(table));
    run.draws().ifPresent(draws -> draws(table, draws));
    direct(table);
    return sheet.table(table).toString();
  }

  private void host(Columns table) {
    int missing = run.host().vertices() - run.host().presentCount();
    table.row("host", "", run.host().name() + ", cells of 4 + 4 vertices, 10 x 10 of them");
    table.row(
        "  vertices",
        number(run.host().presentCount()),
        missing + " are missing, chosen by the seed");
    table.row("  couplings", number(run.host().edges()), "between neighbours");
    table.row("bits", number(run.guest().vertices()), "of the copy's form");
    table.row("pairs", number(run.guest().edges()), "of bits that must meet");
  }

  private static void embedding(Columns table, Embedding found) {
    String mean = String.format(Locale.ROOT, "%.2f", found.mean());
    table.row("embedding", number(found.total()), "vertices in all branch sets");
    table.row(
        "  longest",
        number(found.longest()),
        "vertices in the largest set, " + mean + " on average");
  }

  private void noFit(Columns table) {
    String why =
        run.fit() instanceof Fit.Impossible impossible ? impossible.because() : "none was found";
    table.row("embedding", "none", why);
  }

  private void draws(Columns table, HostedDraws hosted) {
    String torn = String.format(Locale.ROOT, "%.2f %%", 100 * hosted.tornShare());
    long feasible = DrawsPage.feasible(run.copy(), hosted.draws());
    table.row("draws", number(hosted.draws().total()), "on the host, each from a random state");
    table.row("  torn", torn, "of the branch sets; settled by what suits the others");
    table.row("  feasible", Long.toString(feasible), "keep all required rules once read back");
    Plan best = best(hosted);
    if (best.feasible()) {
      table.row("best", Numbers.metres(best.value()), "what the best of these plans is worth");
    }
  }

  private Plan best(HostedDraws hosted) {
    return run.copy().read(hosted.draws()).best();
  }

  private void direct(Columns table) {
    Plan plan = run.direct().plan();
    String value = plan.feasible() ? Numbers.metres(plan.value()) : "none";
    String proved = run.direct().proof() == Proof.NONE ? "" : ", proved";
    table.row("direct", value, "the solver's answer without a host" + proved + comparison(plan));
  }

  private String comparison(Plan direct) {
    if (!direct.feasible() || run.draws().isEmpty()) {
      return "";
    }
    Plan best = best(run.draws().get());
    return best.feasible() && best.value() == direct.value()
        ? "; the host's draws reach it"
        : "; the host's draws do not reach it";
  }

  private static String number(int value) {
    return Integer.toString(value);
  }
}
