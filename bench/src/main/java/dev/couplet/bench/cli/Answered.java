package dev.couplet.bench.cli;

import dev.couplet.bench.instances.Instance;
import dev.couplet.form.Qubo;
import dev.couplet.lower.Lowering;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.Progress;
import dev.couplet.sampling.Watch.StopSignal;
import dev.couplet.solve.Answer;
import dev.couplet.solve.Solver;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.function.Consumer;
import java.util.function.LongSupplier;

/**
 * One run of the solver on a model, from the model to the plan.
 *
 * @param name the instance's name
 * @param form the form that the model is lowered to
 * @param effort what was asked for; its target is a value
 * @param answer what was found
 * @param seconds how long the solver ran, lowering and bounding included
 * @param hitSeconds when the target, or without one the best value, was first told of
 */
record Answered(
    String name, Qubo form, Effort effort, Answer answer, double seconds, OptionalDouble hitSeconds)
    implements Outcome {
  /**
   * Runs the solver.
   *
   * @param listener hears of the progress, too
   * @param clock in nanoseconds
   */
  static Answered make(
      Instance.OfModel instance, Effort effort, Consumer<Progress> listener, LongSupplier clock) {
    Sightings sightings = new Sightings(clock);
    Watch watch =
        Watch.stop(StopSignal.create()).progress(sightings.andThen(listener)).clock(clock);
    Answer answer = Solver.standard().solve(instance.statement(), effort, watch);
    double seconds = sightings.seconds();
    int sign = instance.statement().sense().sign();
    double wanted = sign * effort.target().orElse(answer.value());
    boolean reached = answer.plan().feasible() && sign * answer.value() <= wanted;
    OptionalDouble hit =
        reached
            ? OptionalDouble.of(sightings.firstAtMost(wanted).orElse(seconds))
            : OptionalDouble.empty();
    Qubo form = Lowering.standard().lower(instance.statement()).qubo();
    return new Answered(instance.name(), form, effort, answer, seconds, hit);
  }

  @Override
  public boolean reached() {
    return hitSeconds.isPresent();
  }

  @Override
  public OptionalDouble value() {
    return answer.plan().feasible() ? OptionalDouble.of(answer.value()) : OptionalDouble.empty();
  }

  private static OptionalDouble finite(double number) {
    return Double.isFinite(number) ? OptionalDouble.of(number) : OptionalDouble.empty();
  }

  @Override
  public List<String> cells() {
    return List.of(
        name,
        Integer.toString(form.size()),
        Integer.toString(form.pairs()),
        Methods.STANDARD,
        Long.toString(effort.seed()),
        Table.fixed(seconds, 3),
        Table.value(value()),
        Table.fixed(hitSeconds, 3),
        Table.value(finite(answer.bound())),
        Table.value(finite(answer.gap())),
        answer.proof().name().toLowerCase(Locale.ROOT));
  }
}
