package dev.couplet.bench.cli;

import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.Progress;
import dev.couplet.sampling.Watch.StopSignal;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.Consumer;
import java.util.function.LongSupplier;

/**
 * One run of one method on one instance, and how it is told in a row.
 *
 * @param subject what was sampled
 * @param method the method's name
 * @param effort what was asked for; its target is an energy
 * @param draws what was found
 * @param seconds how long the method ran
 * @param hitSeconds when the target, or without one the best energy, was first told of
 */
record Attempt(
    Subject subject,
    String method,
    Effort effort,
    Draws draws,
    double seconds,
    OptionalDouble hitSeconds)
    implements Outcome {
  /**
   * Runs a method.
   *
   * @param listener hears of the progress, too
   * @param clock in nanoseconds
   */
  static Attempt make(
      Subject subject,
      Methods.Method method,
      Effort effort,
      Consumer<Progress> listener,
      LongSupplier clock) {
    Sightings sightings = new Sightings(clock);
    Watch watch =
        Watch.stop(StopSignal.create()).progress(sightings.andThen(listener)).clock(clock);
    Run run = Run.of(effort).watch(watch).structure(subject.structure());
    Draws draws = method.sampler().sample(subject.form(), run);
    double seconds = sightings.seconds();
    OptionalDouble value = subject.best().apply(draws);
    double best = value.isPresent() ? subject.turn(value.getAsDouble()) : Double.POSITIVE_INFINITY;
    double wanted = effort.target().orElse(best);
    OptionalDouble hit =
        value.isPresent() && best <= wanted
            ? OptionalDouble.of(sightings.firstAtMost(wanted).orElse(seconds))
            : OptionalDouble.empty();
    return new Attempt(subject, method.name(), effort, draws, seconds, hit);
  }

  @Override
  public boolean reached() {
    return hitSeconds.isPresent();
  }

  /** This attempt with a bound that was proved apart from it; no effect if it is infinite. */
  Attempt bound(double lowerBound) {
    Draws bounded = Double.isInfinite(lowerBound) ? draws : draws.bound(lowerBound);
    return new Attempt(subject, method, effort, bounded, seconds, hitSeconds);
  }

  @Override
  public OptionalDouble value() {
    return subject.best().apply(draws);
  }

  /**
   * Whether no plan keeps the rules: the weights of the standard lowering are proved to suffice, so
   * that the lowest state of the form stands for a feasible plan if there is one.
   */
  private boolean infeasible() {
    return draws.proved() && value().isEmpty();
  }

  /** A proved bound on every value, if there is one that says anything. */
  OptionalDouble bound() {
    OptionalDouble bound = draws.bound();
    return !infeasible() && bound.isPresent() && Double.isFinite(bound.getAsDouble())
        ? OptionalDouble.of(subject.turn(bound.getAsDouble()))
        : OptionalDouble.empty();
  }

  /** How far value and bound are apart, if there are both. */
  private static OptionalDouble gap(OptionalDouble value, OptionalDouble bound) {
    return value.isPresent() && bound.isPresent()
        ? OptionalDouble.of(Math.abs(value.getAsDouble() - bound.getAsDouble()))
        : OptionalDouble.empty();
  }

  @Override
  public List<String> cells() {
    OptionalDouble value = value();
    OptionalDouble gap = gap(value, bound());
    return List.of(
        subject.name(),
        Integer.toString(subject.form().size()),
        Integer.toString(subject.form().pairs()),
        method,
        Long.toString(effort.seed()),
        Table.fixed(seconds, 3),
        Table.value(value),
        Table.fixed(hitSeconds, 3),
        Table.value(bound()),
        Table.value(gap),
        proof(gap));
  }

  private String proof(OptionalDouble gap) {
    if (infeasible()) {
      return "infeasible";
    }
    return gap.equals(OptionalDouble.of(0)) ? "optimal" : "none";
  }
}
