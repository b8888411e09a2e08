package dev.couplet.exact;

import dev.couplet.bound.Rounding;
import dev.couplet.sampling.Vigil;
import java.util.Arrays;
import java.util.OptionalDouble;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.atomic.AtomicLong;

/**
 * One enumeration of a state space for its lowest levels.
 *
 * <p>The space is cut into parts by its highest variables, always the same ones, so that the result
 * does not depend on the number of threads. A part is walked in chunks. A first pass over a chunk
 * keeps only the least energy of each lane; most chunks hold nothing below the threshold and are
 * done with. Otherwise a second pass looks at the states of the lanes that do.
 */
final class Search {
  private static final int CHUNK = 32;
  private static final int PARTS = 64;

  private final StateSpace space;
  private final int levels;
  private final int keep;
  private final double target;
  private final Vigil vigil;
  private final double margin;
  private final boolean exact;
  private final Tally[] found;

  /** No state above this matters: other parts know enough below. As bits, lowered only. */
  private final AtomicLong ceiling;

  private final AtomicInteger hitPart = new AtomicInteger(Integer.MAX_VALUE);
  private final AtomicLong chunksDone = new AtomicLong();

  /**
   * A search for so many lowest levels.
   *
   * @param ceiling states above this energy need not be found
   */
  Search(
      StateSpace space, int levels, int keep, OptionalDouble target, double ceiling, Vigil vigil) {
    this.space = space;
    this.levels = levels;
    this.keep = keep;
    this.target = target.orElse(Double.NEGATIVE_INFINITY);
    this.ceiling = new AtomicLong(Double.doubleToRawLongBits(ceiling));
    this.vigil = vigil;
    this.exact = space.form.exact();
    this.margin = marginOf(space);
    this.found = new Tally[(int) Math.min(PARTS, chunks())];
  }

  /** Between an energy of the walk and the same one from the original coefficients. */
  private static double marginOf(StateSpace space) {
    long terms = (long) space.form.size() + space.form.pairs();
    return Rounding.ofEnergy(space.form) + Rounding.ofSums(space.form, terms + 8);
  }

  private long chunks() {
    return Math.max(1, space.blocks() / CHUNK);
  }

  /** Does the work; a run that ends early has looked at some of the states only. */
  Tally run(int threads) {
    Crew.run(threads, found.length, this::part, vigil);
    Tally all = new Tally(levels, keep);
    int last = Math.min(hitPart.get(), found.length - 1);
    for (int p = 0; p <= last; p++) {
      if (found[p] != null) {
        all.addAll(found[p]);
      }
    }
    return all;
  }

  private double ceiling() {
    return Double.longBitsToDouble(ceiling.get());
  }

  /**
   * Tells the other parts of a threshold. Not if there is a target: the first state that reaches it
   * must not be left out because a later one is better.
   */
  private void lowerCeiling(double to) {
    if (target == Double.NEGATIVE_INFINITY) {
      ceiling.accumulateAndGet(
          Double.doubleToRawLongBits(to),
          (a, b) -> Double.longBitsToDouble(a) <= Double.longBitsToDouble(b) ? a : b);
    }
  }

  private void part(int part) {
    found[part] = new Tally(levels, keep);
    new Part(part).walk();
  }

  /** One part of the space, on one thread. */
  private final class Part {
    private final int part;
    private final Tally tally;
    private final Cursor cursor;
    private final double[] least = new double[1 << space.low];
    private final int[] lane = new int[1 << space.low];
    private final long blocks = Math.min(CHUNK, space.blocks());
    private int lanes;
    private int steps;

    Part(int part) {
      this.part = part;
      this.tally = found[part];
      this.cursor = new Cursor(space, 0);
    }

    void walk() {
      long perPart = chunks() / found.length;
      for (long c = part * perPart; c < (part + 1) * perPart; c++) {
        if (vigil.over() || hitPart.get() < part) {
          return;
        }
        survey(c * blocks);
        if (lanes > 0) {
          examine(c * blocks);
          lowerCeiling(tally.threshold());
        }
        report();
      }
    }

    private void report() {
      double share = (double) chunksDone.incrementAndGet() / chunks();
      OptionalDouble best =
          tally.size() == 0 ? OptionalDouble.empty() : OptionalDouble.of(tally.energy(0));
      vigil.report(OptionalDouble.of(share), best, OptionalDouble.empty());
    }

    /** Finds the lanes that have a state at or below the threshold. */
    private void survey(long first) {
      Arrays.fill(least, Double.POSITIVE_INFINITY);
      seek(first);
      for (long b = 0; b < blocks; b++) {
        if (b > 0) {
          cursor.next();
        }
        Lanes.lower(cursor.energies(), space.step[0], cursor.middleField(), least);
      }
      double limit = limit();
      lanes = 0;
      for (int j = 0; j < least.length; j++) {
        if (least[j] <= limit) {
          lane[lanes++] = j;
        }
      }
    }

    /** The highest walked energy that can matter, after a survey. */
    private double limit() {
      double limit = Math.min(tally.threshold(), ceiling()) + margin;
      if (levels > 1 || target != Double.NEGATIVE_INFINITY) {
        return limit;
      }
      double lowest = Double.POSITIVE_INFINITY;
      for (double energy : least) {
        lowest = Math.min(lowest, energy);
      }
      return Math.min(limit, lowest + 2 * margin);
    }

    private void seek(long block) {
      if (block == cursor.block() + 1) {
        cursor.next();
      } else {
        cursor.jump(block);
      }
    }

    private void examine(long first) {
      cursor.jump(first);
      for (long b = 0; b < blocks; b++) {
        if (b > 0) {
          cursor.next();
        }
        double[] energies = cursor.energies();
        double field = cursor.middleField();
        for (int k = 0; k < lanes; k++) {
          int j = lane[k];
          double energy = energies[j];
          consider(energy, j, 0);
          consider(energy + (space.step[0][j] + field), j, 1);
        }
        if (hitPart.get() <= part || cutShort()) {
          return;
        }
      }
    }

    private void consider(double walked, int lane, int middle) {
      if (walked > tally.threshold() + margin
          || walked > ceiling() + margin
          || hitPart.get() <= part) {
        return;
      }
      long number = space.number(cursor.block(), lane, middle);
      double energy = exact ? walked : recomputed(number);
      tally.add(energy, number);
      if (energy <= target) {
        hitPart.accumulateAndGet(part, Math::min);
      }
    }

    private double recomputed(long number) {
      steps += space.form.size() + space.form.pairs();
      return space.energy(number);
    }

    /** Looks at the clock again if energies were recomputed since. */
    private boolean cutShort() {
      if (steps < Vigil.STEPS / 4) {
        return false;
      }
      steps = 0;
      return vigil.over();
    }
  }
}
