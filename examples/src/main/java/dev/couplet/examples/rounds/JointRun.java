package dev.couplet.examples.rounds;

import dev.couplet.anneal.Annealing;
import dev.couplet.lower.Lowered;
import dev.couplet.model.Plan;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.solve.Answer;
import dev.couplet.solve.Solver;
import java.util.List;

/**
 * The joint model at work: draws from its form, and the solver from the best plan known.
 *
 * @param lowered the form
 * @param draws what was drawn from it
 * @param answer the solver's answer
 * @param plan the best plan, without free stops between others; never worse than the one given
 * @param rounds what the vans do in it, in the order of the visits
 */
record JointRun(Lowered lowered, Draws draws, Answer answer, Plan plan, List<Round> rounds) {
  /** Temperatures, as parts of what one step can save: detours are free at first, dear at last. */
  private static final double HOT = 1.0 / 3;

  private static final double COLD = 1.0 / 24;

  /**
   * Makes the run.
   *
   * @param effort for the draws; the solver gets half as much time
   * @param given rounds in the order of the visits that keep all rules
   */
  static JointRun of(JointModel joint, List<Round> given, Effort effort, Watch watch) {
    Lowered lowered = joint.lowering().lower(joint.model());
    Run run = Run.of(effort).structure(lowered.structure()).watch(watch);
    double stake = joint.stake();
    Annealing annealing = Annealing.standard().hot(HOT * stake).cold(COLD * stake);
    Draws draws = annealing.sample(lowered.qubo(), run);
    Plan start = better(joint, lowered.read(draws).best(), joint.plan(given));
    Solver solver = Solver.standard().with(joint.lowering()).from(start);
    Answer answer = solver.solve(joint.model(), one(effort), Watch.stop(watch.stopSignal()));
    Plan plan = better(joint, answer.plan(), start);
    return new JointRun(lowered, draws, answer, plan, joint.rounds(plan));
  }

  /** The former plan without free stops, if it keeps all rules and is better than the latter. */
  private static Plan better(JointModel joint, Plan found, Plan known) {
    if (!found.feasible()) {
      return known;
    }
    Plan closed = joint.plan(joint.rounds(found));
    return closed.compareTo(known) < 0 ? closed : known;
  }

  private static Effort one(Effort effort) {
    Effort one = Effort.draws(1).seed(effort.seed()).threads(effort.threads());
    return effort.limit().map(limit -> one.limit(limit.dividedBy(2))).orElse(one);
  }

  /** Whether no plan is better; a free stop closed may have cost a metre of rounding. */
  boolean proved() {
    return answer.gap() == 0 && plan.value() <= answer.value();
  }

  /** No plan is stake less: what the solver says, or nothing at all, since no way is negative. */
  double bound() {
    return Math.max(0, answer.bound());
  }
}
