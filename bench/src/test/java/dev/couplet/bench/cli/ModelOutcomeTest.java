package dev.couplet.bench.cli;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.Instance;
import dev.couplet.form.State;
import dev.couplet.model.Bit;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Sampler;
import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/** Rows of instances that are models, in the model's own sense. */
class ModelOutcomeTest {
  /** Maximise 5a + 4b + 3c, at most two of them: 9 by hand. */
  private static Instance.OfModel knapsack() {
    Model model = Model.named("two of three");
    Bit a = model.bit("a");
    Bit b = model.bit("b");
    Bit c = model.bit("c");
    model.require("room", sum(a, b, c).atMost(2));
    model.maximize("worth", sum(a.times(5), b.times(4), c.times(3)));
    return new Instance.OfModel("two", model.snapshot());
  }

  /** Exactly one of two, and both equal to a third: no plan. */
  private static Instance.OfModel contradiction() {
    Model model = Model.named("none");
    Family<Integer, Bit> x = model.bits("x", IntStream.range(0, 3).boxed().toList());
    model.require("odd", sum(x.of(0), x.of(1)).exactly(1));
    model.require("same", x.of(0).equalTo(x.of(2)));
    model.require("other", x.of(1).equalTo(x.of(2)));
    return new Instance.OfModel("none", model.snapshot());
  }

  private static Answered answered(Instance.OfModel instance, Effort effort) {
    return Answered.make(instance, effort, progress -> {}, System::nanoTime);
  }

  private static Attempt attempt(Instance.OfModel instance, String method, Effort effort) {
    return Attempt.make(
        Subject.of(instance), Methods.named(method), effort, progress -> {}, System::nanoTime);
  }

  @Test
  void theSolverAnswersInTheModelsSense() {
    Answered answered = answered(knapsack(), Effort.draws(4).seed(3));
    List<String> cells = answered.cells();
    assertEquals(List.of("two", "4"), cells.subList(0, 2));
    assertEquals(List.of("solver", "3"), cells.subList(3, 5));
    assertEquals("9", cells.get(6));
    assertEquals(List.of("9", "0", "optimal"), cells.subList(8, 11));
    assertTrue(answered.reached());
  }

  @Test
  void aTargetIsAValue() {
    assertTrue(answered(knapsack(), Effort.draws(4).target(9)).reached());
    assertFalse(answered(knapsack(), Effort.draws(4).target(9.5)).reached());
  }

  @Test
  void samplersWorkOnTheLoweredForm() {
    Attempt attempt = attempt(knapsack(), "enumeration", Effort.draws(1));
    assertEquals(OptionalDouble.of(9), attempt.value());
    assertEquals(List.of("9", "0", "optimal"), attempt.cells().subList(8, 11));
  }

  @Test
  void whereNoPlanKeepsTheRulesThereIsNoValue() {
    Answered answered = answered(contradiction(), Effort.draws(1));
    assertFalse(answered.reached());
    assertEquals(List.of("-", "-", "-", "-", "infeasible"), answered.cells().subList(6, 11));
    Attempt attempt = attempt(contradiction(), "enumeration", Effort.draws(1));
    assertFalse(attempt.reached());
    assertEquals(List.of("-", "-", "-", "-", "infeasible"), attempt.cells().subList(6, 11));
  }

  /** Nothing is proved by a sampler that just did not find a plan. */
  @Test
  void aSamplerWithoutAPlanProvesNothing() {
    Sampler one = (form, run) -> Draws.of(form, List.of(State.parse("1110")), End.DONE, 1);
    Attempt attempt =
        Attempt.make(
            Subject.of(knapsack()),
            new Methods.Method("one", one),
            Effort.draws(1),
            progress -> {},
            System::nanoTime);
    assertFalse(attempt.reached());
    assertEquals(List.of("-", "-", "-", "-", "none"), attempt.cells().subList(6, 11));
  }

  /** A sampler whose best state breaks the rule, and whose second does not. */
  @Test
  void aPlanThatBreaksARuleIsNoValue() {
    Sampler both =
        (form, run) ->
            Draws.of(form, List.of(State.parse("1110"), State.parse("1001")), End.DONE, 1);
    Attempt attempt =
        Attempt.make(
            Subject.of(knapsack()),
            new Methods.Method("both", both),
            Effort.draws(2),
            progress -> {},
            System::nanoTime);
    assertEquals(OptionalDouble.of(5), attempt.value());
  }
}
