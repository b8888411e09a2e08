package dev.couplet.examples.rounds;

import dev.couplet.lower.Lowered;
import dev.couplet.lower.Plans;
import dev.couplet.model.Plan;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.End;
import java.util.List;

/** The fourth page of the report: states drawn from the form, and the plans they stand for. */
final class DrawsPage {
  private DrawsPage() {}

  static String of(Lowered lowered, Draws draws) {
    Plans plans = lowered.read(draws);
    List<Plan> feasible = plans.feasible();
    String timely = draws.end() == End.DEADLINE ? ", until the time was up" : "";
    Columns table =
        new Columns("lrl")
            .row("draws", Integer.toString(draws.total()), "each from a random state" + timely)
            .row("feasible", Long.toString(feasible(lowered, draws)), "keep all required rules")
            .row("plans", Integer.toString(feasible.size()), "different ones among these");
    if (!feasible.isEmpty()) {
      String value = Numbers.metres(plans.best().value());
      table.row("best", value, "what the best of them is worth; the solver starts from it");
    }
    return Sheet.headed("4. Draws from the form, by annealing").table(table).toString();
  }

  /** How many of the draws stand for a plan that keeps all required rules. */
  static long feasible(Lowered lowered, Draws draws) {
    return draws.rows().stream()
        .filter(draw -> lowered.plan(draw.state()).feasible())
        .mapToLong(draw -> draw.multiplicity())
        .sum();
  }
}
