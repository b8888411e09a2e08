package dev.couplet.bench.cli;

import dev.couplet.bench.instances.Instance;
import dev.couplet.form.Qubo;
import dev.couplet.lower.Lowered;
import dev.couplet.lower.Lowering;
import dev.couplet.model.Plan;
import dev.couplet.model.Statement.Sense;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Structure;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.Function;

/**
 * What a sampler is given of an instance, and how its draws read.
 *
 * @param name the instance's name
 * @param form the form that is sampled
 * @param structure what is known of it
 * @param sense the instance's own
 * @param best the best value among draws, in the instance's own sense and units; empty if none of
 *     them stands for a feasible plan
 */
record Subject(
    String name,
    Qubo form,
    Structure structure,
    Sense sense,
    Function<Draws, OptionalDouble> best) {
  /**
   * The form of an instance; models are lowered.
   *
   * @throws IllegalArgumentException if a model cannot be lowered
   */
  static Subject of(Instance instance) {
    if (instance instanceof Instance.OfForm plain) {
      return new Subject(
          plain.name(),
          plain.form(),
          Structure.none(),
          plain.sense(),
          draws -> OptionalDouble.of(plain.value(draws.best().energy())));
    }
    Instance.OfModel model = (Instance.OfModel) instance;
    Lowered lowered = Lowering.standard().lower(model.statement());
    return new Subject(
        model.name(),
        lowered.qubo(),
        lowered.structure(),
        model.statement().sense(),
        draws -> best(lowered, draws));
  }

  private static OptionalDouble best(Lowered lowered, Draws draws) {
    List<Plan> feasible = lowered.read(draws).feasible();
    return feasible.isEmpty() ? OptionalDouble.empty() : OptionalDouble.of(feasible.get(0).value());
  }

  /** An energy as a value, or a value as an energy. */
  double turn(double number) {
    return sense.sign() * number + 0.0;
  }
}
