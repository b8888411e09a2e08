package dev.couplet.embed.path;

import dev.couplet.embed.Embedding;
import dev.couplet.embed.Guest;
import dev.couplet.host.Host;
import dev.couplet.sampling.Vigil;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.SplittableRandom;

/**
 * One attempt from scratch.
 *
 * <p>The first sweep lays all guest vertices from the inside of the guest outwards; each further
 * one lifts and lays them one by one in random order, overlap allowed but priced. A cycle of sweeps
 * ends when no overlap is left, or after some number of them; then the prices are eased and the
 * trees, still in place, negotiate again. So the same means that remove the overlap make the
 * embedding smaller afterwards. The attempt ends when that no longer helps.
 */
final class Attempt {
  private static final int CYCLE = 60;
  private static final int PATIENCE = 6;
  private static final double[] EASED = {1, 0.5};

  private final Guest guest;
  private final Host host;
  private final int sweeps;
  private final double target;
  private final Vigil vigil;
  private final SplittableRandom random;
  private final Prices prices;
  private final Trees trees;
  private final Router router;
  private final int[] order;
  private Optional<Embedding> best = Optional.empty();
  private OptionalInt leastOverlap = OptionalInt.empty();
  private int inVain;

  Attempt(Guest guest, Host host, int sweeps, double target, Vigil vigil, SplittableRandom random) {
    this.guest = guest;
    this.host = host;
    this.sweeps = sweeps;
    this.target = target;
    this.vigil = vigil;
    this.random = random;
    this.prices = new Prices(host);
    this.trees = new Trees(guest.vertices(), host.vertices(), prices);
    Homes homes = new Homes(guest.graph(), host, random);
    this.router = new Router(guest.graph(), host, trees, prices, homes, new Pace(vigil), random);
    this.order = new int[guest.vertices()];
  }

  /** The best embedding found, if any. */
  Optional<Embedding> best() {
    return best;
  }

  /** The least overlap after any sweep; empty if none was completed. */
  OptionalInt leastOverlap() {
    return leastOverlap;
  }

  void run() {
    orderBreadthFirst();
    int inCycle = 0;
    int cycles = 0;
    for (int sweep = 0; sweep < sweeps && sweep(sweep); sweep++) {
      inCycle++;
      leastOverlap =
          OptionalInt.of(Math.min(prices.overlap(), leastOverlap.orElse(prices.overlap())));
      if (prices.overlap() > 0 && inCycle < CYCLE) {
        prices.raise();
        continue;
      }
      keepIfBetter();
      if (inVain == PATIENCE || reachedTarget()) {
        return;
      }
      prices.ease(EASED[cycles++ % EASED.length]);
      inCycle = 0;
    }
  }

  /** One pass over all guest vertices; false if the run is over. */
  private boolean sweep(int number) {
    if (number > 0) {
      shuffle();
    }
    for (int v : order) {
      router.lift(v);
      if (!router.lay(v)) {
        return false;
      }
    }
    double share = (number + 1.0) / sweeps;
    OptionalDouble value = best.stream().mapToDouble(Embedding::total).findFirst();
    vigil.report(OptionalDouble.of(share), value, OptionalDouble.empty());
    return !vigil.over();
  }

  private void keepIfBetter() {
    if (prices.overlap() == 0) {
      List<int[]> sets = new ArrayList<>();
      for (int v = 0; v < order.length; v++) {
        sets.add(trees.vertices(v));
      }
      Embedding found = Embedding.of(guest, host, sets).trimmed();
      if (best.isEmpty() || better(found, best.get())) {
        best = Optional.of(found);
        inVain = 0;
        return;
      }
    }
    inVain += best.isPresent() ? 1 : 0;
  }

  private boolean reachedTarget() {
    return best.isPresent() && best.get().total() <= target;
  }

  private static boolean better(Embedding one, Embedding other) {
    return one.total() != other.total()
        ? one.total() < other.total()
        : one.longest() < other.longest();
  }

  private void shuffle() {
    for (int i = order.length - 1; i > 0; i--) {
      int j = random.nextInt(i + 1);
      int moved = order[i];
      order[i] = order[j];
      order[j] = moved;
    }
  }

  /** Sets the order of the first sweep: breadth first from random vertices. */
  private void orderBreadthFirst() {
    Arrays.setAll(order, v -> v);
    shuffle();
    int[] firsts = order.clone();
    boolean[] queued = new boolean[order.length];
    int tail = 0;
    for (int first : firsts) {
      int head = tail;
      if (!queued[first]) {
        queued[first] = true;
        order[tail++] = first;
      }
      for (; head < tail; head++) {
        for (int w : guest.graph().neighbours(order[head])) {
          if (!queued[w]) {
            queued[w] = true;
            order[tail++] = w;
          }
        }
      }
    }
  }
}
