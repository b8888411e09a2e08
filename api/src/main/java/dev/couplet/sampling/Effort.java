package dev.couplet.sampling;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.SplittableRandom;

/**
 * How much work a sampler may do: a value.
 *
 * <p>An effort is counted (a number of draws, each of a number of sweeps) or timed, or both; then
 * what comes first ends the run. What is left open is the method's choice. A target ends the run at
 * the lowest-numbered draw that reaches it. A counted effort gives the same draws for the same
 * seed, whatever the number of threads.
 *
 * <p>Immutable.
 */
public final class Effort {
  private final OptionalInt draws;
  private final OptionalInt sweeps;
  private final Optional<Duration> limit;
  private final OptionalDouble target;
  private final long seed;
  private final int threads;

  private Effort(
      OptionalInt draws,
      OptionalInt sweeps,
      Optional<Duration> limit,
      OptionalDouble target,
      long seed,
      int threads) {
    this.draws = draws;
    this.sweeps = sweeps;
    this.limit = limit;
    this.target = target;
    this.seed = seed;
    this.threads = threads;
  }

  private static Effort open() {
    return new Effort(
        OptionalInt.empty(), OptionalInt.empty(), Optional.empty(), OptionalDouble.empty(), 1, 1);
  }

  /** A counted effort: so many independent repetitions, with seed 1 on one thread. */
  public static Effort draws(int draws) {
    Check.positive("the number of draws", draws);
    return new Effort(
        OptionalInt.of(draws), OptionalInt.empty(), Optional.empty(), OptionalDouble.empty(), 1, 1);
  }

  /** A timed effort: as many draws as fit into the time, with seed 1 on one thread. */
  public static Effort within(Duration limit) {
    return open().limit(limit);
  }

  /** This effort with so many passes over all spins in each draw. */
  public Effort sweeps(int newSweeps) {
    Check.positive("the number of sweeps", newSweeps);
    return new Effort(draws, OptionalInt.of(newSweeps), limit, target, seed, threads);
  }

  /** This effort, ended after a time at the latest. */
  public Effort limit(Duration newLimit) {
    Check.positive("the time limit", newLimit);
    return new Effort(draws, sweeps, Optional.of(newLimit), target, seed, threads);
  }

  /** This effort, ended by the first draw whose energy is at most {@code energy}. */
  public Effort target(double energy) {
    Check.number("the target", energy);
    return new Effort(draws, sweeps, limit, OptionalDouble.of(energy), seed, threads);
  }

  /** This effort without a target. */
  public Effort withoutTarget() {
    return new Effort(draws, sweeps, limit, OptionalDouble.empty(), seed, threads);
  }

  /** This effort with another seed. */
  public Effort seed(long newSeed) {
    return new Effort(draws, sweeps, limit, target, newSeed, threads);
  }

  /** This effort on so many threads; they begin and end with the run. */
  public Effort threads(int newThreads) {
    Check.positive("the number of threads", newThreads);
    return new Effort(draws, sweeps, limit, target, seed, newThreads);
  }

  /** The number of draws, if counted. */
  public OptionalInt draws() {
    return draws;
  }

  /** The number of passes over all spins in a draw, if it is not left to the method. */
  public OptionalInt sweeps() {
    return sweeps;
  }

  /** The time limit, if there is one. */
  public Optional<Duration> limit() {
    return limit;
  }

  /** The energy at which the run may end, if there is one. */
  public OptionalDouble target() {
    return target;
  }

  /** The seed of all random numbers. */
  public long seed() {
    return seed;
  }

  /** The number of threads. */
  public int threads() {
    return threads;
  }

  /**
   * This effort as {@code parts} efforts to be spent one after the other: draws and time are shared
   * out (at least one draw each), seeds differ and follow from this one's.
   */
  public List<Effort> split(int parts) {
    Check.positive("the number of parts", parts);
    SplittableRandom seeds = new SplittableRandom(seed);
    List<Effort> shares = new ArrayList<>(parts);
    for (int p = 0; p < parts; p++) {
      shares.add(share(p, parts, seeds.nextLong()));
    }
    return List.copyOf(shares);
  }

  private Effort share(int part, int parts, long partSeed) {
    OptionalInt own = draws;
    if (draws.isPresent()) {
      int all = draws.getAsInt();
      int even = all / parts + (part < all % parts ? 1 : 0);
      own = OptionalInt.of(Math.max(1, even));
    }
    Optional<Duration> time = limit.map(all -> all.dividedBy(parts)).filter(d -> !d.isZero());
    if (limit.isPresent() && time.isEmpty()) {
      time = Optional.of(Duration.ofNanos(1));
    }
    return new Effort(own, sweeps, time, target, partSeed, threads);
  }

  @Override
  public boolean equals(Object object) {
    return object instanceof Effort other
        && draws.equals(other.draws)
        && sweeps.equals(other.sweeps)
        && limit.equals(other.limit)
        && target.equals(other.target)
        && seed == other.seed
        && threads == other.threads;
  }

  @Override
  public int hashCode() {
    return Objects.hash(draws, sweeps, limit, target, seed, threads);
  }

  @Override
  public String toString() {
    StringBuilder text = new StringBuilder("Effort(");
    draws.ifPresent(d -> text.append(d).append(" draws, "));
    sweeps.ifPresent(s -> text.append(s).append(" sweeps, "));
    limit.ifPresent(l -> text.append("within ").append(l).append(", "));
    target.ifPresent(t -> text.append("target ").append(t).append(", "));
    return text.append("seed ")
        .append(seed)
        .append(", threads ")
        .append(threads)
        .append(')')
        .toString();
  }
}
