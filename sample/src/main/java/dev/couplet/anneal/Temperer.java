package dev.couplet.anneal;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.kernel.Adjacency;
import dev.couplet.kernel.ClusterMoves;
import dev.couplet.kernel.DrawLoop;
import dev.couplet.kernel.Drawer;
import dev.couplet.kernel.LocalFields;
import dev.couplet.kernel.Pace;
import dev.couplet.kernel.Reassignment;
import dev.couplet.kernel.Streams;
import dev.couplet.kernel.SweepOrder;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Vigil;
import java.util.List;
import java.util.SplittableRandom;

/** Makes draws by replica exchange, one at a time; belongs to one thread. */
final class Temperer implements Drawer {
  private final Qubo form;
  private final Run run;
  private final LadderPlan plan;
  private final Ladder[] ladders;
  private final ClusterMoves clusters;
  private final SweepOrder order;
  private final Reassignment tables;

  /** Whether all coefficients can be gone over several times between two looks at the clock. */
  private final boolean small;

  Temperer(Qubo form, SweepOrder order, Run run, LadderPlan plan, Pace setUp) {
    Adjacency rows = order.rows();
    this.form = form;
    this.run = run;
    this.plan = plan;
    this.clusters = new ClusterMoves(rows);
    this.small = form.size() + 2L * form.pairs() <= Vigil.STEPS / 8;
    this.ladders = new Ladder[plan.ladders()];
    this.order = order;
    this.tables = new Reassignment(new LocalFields(rows), run.structure(), setUp);
    for (int c = 0; c < ladders.length; c++) {
      ladders[c] = new Ladder(plan.inverse());
    }
  }

  @Override
  public List<State> draw(int first, int count, Pace pace) {
    SplittableRandom random = Streams.of(run.effort().seed(), first);
    State begin = DrawLoop.begin(form.size(), run, first, random);
    if (pace.look()) {
      return List.of(begin);
    }
    Lowest lowest = new Lowest(form, begin, run.effort().target());
    int number = plan.sweeps().of(first);
    for (int t = 0; t < number && !lowest.reached(); t++) {
      if (!sweep(t, begin, lowest, random, pace)) {
        break;
      }
      for (Ladder ladder : ladders) {
        ladder.exchange(t, random);
      }
    }
    return List.of(last(begin, lowest, pace));
  }

  /** One sweep of every replica; false if the pace ends it. */
  private boolean sweep(int t, State begin, Lowest lowest, SplittableRandom random, Pace pace) {
    for (Ladder ladder : ladders) {
      for (int rung = 0; rung < ladder.rungs(); rung++) {
        if (!ladder.has(rung) && !climbed(ladder, pace)) {
          return false;
        }
        Replica replica = ladder.at(rung);
        if (t == 0 && !replica.begin(own(begin, ladder, rung, random), pace)) {
          return false;
        }
        if (!replica.sweep(ladder.inverseTemperature(rung), random, pace)) {
          return false;
        }
        lowest.offer(replica);
      }
    }
    return ladders.length < 2 || trade(random, pace);
  }

  /** Puts a replica on the next rung, if there is time for that. */
  private boolean climbed(Ladder ladder, Pace pace) {
    if (pace.lookBefore(16L * form.size())) {
      return false;
    }
    LocalFields fields = new LocalFields(order.rows());
    ladder.add(new Replica(fields, order, tables.on(fields)));
    return true;
  }

  /** Each replica begins at random by itself, unless the run says where. */
  private State own(State begin, Ladder ladder, int rung, SplittableRandom random) {
    boolean first = ladder == ladders[0] && rung == 0;
    return first || !run.starts().isEmpty() ? begin : LocalFields.random(form.size(), random);
  }

  /** Clusters are traded on the colder half: further up nearly all that differs is one cluster. */
  private boolean trade(SplittableRandom random, Pace pace) {
    for (int rung = 0; 2 * rung < ladders[0].rungs(); rung++) {
      Replica one = ladders[0].at(rung);
      Replica two = ladders[1].at(rung);
      long steps = clusters.trade(one.fields(), two.fields(), random);
      if (steps > 0) {
        one.measure();
        two.measure();
      }
      if (pace.after(steps + 2L * form.size())) {
        return false;
      }
    }
    return true;
  }

  /**
   * Where the draw ends: the coldest replica as it is (but a state that reached the target is not
   * lost), or a local minimum below the lowest state seen, if there is time for that.
   */
  private State last(State begin, Lowest lowest, Pace pace) {
    if (!lowest.any()) {
      return begin;
    }
    Replica coldest = ladders[0].at(0);
    if (plan.finish() == Finish.NONE && !lowest.reached()) {
      return coldest.fields().state();
    }
    if (!pace.ended()) {
      return descended(coldest, lowest.state(), pace);
    }
    return small ? descended(coldest, lowest.state(), Pace.closing()) : lowest.state();
  }

  private static State descended(Replica replica, State from, Pace pace) {
    return replica.descend(from, pace) ? replica.fields().state() : from;
  }
}
