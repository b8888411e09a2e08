package dev.couplet.audit;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import java.util.HashSet;
import java.util.Set;

/** What holds of every result, however its run ended. */
final class Results {
  private static final int ENUMERATED = 12;

  /** What sums of a few thousand coefficients lose, relative to the sum of their magnitudes. */
  private static final double ROUNDING = 1e-12;

  private Results() {}

  static void examine(Notes notes, Specimen specimen, Effort effort, Draws draws) {
    String where = specimen + " with " + effort + ": ";
    rows(notes, specimen, where, draws);
    counts(notes, specimen, where, effort, draws);
    bound(notes, specimen, where, draws);
    notes.expect(
        "seed",
        draws.seed() == effort.seed(),
        () -> where + "the result says seed " + draws.seed() + "; pass on the seed of the effort");
  }

  private static void rows(Notes notes, Specimen specimen, String where, Draws draws) {
    notes.expect("draws", !draws.rows().isEmpty(), () -> where + "there is no draw");
    Set<State> seen = new HashSet<>();
    double last = Double.NEGATIVE_INFINITY;
    for (Draw row : draws) {
      row(notes, specimen, where, row);
      notes.expect(
          "merged", seen.add(row.state()), () -> where + row + " repeats the state of a row above");
      double before = last;
      notes.expect(
          "order", row.energy() >= before, () -> where + row + " stands below energy " + before);
      last = row.energy();
    }
  }

  private static void row(Notes notes, Specimen specimen, String where, Draw row) {
    boolean fits = row.state().size() == specimen.size();
    notes.expect("states", fits, () -> where + row + " has " + row.state().size() + " variables");
    if (fits) {
      double energy = specimen.form().value(row.state());
      notes.expect(
          "energies",
          energy == row.energy(),
          () ->
              where
                  + row
                  + ": the form gives "
                  + energy
                  + "; build the result with Draws.of and the form that was passed in");
    }
  }

  private static void counts(
      Notes notes, Specimen specimen, String where, Effort effort, Draws draws) {
    int sum = draws.rows().stream().mapToInt(Draw::multiplicity).sum();
    notes.expect(
        "counts",
        sum == draws.total() && sum > 0,
        () -> where + "the multiplicities add up to " + sum + ", the total is " + draws.total());
    if (effort.draws().isPresent() && !proved(specimen, draws)) {
      int asked = effort.draws().getAsInt();
      notes.expect("counts", sum <= asked, () -> where + "more than the draws asked for: " + draws);
      notes.expect(
          "counts",
          sum == asked || draws.end() != End.DONE,
          () ->
              where
                  + draws
                  + " is done with fewer draws than asked for, and without a proof"
                  + " (a bound equal to its best energy)");
    }
  }

  /**
   * Whether the bound meets the best energy, as nearly as rounded sums of the coefficients let it:
   * a method that proved its answer need not repeat itself, and may list every optimum.
   */
  static boolean proved(Specimen specimen, Draws draws) {
    double bound = draws.bound().orElse(Double.NEGATIVE_INFINITY);
    return bound >= draws.best().energy() - rounding(specimen.form());
  }

  private static double rounding(Qubo form) {
    return form.exact() ? 0 : ROUNDING * form.magnitude();
  }

  private static void bound(Notes notes, Specimen specimen, String where, Draws draws) {
    if (draws.bound().isPresent() && specimen.size() <= ENUMERATED) {
      double bound = draws.bound().getAsDouble();
      double lowest = lowest(specimen.form());
      notes.expect(
          "bound",
          bound <= lowest + rounding(specimen.form()),
          () -> where + "the bound " + bound + " lies above the energy " + lowest + " of a state");
    }
  }

  /** The lowest energy of a small form, by looking at every state. */
  static double lowest(Qubo form) {
    double lowest = Double.POSITIVE_INFINITY;
    for (long word = 0; word < 1L << form.size(); word++) {
      long[] words = form.size() == 0 ? new long[0] : new long[] {word};
      lowest = Math.min(lowest, form.value(State.ofWords(form.size(), words)));
    }
    return lowest;
  }
}
