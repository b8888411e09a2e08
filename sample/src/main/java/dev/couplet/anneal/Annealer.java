package dev.couplet.anneal;

import dev.couplet.form.State;
import dev.couplet.kernel.Descent;
import dev.couplet.kernel.DrawLoop;
import dev.couplet.kernel.Drawer;
import dev.couplet.kernel.LocalFields;
import dev.couplet.kernel.Metropolis;
import dev.couplet.kernel.Pace;
import dev.couplet.kernel.Reassignment;
import dev.couplet.kernel.Streams;
import dev.couplet.kernel.SweepOrder;
import dev.couplet.sampling.Run;
import java.util.List;
import java.util.SplittableRandom;

/** Anneals one draw at a time; belongs to one thread. */
final class Annealer implements Drawer {
  private final Run run;
  private final Schedule schedule;
  private final Finish finish;
  private final LocalFields fields;
  private final Metropolis metropolis;
  private final Reassignment reassignment;
  private final Descent descent;

  Annealer(SweepOrder order, Run run, Schedule schedule, Finish finish, Pace setUp) {
    this.run = run;
    this.schedule = schedule;
    this.finish = finish;
    this.fields = new LocalFields(order.rows());
    this.metropolis = new Metropolis(fields, order);
    this.reassignment = new Reassignment(fields, run.structure(), setUp);
    this.descent = new Descent(fields);
  }

  @Override
  public List<State> draw(int first, int count, Pace pace) {
    SplittableRandom random = Streams.of(run.effort().seed(), first);
    State begin = DrawLoop.begin(fields.size(), run, first, random);
    if (pace.look() || !fields.set(begin, pace)) {
      return List.of(begin);
    }
    int sweeps = schedule.sweeps(first);
    for (int t = 0; t < sweeps; t++) {
      double inverse = schedule.inverseTemperature(t, sweeps);
      if (!metropolis.sweep(inverse, random, pace) || !reassignment.sweep(inverse, random, pace)) {
        break;
      }
    }
    if (finish == Finish.DESCENT) {
      descend(pace);
    }
    return List.of(fields.state());
  }

  /** Also a draw that was told to end goes down a little, so that its state is worth returning. */
  private void descend(Pace pace) {
    if (!pace.ended()) {
      descent.run(pace);
    }
    while (!pace.ended() && reassignment.descend(pace)) {
      descent.run(pace);
    }
    if (pace.ended()) {
      descent.close();
    }
  }
}
