package dev.couplet.exact;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.kernel.Adjacency;
import dev.couplet.kernel.LocalFields;
import dev.couplet.kernel.Pace;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Vigil;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;

/**
 * A good state to begin with: one-flip tabu search (Glover 1989) from given and random states. The
 * best neighbour is taken even if it is worse, unless its variable moved a short while ago.
 */
final class WarmStart {
  private static final int WORK = 1 << 23;
  private static final int BEGINNINGS = 8;

  private final Qubo form;
  private final SplittableRandom random;
  private final Vigil vigil;
  private Draw best;

  private WarmStart(Qubo form, SplittableRandom random, Vigil vigil) {
    this.form = form;
    this.random = random;
    this.vigil = vigil;
    this.best = Draw.of(form, State.zeros(form.size()));
  }

  /** The best state found; the starts are looked at first. */
  static Draw of(Qubo form, List<State> starts, SplittableRandom random, Vigil vigil) {
    WarmStart search = new WarmStart(form, random, vigil);
    for (int k = 0; k < starts.size() && (k == 0 || !vigil.over()); k++) {
      search.offer(starts.get(k));
    }
    Optional<Adjacency> rows =
        form.size() == 0 || vigil.over() ? Optional.empty() : Adjacency.of(form, Pace.of(vigil));
    if (rows.isPresent()) {
      LocalFields fields = new LocalFields(rows.get());
      starts.forEach(start -> search.improve(fields, start));
      for (int k = starts.size(); k < BEGINNINGS && !vigil.over(); k++) {
        search.improve(fields, LocalFields.random(form.size(), random));
      }
    }
    return search.best;
  }

  private void offer(State state) {
    Draw draw = Draw.of(form, state);
    if (draw.energy() < best.energy()) {
      best = draw;
    }
  }

  private void improve(LocalFields fields, State from) {
    if (!fields.set(from, Pace.of(vigil))) {
      return;
    }
    int size = form.size();
    int[] freeAt = new int[size];
    Arrays.fill(freeAt, 0);
    double energy = form.value(from);
    double record = energy;
    State recordState = from;
    int steps = Math.max(2 * size, WORK / BEGINNINGS / size);
    int lookEvery = 1 + Vigil.STEPS / 4 / size;
    for (int step = 0; step < steps; step++) {
      if (step % lookEvery == 0 && vigil.over()) {
        break;
      }
      int next = next(fields, freeAt, step, record - energy);
      if (next < 0) {
        continue;
      }
      energy += fields.gain(next);
      fields.flip(next);
      freeAt[next] = step + 1 + size / 10 + random.nextInt(10);
      if (energy < record) {
        record = energy;
        recordState = fields.state();
      }
    }
    offer(recordState);
  }

  /** The variable whose flip costs least, of those that may move or would set a record. */
  private static int next(LocalFields fields, int[] freeAt, int step, double recordGain) {
    int next = -1;
    double least = Double.POSITIVE_INFINITY;
    for (int i = 0; i < freeAt.length; i++) {
      double gain = fields.gain(i);
      if (gain < least && (freeAt[i] <= step || gain < recordGain)) {
        least = gain;
        next = i;
      }
    }
    return next;
  }
}
