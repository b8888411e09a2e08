package dev.couplet.audit;

import dev.couplet.audit.LoweringAudit.WeightSlack;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowered.Weight;
import dev.couplet.model.Plan;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import dev.couplet.model.Unmet;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * One exhaustive audit: a walk over the statement that finds the optimum, then a walk over the form
 * that compares. Belongs to one thread.
 */
final class ExhaustiveAudit {
  private static final long PLANS_LOOKED_AT = 1 << 16;

  private final Lowered lowered;
  private final Statement statement;
  private final Qubo qubo;
  private final int bits;
  private final Truth truth;
  private final Landscape rest;
  private final Map<String, Guard> guards;
  private final Guard[] guardsInOrder;
  private final Notes notes = new Notes();
  private final double error;

  private long decided;
  private long feasible;
  private double best = Double.POSITIVE_INFINITY;

  private long misvalued;
  private String firstMisvalued = "";
  private long others;
  private double lowestOther = Double.POSITIVE_INFINITY;
  private long lowestOtherPattern;

  ExhaustiveAudit(Lowered lowered) {
    this.lowered = lowered;
    this.statement = lowered.statement();
    this.qubo = lowered.qubo();
    this.bits = lowered.decisionBits();
    this.truth = new Truth(lowered);
    this.error = numbers().error(additions());
    LedgerParts parts = new LedgerParts(lowered, error, notes);
    this.guards = parts.guards(lowered.weights());
    this.guardsInOrder = guards.values().toArray(new Guard[0]);
    this.rest = parts.rest(lowered.weights());
  }

  private Numbers numbers() {
    Numbers numbers = new Numbers();
    numbers.add(qubo.toPolynomial());
    numbers.add(statement.objective());
    for (Rule rule : statement.rules()) {
      if (!rule.required()) {
        rule.parts().forEach(part -> addCosts(numbers, part));
      }
    }
    return numbers;
  }

  private static void addCosts(Numbers numbers, Rule.Part part) {
    double over = Math.max(0, part.range().highest() - part.highest());
    double under = Math.max(0, part.lowest() - part.range().lowest());
    numbers.add(part.cost(1));
    numbers.add(part.cost(Math.max(over, under)));
  }

  /** How many numbers are added up at the most between two fresh starts. */
  private long additions() {
    long all = (long) qubo.size() + 2L * qubo.pairs() + statement.objective().terms();
    return Walk.STRETCH * (2L * qubo.size() + statement.objective().terms() + 2) + all;
  }

  LoweringAudit.Report report() {
    notes.expect(
        "approximate",
        lowered.approximate().isEmpty(),
        () ->
            "the penalties of "
                + lowered.approximate()
                + " are approximate: feasible plans cost something there too; lower these rules"
                + " exactly to have the form audited");
    findOptimum();
    compare();
    List<WeightSlack> slacks = slacks();
    noteOthers(slacks);
    boolean compared = feasible > 0 && others > 0;
    return new LoweringAudit.Report(
        1L << bits,
        feasible,
        feasible > 0 ? OptionalDouble.of(ownSense(best)) : OptionalDouble.empty(),
        compared ? OptionalDouble.of(lowestOther - best) : OptionalDouble.empty(),
        slacks,
        notes.of("the lowering of '" + statement.name() + "'"));
  }

  private List<WeightSlack> slacks() {
    List<WeightSlack> slacks = new ArrayList<>();
    for (Weight weight : lowered.weights()) {
      Guard guard = guards.get(weight.rule());
      if (guard != null) {
        slacks.add(guard.slack(feasible > 0));
      } else if (weight.value() > 0) {
        slacks.add(new WeightSlack(weight.rule(), weight.value(), OptionalDouble.empty()));
      }
    }
    return slacks;
  }

  private void findOptimum() {
    new Walk(bits, truth::effort)
        .over(
            List.of(truth),
            pattern -> {
              decided += truth.decided() ? 1 : 0;
              if (truth.feasible()) {
                feasible++;
                best = Math.min(best, truth.minimised());
              }
            });
    for (DecisionBits decision : truth.incomplete(statement)) {
      notes.expect(
          "values",
          false,
          () ->
              decision.values()
                  + " of "
                  + Truth.wanted(statement, decision.decision())
                  + " values of '"
                  + decision.decision().name()
                  + "' are stood for by a pattern");
    }
    notes.expect("values", decided > 0, () -> "no pattern stands for a plan");
    notes.expect(
        "feasible plan",
        feasible > 0,
        () ->
            "none of the "
                + decided
                + " plans keeps every required rule; relax one, or prefer it at a cost");
  }

  private void compare() {
    List<Flips> along = new ArrayList<>(List.of(truth, rest));
    along.addAll(guards.values());
    long stride = Math.max(1, decided / PLANS_LOOKED_AT);
    long[] seen = {0};
    new Walk(bits, this::effort)
        .over(
            along,
            pattern -> {
              double energy = energy();
              if (truth.feasible()) {
                compareFeasible(pattern, energy);
              } else {
                compareOther(pattern, energy);
              }
              if (truth.decided() && seen[0]++ % stride == 0) {
                lookAtPlan(pattern, energy);
              }
            });
    notes.expect(
        "value",
        misvalued == 0,
        () -> firstMisvalued + " (and " + (misvalued - 1) + " more plans are off)");
  }

  private double energy() {
    double energy = rest.value();
    for (Guard guard : guardsInOrder) {
      energy += guard.value();
    }
    return energy;
  }

  private int effort(int bit) {
    int sum = rest.effort(bit) + truth.effort(bit);
    for (Guard guard : guardsInOrder) {
      sum += guard.effort(bit);
    }
    return sum;
  }

  private void compareFeasible(long pattern, double energy) {
    if (Math.abs(energy - truth.minimised()) > error && misvalued++ == 0) {
      firstMisvalued =
          "a feasible plan is worth "
              + Numbers.shown(ownSense(truth.minimised()))
              + ", the form says "
              + Numbers.shown(lowered.valueOf(energy))
              + ": "
              + read(pattern);
    }
  }

  private void compareOther(long pattern, double energy) {
    others++;
    if (energy < lowestOther) {
      lowestOther = energy;
      lowestOtherPattern = pattern;
    }
    for (Guard guard : guardsInOrder) {
      guard.take(energy - best, error);
    }
  }

  private void lookAtPlan(long pattern, double lowest) {
    Plan plan = read(pattern);
    notes.expect(
        "reading",
        plan.undecided().isEmpty()
            && plan.feasible() == truth.feasible()
            && Math.abs(plan.value() - ownSense(truth.minimised())) <= error,
        () ->
            "the rules say "
                + (truth.feasible() ? "feasible" : "infeasible")
                + ", value "
                + Numbers.shown(ownSense(truth.minimised()))
                + ", of "
                + plan);
    State complete = lowered.complete(plan);
    double energy = qubo.value(complete);
    notes.expect(
        "completion",
        lowered.plan(complete).equals(plan)
            && (Math.abs(energy - lowest) <= error || !alike(complete, pattern, plan)),
        () ->
            "completed, the plan has energy "
                + Numbers.shown(energy)
                + ", with other auxiliary bits it has "
                + Numbers.shown(lowest)
                + ": "
                + plan);
  }

  /**
   * Whether completing has to reach the energy of a pattern: that of a feasible plan, or the plan's
   * own one. Several patterns of a count may stand for one number, and what a broken rule costs may
   * differ between them.
   */
  private boolean alike(State complete, long pattern, Plan plan) {
    boolean own = true;
    for (int bit = 0; bit < bits; bit++) {
      own &= complete.get(bit) == ((pattern >>> bit & 1) != 0);
    }
    return own || plan.feasible();
  }

  private void noteOthers(List<WeightSlack> slacks) {
    boolean above = feasible == 0 || others == 0 || lowestOther - best > error;
    notes.expect("others", above, () -> describeOther(slacks));
  }

  private String describeOther(List<WeightSlack> slacks) {
    Plan plan = read(lowestOtherPattern);
    StringBuilder text = new StringBuilder();
    text.append("energy ").append(Numbers.shown(lowestOther));
    text.append(", not above that of the best feasible plan, ").append(Numbers.shown(best));
    text.append(": ").append(plan).append("; ");
    for (Unmet unmet : plan.unmet()) {
      slacks.stream()
          .filter(slack -> unmet.required() && slack.rule().equals(unmet.rule()))
          .forEach(slack -> text.append(mend(slack)).append("; "));
    }
    return text.append("or leave the weights to the range bound").toString();
  }

  private static String mend(WeightSlack slack) {
    double enough = slack.infimum().orElse(Double.POSITIVE_INFINITY);
    String above =
        enough < Double.POSITIVE_INFINITY
            ? "raise it above " + Numbers.shown(enough)
            : "raising it alone is not enough, raise the others too";
    return "'" + slack.rule() + "' weighs " + Numbers.shown(slack.weight()) + ", " + above;
  }

  private Plan read(long pattern) {
    return lowered.plan(State.ofWords(qubo.size(), words(pattern)));
  }

  private long[] words(long pattern) {
    long[] words = new long[(qubo.size() + 63) / 64];
    if (words.length > 0) {
      words[0] = pattern;
    }
    return words;
  }

  private double ownSense(double minimised) {
    return statement.sense().sign() * minimised + 0.0;
  }
}
