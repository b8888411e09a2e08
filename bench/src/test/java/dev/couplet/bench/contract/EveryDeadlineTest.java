package dev.couplet.bench.contract;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.bench.instances.Couplings;
import dev.couplet.bench.instances.Torus;
import dev.couplet.exact.Elimination;
import dev.couplet.exact.Enumeration;
import dev.couplet.form.Qubo;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Watch;
import java.time.Duration;
import java.util.Set;
import java.util.concurrent.atomic.AtomicLong;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Every sampler on a form that takes a while to set up, with a clock that moves a second a look:
 * wherever the deadline comes, the run knows it at the next look and returns something valid.
 */
class EveryDeadlineTest {
  private static final Qubo FORM =
      Torus.parse("torus:300x400").couple(Couplings.integers(1), 1).toQubo();

  /** They say how many variables are too many. */
  private static final Set<Class<? extends Sampler>> SMALL_ONLY =
      Set.of(Enumeration.class, Elimination.class);

  /** Looks of those that take their leave: stages that end, and tell how long they took. */
  private static final int LEAVE = 10;

  static Stream<Sampler> samplers() {
    return EverySamplerTest.samplers();
  }

  @ParameterizedTest
  @MethodSource("samplers")
  void endsAtTheLookThatFindsTheTimeUp(Sampler sampler) {
    if (SMALL_ONLY.contains(sampler.getClass())) {
      Effort effort = Effort.within(Duration.ofSeconds(1));
      String message =
          assertThrows(IllegalArgumentException.class, () -> sampler.sample(FORM, effort))
              .getMessage();
      assertTrue(message.contains("120000") || message.contains("120,000"), message);
      return;
    }
    for (int look = 1; look <= 20; look += 1 + look / 5) {
      AtomicLong clock = new AtomicLong(-1);
      Watch ticking = Watch.none().clock(() -> clock.incrementAndGet() * 1_000_000_000);
      Effort effort = Effort.within(Duration.ofSeconds(look));
      Draws draws = sampler.sample(FORM, Run.of(effort).watch(ticking));
      assertEquals(End.DEADLINE, draws.end());
      assertTrue(clock.get() <= look + LEAVE, "looks: " + clock.get() + " of " + look);
      for (Draw draw : draws) {
        assertEquals(FORM.value(draw.state()), draw.energy());
      }
    }
  }
}
