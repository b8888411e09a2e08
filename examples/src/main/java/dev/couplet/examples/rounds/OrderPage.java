package dev.couplet.examples.rounds;

import java.util.List;
import java.util.stream.Collectors;

/**
 * The seventh page of the report: the rounds in the order of the visits, stage by stage and
 * jointly, and how good either is.
 */
final class OrderPage {
  private static final String HEADING = "7. The rounds in the order of the visits";

  private final OrderRun run;

  private OrderPage(OrderRun run) {
    this.run = run;
  }

  static String of(OrderRun run) {
    return new OrderPage(run).text();
  }

  /** The page where no plan can be put in order. */
  static String without(boolean feasible) {
    String why =
        feasible
            ? "A round has more than "
                + OrderRun.MOST_VILLAGES
                + " villages, too many to be put in order here."
            : "There is no plan that keeps all required rules, hence nothing to put in order.";
    return Sheet.headed(HEADING).paragraph(why).toString();
  }

  /** The better rounds in one line. */
  static String summary(OrderRun run) {
    String value =
        Numbers.metres(run.joint().map(joint -> joint.plan().value()).orElse(run.stagedValue()));
    boolean proved = run.joint().map(JointRun::proved).orElse(false);
    return "Ways and unmet wishes: "
        + value
        + (proved ? "; no plan is better: proved." : "; there may be a better plan.");
  }

  private String text() {
    Sheet sheet = Sheet.headed(HEADING);
    sheet.paragraph(
        "Each van leaves the library, calls at its villages and returns. Stage by stage: the vans"
            + " as on page 5, chosen by distances alone, then the best order for each van.");
    if (run.joint().isPresent()) {
      sheet.paragraph(
          "Jointly: one model decides van and order at once, in view of the whole way. It starts"
              + " from the former plan, so it is never worse.");
    } else {
      sheet.paragraph("There is too much here for one model that decides van and order at once.");
    }
    sheet.blank().table(rounds()).blank().table(values());
    run.joint().ifPresent(joint -> sheet.blank().paragraph(comparison(joint)));
    return sheet.toString();
  }

  private Columns rounds() {
    Columns table =
        new Columns("lrrl").row("stage by stage", "crates", "metres", "order of visits");
    addRounds(table, run.staged());
    run.joint()
        .ifPresent(
            joint -> {
              table.row("jointly", "", "", "");
              addRounds(table, joint.rounds());
            });
    return table;
  }

  private void addRounds(Columns table, List<Round> rounds) {
    for (Round round : rounds) {
      String load = round.crates() + " of " + round.van().capacity();
      String order = round.villages().stream().map(Village::name).collect(Collectors.joining(", "));
      table.row(
          "  " + round.van(),
          load,
          Long.toString(round.way(run.library())),
          order.isEmpty() ? "none" : order);
    }
  }

  private Columns values() {
    Columns table = new Columns("lrrl");
    String[] joint =
        run.joint().map(this::joint).orElse(new String[] {"-", "-", "-", "-", "-", "-"});
    double gap = run.stagedValue() - run.stagedBound();
    table.row("", "by stages", "jointly", "");
    table.row("ways", Numbers.metres(run.stagedWay()), joint[0], "of all vans");
    table.row("wishes", Numbers.metres(run.wishes()), joint[1], "that are not granted");
    table.row("value", Numbers.metres(run.stagedValue()), joint[2], "both added up");
    table.row(
        "lower bound",
        Numbers.metres(run.stagedBound()),
        joint[3],
        "by stages: any order for these vans; jointly: any plan");
    table.row("gap", Numbers.metres(gap), joint[4], "nothing is better by more than this");
    table.row(
        "proof",
        run.stagedProved() ? "optimal" : "none",
        joint[5],
        "by stages: each order for itself; jointly: the whole");
    run.joint().ifPresent(found -> table.row("draws", "", draws(found), drawWords(found)));
    return table;
  }

  private String[] joint(JointRun joint) {
    double value = joint.plan().value();
    long way = run.way(joint.rounds());
    return new String[] {
      Numbers.metres(way),
      Numbers.metres(value - way),
      Numbers.metres(value),
      Numbers.metres(Math.min(value, joint.bound())),
      Numbers.metres(Math.max(0, value - joint.bound())),
      joint.proved() ? "optimal" : "none"
    };
  }

  private static String draws(JointRun joint) {
    return Integer.toString(joint.draws().total());
  }

  private static String drawWords(JointRun joint) {
    return DrawsPage.feasible(joint.lowered(), joint.draws())
        + " keep all rules; of a form of "
        + joint.lowered().qubo().size()
        + " bits, "
        + joint.lowered().qubo().pairs()
        + " pairs";
  }

  private String comparison(JointRun joint) {
    double saved = run.stagedValue() - joint.plan().value();
    return saved > 0
        ? "Deciding both at once saves " + Numbers.metres(saved) + "."
        : "Deciding both at once found nothing better in the time given.";
  }
}
