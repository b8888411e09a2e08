package dev.couplet.bench.cli;

import dev.couplet.bench.instances.Instance;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Progress;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.StopSignal;
import dev.couplet.sampling.Watch;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.Consumer;
import java.util.function.LongSupplier;

/**
 * One run of one method on one instance, and how it is told in a row.
 *
 * @param instance what was solved
 * @param method the method's name
 * @param effort what was asked for; its target is an energy
 * @param draws what was found
 * @param seconds how long the method ran
 * @param hitSeconds when the target, or without one the best energy, was first told of
 */
record Attempt(
    Instance instance,
    String method,
    Effort effort,
    Draws draws,
    double seconds,
    OptionalDouble hitSeconds) {
  /** The columns of a row. */
  static final List<String> COLUMNS =
      List.of(
          "instance",
          "n",
          "pairs",
          "method",
          "seed",
          "seconds",
          "value",
          "hit_seconds",
          "bound",
          "gap",
          "proof");

  /**
   * Runs a method.
   *
   * @param listener hears of the progress, too
   * @param clock in nanoseconds
   */
  static Attempt make(
      Instance instance,
      Methods.Method method,
      Effort effort,
      Consumer<Progress> listener,
      LongSupplier clock) {
    Sightings sightings = new Sightings(clock);
    Watch watch =
        Watch.stop(StopSignal.create()).progress(sightings.andThen(listener)).clock(clock);
    Draws draws = method.sampler().sample(instance.form(), Run.of(effort).watch(watch));
    double seconds = sightings.seconds();
    double best = draws.best().energy();
    double wanted = effort.target().orElse(best);
    OptionalDouble hit =
        best <= wanted
            ? OptionalDouble.of(sightings.firstAtMost(wanted).orElse(seconds))
            : OptionalDouble.empty();
    return new Attempt(instance, method.name(), effort, draws, seconds, hit);
  }

  /** Whether the target was reached, if there was one. */
  boolean reached() {
    return hitSeconds.isPresent();
  }

  /** This attempt with a bound that was proved apart from it; no effect if it is infinite. */
  Attempt bound(double lowerBound) {
    Draws bounded = Double.isInfinite(lowerBound) ? draws : draws.bound(lowerBound);
    return new Attempt(instance, method, effort, bounded, seconds, hitSeconds);
  }

  /** The best value, in the instance's own sense and units. */
  double value() {
    return instance.value(draws.best().energy());
  }

  /** A proved bound on every value, if there is one that says anything. */
  OptionalDouble bound() {
    OptionalDouble bound = draws.bound();
    return bound.isPresent() && Double.isFinite(bound.getAsDouble())
        ? OptionalDouble.of(instance.value(bound.getAsDouble()))
        : OptionalDouble.empty();
  }

  /** How far value and bound are apart, if there is a bound. */
  OptionalDouble gap() {
    OptionalDouble bound = bound();
    return bound.isPresent()
        ? OptionalDouble.of(Math.abs(value() - bound.getAsDouble()))
        : OptionalDouble.empty();
  }

  /** The row under {@link #COLUMNS}. */
  List<String> cells() {
    return List.of(
        instance.name(),
        Integer.toString(instance.form().size()),
        Integer.toString(instance.form().pairs()),
        method,
        Long.toString(effort.seed()),
        Table.fixed(seconds, 3),
        Table.value(value()),
        Table.fixed(hitSeconds, 3),
        Table.value(bound()),
        Table.value(gap()),
        draws.proved() ? "optimal" : "none");
  }
}
