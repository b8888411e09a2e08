package dev.couplet.audit;

import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Vigil;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Looks at every state of a small form: a method with a limit, that needs no seed, returns one draw
 * and proves it.
 */
final class ProvingSampler implements Sampler {
  private static final int LIMIT = 12;

  @Override
  public Draws sample(Qubo form, Run run) {
    if (form.size() > LIMIT) {
      throw new IllegalArgumentException(
          "the form has " + form.size() + " variables, at most " + LIMIT + " can be enumerated");
    }
    run.requireFit(form.size());
    Vigil vigil = run.begin();
    State best = run.starts().isEmpty() ? State.zeros(form.size()) : run.starts().get(0);
    double target = run.effort().target().orElse(Double.NEGATIVE_INFINITY);
    long word = 0;
    while (word < 1L << form.size() && !vigil.over()) {
      State state = state(form.size(), word++);
      best = form.value(state) < form.value(best) ? state : best;
      if (form.value(best) <= target) {
        vigil.end(End.TARGET);
      }
      vigil.report(OptionalDouble.empty(), OptionalDouble.empty(), OptionalDouble.empty());
    }
    Draws draws = Draws.of(form, List.of(best), vigil.reason(), run.effort().seed());
    boolean whole = word == 1L << form.size();
    return whole ? draws.bound(draws.best().energy()) : draws;
  }

  private static State state(int size, long word) {
    return size == 0 ? State.zeros(0) : State.ofWords(size, word);
  }
}
