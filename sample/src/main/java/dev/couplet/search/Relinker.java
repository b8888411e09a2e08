package dev.couplet.search;

import dev.couplet.form.State;
import dev.couplet.kernel.DrawLoop;
import dev.couplet.kernel.Drawer;
import dev.couplet.kernel.LocalFields;
import dev.couplet.kernel.Pace;
import dev.couplet.kernel.Streams;
import dev.couplet.sampling.Run;
import java.util.List;
import java.util.SplittableRandom;

/** Makes draws by relinking, one at a time; belongs to one thread. */
final class Relinker implements Drawer {
  /** Elites are exhausted after this many paths in a row that did not improve them. */
  private static final int EXHAUSTED = 60;

  /** In the place of an energy that nobody has asked for: above all others. */
  private static final long UNKNOWN = Long.MAX_VALUE - 1;

  private final Workbench bench;
  private final RelinkPath path;
  private final Run run;
  private final int elites;
  private final int patience;

  Relinker(Workbench bench, Run run, int elites, int patience) {
    this.bench = bench;
    this.path = new RelinkPath(bench.moves());
    this.run = run;
    this.elites = elites;
    this.patience = patience;
  }

  @Override
  public List<State> draw(int first, int count, Pace pace) {
    SplittableRandom random = Streams.of(run.effort().seed(), first);
    State begin = DrawLoop.begin(bench.moves().size(), run, first, random);
    if (pace.look()) {
      return List.of(begin);
    }
    bench.goal().begin();
    Budget budget = Budget.of(run.effort());
    State best = begin;
    long lowest = Long.MAX_VALUE;
    do {
      Elites own = search(begin, budget, random, pace);
      if (own.lowest() < lowest) {
        lowest = own.lowest();
        best = own.best();
      }
      begin = LocalFields.random(begin.size(), random);
    } while (run.effort().sweeps().isPresent() && !over(budget, pace));
    return List.of(bench.goal().met() ? best : bench.polished(best, random, pace));
  }

  private boolean over(Budget budget, Pace pace) {
    return budget.spent() || pace.ended() || bench.goal().met();
  }

  /** One set of elites, from its first state until it is exhausted. */
  private Elites search(State begin, Budget budget, SplittableRandom random, Pace pace) {
    Elites pool = new Elites(elites);
    State next = begin;
    do {
      State reached = bench.descend(next, random, pace);
      if (pace.ended()) {
        pool.add(reached, UNKNOWN);
        return pool;
      }
      bench.walk().run(patience, budget, random, pace);
      pool.add(bench.walk().bestState(), bench.walk().bestEnergy());
      next = LocalFields.random(begin.size(), random);
    } while (!pool.full() && !over(budget, pace));
    int idle = 0;
    while (idle < EXHAUSTED && !over(budget, pace)) {
      idle = relink(pool, budget, random, pace) ? 0 : idle + 1;
    }
    return pool;
  }

  /** One path and one walk from its best state; whether that improved the elites. */
  private boolean relink(Elites pool, Budget budget, SplittableRandom random, Pace pace) {
    int from = random.nextInt(pool.size());
    int to = (from + 1 + random.nextInt(pool.size() - 1)) % pool.size();
    if (pool.state(from).distance(pool.state(to)) < RelinkPath.NEAREST) {
      return false;
    }
    path.walk(pool.state(from), pool.state(to), budget, random, pace);
    if (pace.ended()) {
      return false;
    }
    bench.walk().run(patience, budget, random, pace);
    return pool.improve(bench.walk().bestState(), bench.walk().bestEnergy());
  }
}
