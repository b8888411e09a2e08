package dev.couplet.examples.rounds;

import dev.couplet.model.Plan;
import dev.couplet.model.Unmet;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** The fifth page of the report: which van serves which villages, loads, and what is not kept. */
final class PlanPage {
  private static final int BAR = 12;

  private final RoundsModel rounds;
  private final Plan plan;

  private PlanPage(RoundsModel rounds, Plan plan) {
    this.rounds = rounds;
    this.plan = plan;
  }

  static String of(RoundsModel rounds, Plan plan) {
    return new PlanPage(rounds, plan).text();
  }

  private String text() {
    return Sheet.headed("5. The plan").table(vans()).blank().table(unmet()).toString();
  }

  private Columns vans() {
    Columns table =
        new Columns("lrlrl").row("van", "crates", "", "metres", "villages and their crates");
    for (Round round : rounds.rounds(plan)) {
      table.row(
          round.van().toString(),
          round.crates() + " of " + round.van().capacity(),
          bar(round),
          Long.toString(round.metres()),
          villages(round));
    }
    return table;
  }

  private static String bar(Round round) {
    long capacity = Math.max(1, round.van().capacity());
    int filled = (int) Math.min(BAR, Math.round((double) BAR * round.crates() / capacity));
    return "[" + "#".repeat(filled) + ".".repeat(BAR - filled) + "]";
  }

  private static String villages(Round round) {
    return round.villages().isEmpty()
        ? "none"
        : round.villages().stream()
            .map(village -> village + " " + village.crates())
            .collect(Collectors.joining(", "));
  }

  private Columns unmet() {
    return new Columns("ll")
        .row("unmet rules", listed(plan.unmet().stream().filter(Unmet::required)))
        .row("unmet wishes", listed(plan.unmet().stream().filter(unmet -> !unmet.required())));
  }

  private static String listed(Stream<Unmet> unmet) {
    String list = unmet.map(PlanPage::words).collect(Collectors.joining("; "));
    return list.isEmpty() ? "none" : list;
  }

  private static String words(Unmet unmet) {
    String by = unmet.required() ? ", missed by " + Numbers.shown(unmet.amount()) : "";
    return unmet.rule() + by + (unmet.required() ? "" : ", " + Numbers.metres(unmet.cost()));
  }
}
