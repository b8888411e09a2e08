package dev.couplet.bench.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.Instance;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.model.Statement.Sense;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Watch.Progress;
import java.time.Duration;
import java.util.List;
import java.util.OptionalDouble;
import java.util.concurrent.atomic.AtomicLong;
import java.util.function.Consumer;
import org.junit.jupiter.api.Test;

/** Times of attempts, on a clock that a sampler with a fixed story moves on. */
class AttemptTest {
  private static final Subject SUBJECT =
      Subject.of(
          new Instance.OfForm("story", Qubo.builder(1).addLinear(0, -10).build(), Sense.MAXIMIZE));

  private final AtomicLong now = new AtomicLong(1_000_000_000_000L);

  /**
   * After 1 s it tells of 0, after 3 s of -4 and after 5 s of -4 again; it ends at 7 s with -10.
   */
  private final Sampler storyteller =
      (form, run) -> {
        Consumer<Progress> listener = run.watch().listener();
        tell(listener, 1, 0);
        tell(listener, 2, -4);
        tell(listener, 2, -4);
        pass(2);
        return Draws.of(form, List.of(State.parse("1")), End.DONE, run.effort().seed());
      };

  private void tell(Consumer<Progress> listener, int seconds, double energy) {
    pass(seconds);
    listener.accept(
        new Progress(
            Duration.ZERO,
            OptionalDouble.empty(),
            OptionalDouble.of(energy),
            OptionalDouble.empty()));
  }

  private void pass(int seconds) {
    now.addAndGet(seconds * 1_000_000_000L);
  }

  private Attempt attempt(Effort effort) {
    return Attempt.make(
        SUBJECT, new Methods.Method("story", storyteller), effort, progress -> {}, now::get);
  }

  @Test
  void whatTheRunNeverToldOfCountsFromItsEnd() {
    Attempt attempt = attempt(Effort.draws(1));
    assertEquals(7, attempt.seconds());
    assertEquals(OptionalDouble.of(7), attempt.hitSeconds());
    assertTrue(attempt.reached());
  }

  @Test
  void aTargetIsHitWhenItIsFirstToldOf() {
    assertEquals(OptionalDouble.of(3), attempt(Effort.draws(1).target(-4)).hitSeconds());
    assertEquals(OptionalDouble.of(3), attempt(Effort.draws(1).target(-0.5)).hitSeconds());
    assertEquals(OptionalDouble.of(1), attempt(Effort.draws(1).target(0)).hitSeconds());
    assertEquals(OptionalDouble.of(7), attempt(Effort.draws(1).target(-4.5)).hitSeconds());
  }

  @Test
  void aTargetThatIsNotReachedIsNeverHit() {
    Attempt attempt = attempt(Effort.draws(1).target(-10.5));
    assertEquals(OptionalDouble.empty(), attempt.hitSeconds());
    assertFalse(attempt.reached());
  }

  @Test
  void cellsAreInTheInstancesOwnSense() {
    Attempt attempt = attempt(Effort.draws(1).seed(9));
    assertEquals(
        List.of("story", "1", "0", "story", "9", "7.000", "10", "7.000", "-", "-", "none"),
        attempt.cells());
    assertEquals(List.of("12.5", "2.5", "none"), attempt.bound(-12.5).cells().subList(8, 11));
    assertEquals(List.of("10", "0", "optimal"), attempt.bound(-10).cells().subList(8, 11));
    assertEquals(attempt, attempt.bound(Double.NEGATIVE_INFINITY));
  }

  @Test
  void anInfiniteBoundIsNone() {
    Draws draws =
        Draws.of(SUBJECT.form(), List.of(State.zeros(1)), End.DONE, 1)
            .bound(Double.NEGATIVE_INFINITY);
    Attempt attempt =
        new Attempt(SUBJECT, "story", Effort.draws(1), draws, 1, OptionalDouble.of(1));
    assertEquals(List.of("-", "-", "none"), attempt.cells().subList(8, 11));
  }

  @Test
  void theListenerHearsEverything() {
    int[] heard = {0};
    Attempt attempt =
        Attempt.make(
            SUBJECT,
            new Methods.Method("story", storyteller),
            Effort.draws(1),
            progress -> heard[0]++,
            now::get);
    assertEquals(3, heard[0]);
    assertEquals(OptionalDouble.of(10), attempt.value());
  }
}
