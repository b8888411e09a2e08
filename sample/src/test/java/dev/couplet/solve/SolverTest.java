package dev.couplet.solve;

import static dev.couplet.model.Expr.sum;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.exact.plans.Conflict;
import dev.couplet.exact.plans.PlanSearch;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.lower.Lowering;
import dev.couplet.lower.Weights;
import dev.couplet.model.Bit;
import dev.couplet.model.Choice;
import dev.couplet.model.Expr;
import dev.couplet.model.Family;
import dev.couplet.model.Model;
import dev.couplet.model.Plan;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.Progress;
import dev.couplet.sampling.Watch.StopSignal;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicLong;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class SolverTest {
  private static final Effort COUNTED = Effort.draws(64).seed(7);

  @Test
  void provesAQuadraticKnapsack() {
    // Glover, Kochenberger and Du (2019), section 5.5: value 28 at (1, 0, 1, 1).
    Model model = Model.named("quadratic knapsack");
    List<Bit> x = bits(model, 4);
    model.maximize(
        "value",
        sum(
            x.get(0).times(2),
            x.get(1).times(5),
            x.get(2).times(2),
            x.get(3).times(4),
            x.get(0).times(x.get(1)).times(8),
            x.get(0).times(x.get(2)).times(6),
            x.get(0).times(x.get(3)).times(10),
            x.get(1).times(x.get(2)).times(2),
            x.get(1).times(x.get(3)).times(6),
            x.get(2).times(x.get(3)).times(4)));
    model.require(
        "capacity",
        sum(x.get(0).times(8), x.get(1).times(6), x.get(2).times(5), x.get(3).times(3)).atMost(16));
    Answer answer = Solver.standard().solve(model, COUNTED);
    assertEquals(Proof.OPTIMAL, answer.proof());
    assertEquals(28, answer.value());
    assertEquals(28, answer.bound());
    assertEquals(0, answer.gap());
    assertTrue(answer.plan().value(x.get(0)) && !answer.plan().value(x.get(1)));
  }

  @Test
  void provesThatRulesCannotHoldTogether() {
    Model model = Model.named("contradiction");
    List<Bit> x = bits(model, 3);
    model.require("x1 or x2", x.get(0).plus(x.get(1)).atLeast(1));
    model.require("not x1", x.get(0).isFalse());
    model.require("not x2", x.get(1).isFalse());
    model.require("x3 where x1", x.get(0).implies(x.get(2)));
    Answer answer = Solver.standard().solve(model, COUNTED);
    assertEquals(Proof.INFEASIBLE, answer.proof());
    assertFalse(answer.plan().feasible());
    assertEquals(Double.POSITIVE_INFINITY, answer.gap());
    assertEquals(Double.POSITIVE_INFINITY, answer.bound(), "no value at all is reachable");
    Conflict conflict = answer.conflict().orElseThrow();
    assertEquals(List.of("x1 or x2", "not x1", "not x2"), conflict.rules());
    assertTrue(conflict.minimal());
  }

  @Test
  void tellsThatVansAreAlike() {
    Model model = Model.named("vans");
    List<Integer> villages = IntStream.range(0, 14).boxed().toList();
    Family<Integer, Choice<String>> vanOf =
        model.choices("van for", villages, List.of("red", "blue", "large", "green"));
    List<Expr> parts = new ArrayList<>();
    for (String van : List.of("red", "blue", "large", "green")) {
      Expr load = sum(villages, v -> vanOf.of(v).is(van).times(1 + v % 3));
      model.require("load of " + van, load.atMost(van.equals("large") ? 12 : 8));
      for (int v : villages) {
        for (int w = 0; w < v; w++) {
          parts.add(vanOf.of(v).is(van).times(vanOf.of(w).is(van)).times((v * w) % 5));
        }
      }
    }
    model.minimize("distance", sum(parts));
    Answer answer = Solver.standard().solve(model, COUNTED);
    String search = answer.stages().get(0).outcome();
    assertTrue(search.endsWith("alike: red, blue, green"), search);
  }

  @Test
  void drawsWherePlansAreTooManyAndProvesByTheBound() {
    // 14 parcels, 4 shelves, each parcel free on one of them: the optimum, 0, is the range's end.
    Model model = Model.named("shelves");
    List<Integer> parcels = IntStream.range(0, 14).boxed().toList();
    List<Integer> shelves = IntStream.range(0, 4).boxed().toList();
    Family<Integer, Choice<Integer>> shelfOf = model.choices("shelf of", parcels, shelves);
    List<Expr> costs = new ArrayList<>();
    for (int parcel : parcels) {
      for (int shelf : shelves) {
        costs.add(shelfOf.of(parcel).is(shelf).times(Math.abs(parcel % 4 - shelf)));
      }
    }
    model.minimize("walking", sum(costs));
    Answer answer = Solver.standard().solve(model, COUNTED);
    assertEquals(0, answer.bound());
    assertEquals(0, answer.value());
    assertEquals(Proof.OPTIMAL, answer.proof());
    assertEquals(End.DONE, answer.end(), "reaching the bound is no target of the caller's");
    assertEquals(
        answer.plan(), Solver.standard().solve(model, COUNTED.threads(2)).plan(), "two threads");
  }

  /** Plans cost something in an approximate penalty: nothing that is said may rest on the form. */
  @Test
  void approximatePenaltiesProveNothing() {
    Model model = Model.named("approximate");
    List<Bit> x = bits(model, 6000);
    model.minimize("taken", sum(x));
    Lowering rough = Lowering.standard();
    for (int i = 0; i < x.size(); i += 3) {
      Expr load = sum(x.get(i).times(3), x.get(i + 1).times(2), x.get(i + 2).times(2));
      model.require("load " + i, load.atMost(4));
      rough = rough.approximate("load " + i, 12, 5);
    }
    assertEquals(2000, rough.lower(model).approximate().size());
    assertFalse(PlanSearch.standard().fits(model.snapshot()), "searched, it would be proved");
    Effort effort = Effort.draws(2).sweeps(50).seed(7).target(0);
    Answer answer = Solver.standard().with(rough).solve(model, effort);
    assertEquals(0, answer.bound(), "taking nothing is feasible and costs 0");
    assertTrue(answer.value() > 0, "the form asks for loads of three, at energies below 0");
    assertEquals(Proof.NONE, answer.proof());
    assertEquals(End.DONE, answer.end());
  }

  @Test
  void maximisationBoundsFromAbove() {
    Model model = Model.named("large");
    List<Bit> x = bits(model, 30);
    List<Expr> parts = new ArrayList<>();
    for (int i = 0; i + 1 < x.size(); i++) {
      parts.add(x.get(i).times(2 + i % 3));
      parts.add(x.get(i).times(x.get(i + 1)).times(-3));
    }
    model.maximize("value", sum(parts));
    Answer answer = Solver.standard().solve(model, COUNTED);
    assertTrue(answer.plan().feasible());
    assertTrue(answer.bound() >= answer.value());
    assertEquals(answer.bound() - answer.value(), answer.gap());
  }

  @Test
  void anAnswerIsNeverWorseThanThePlanItStartsFrom() {
    Model model = Model.named("start");
    List<Bit> x = bits(model, 40);
    model.maximize("number", sum(x));
    for (int i = 0; i < 40; i += 2) {
      model.require("pair " + i, x.get(i).plus(x.get(i + 1)).atMost(1));
    }
    var draft = model.plan();
    for (int i = 0; i < 40; i++) {
      draft.set(x.get(i), i % 2 == 0);
    }
    Plan optimal = draft.evaluate();
    Answer answer = Solver.standard().from(optimal).solve(model, Effort.draws(1).sweeps(1));
    assertEquals(20, answer.value());
    Model other = Model.named("other");
    other.bit("x");
    assertThrows(
        IllegalArgumentException.class,
        () -> Solver.standard().from(optimal).solve(other, COUNTED));
  }

  /** Two large prizes that exclude each other, beside a sum too dense for a proof in few nodes. */
  @Test
  void aWeightThatIsTooLightIsNamedAndRaised() {
    SplittableRandom random = new SplittableRandom(5);
    Model model = Model.named("prizes");
    List<Bit> x = bits(model, 46);
    List<Expr> parts = new ArrayList<>();
    for (int i = 0; i < x.size(); i++) {
      parts.add(x.get(i).times(i < 2 ? 20_000 : random.nextInt(-50, 51)));
      for (int j = 2; j < i; j++) {
        parts.add(x.get(i).times(x.get(j)).times(random.nextInt(-50, 51)));
      }
    }
    model.maximize("value", sum(parts));
    model.require("one prize", x.get(0).plus(x.get(1)).atMost(1));
    Answer answer = Solver.standard().solve(model, COUNTED);
    List<String> raised =
        answer.stages().stream()
            .filter(stage -> stage.name().equals("weights"))
            .map(Stage::outcome)
            .toList();
    assertFalse(raised.isEmpty());
    raised.forEach(told -> assertEquals("too light, raised: that of 'one prize'", told));
    assertTrue(answer.plan().feasible());
    assertTrue(answer.plan().value(x.get(0)) != answer.plan().value(x.get(1)));
    Answer asGiven =
        Solver.standard()
            .with(Lowering.standard().with(Weights.rangeBound()))
            .solve(model, COUNTED);
    assertTrue(asGiven.stages().stream().noneMatch(stage -> stage.name().equals("weights")));
  }

  @Test
  void aStopBeforeTheStartIsHonoured() {
    StopSignal stop = StopSignal.create();
    stop.stop();
    for (int size : new int[] {3, 40}) {
      Model model = Model.named("stopped");
      model.minimize("number", sum(bits(model, size)));
      Answer answer = Solver.standard().solve(model, COUNTED, Watch.stop(stop));
      assertEquals(End.STOPPED, answer.end());
      assertTrue(answer.bound() <= answer.value());
    }
  }

  @Test
  void theDeadlineGoesByTheGivenClock() {
    AtomicLong now = new AtomicLong();
    Model model = Model.named("deadline");
    List<Bit> x = bits(model, 60);
    model.minimize("number", sum(x).times(sum(x).plus(-30)));
    Watch watch = Watch.none().clock(() -> now.addAndGet(1_000_000));
    Answer answer = Solver.standard().solve(model, Effort.within(Duration.ofMillis(200)), watch);
    assertEquals(End.DEADLINE, answer.end());
    assertEquals(Proof.NONE, answer.proof());
  }

  @Test
  void aListenersExceptionReachesTheCaller() {
    Model model = Model.named("listener");
    List<Bit> x = bits(model, 18);
    model.minimize("number", sum(x));
    Watch watch =
        Watch.none()
            .progress(
                (Progress p) -> {
                  throw new IllegalStateException("the listener failed");
                });
    assertThrows(IllegalStateException.class, () -> Solver.standard().solve(model, COUNTED, watch));
  }

  @Test
  void aModelWithoutDecisionsHasOnePlan() {
    Model model = Model.named("nothing");
    model.minimize("constant", Expr.constant(3));
    Answer answer = Solver.standard().solve(model, COUNTED);
    assertEquals(3, answer.value());
    assertEquals(Proof.OPTIMAL, answer.proof());
  }

  @Test
  void theFrustratedTriangleHasSixGroundStates() {
    // s1 s2 + s2 s3 + s1 s3: minimum -1, six ground states (common practice).
    Ising triangle = Ising.builder(3).addPair(0, 1, 1).addPair(1, 2, 1).addPair(0, 2, 1).build();
    Draws draws = Solver.standard().sample(triangle.toQubo(), Effort.draws(1));
    assertEquals(-1, draws.best().energy());
    assertTrue(draws.proved());
    assertEquals(6, draws.rows().size());
  }

  @Test
  void boundsAFormThatIsTooLargeToEnumerate() {
    Qubo.Builder chain = Qubo.builder(60);
    for (int i = 0; i + 1 < 60; i++) {
      chain.addLinear(i, -1).addPair(i, i + 1, 2);
    }
    Draws draws = Solver.standard().sample(chain.build(), COUNTED);
    assertTrue(draws.bound().isPresent());
    assertEquals(-30, draws.best().energy(), "every other of the 59 rewarded bits of a path");
    assertTrue(draws.bound().getAsDouble() <= -30);
  }

  private static List<Bit> bits(Model model, int count) {
    List<Bit> bits = new ArrayList<>();
    for (int i = 1; i <= count; i++) {
      bits.add(model.bit("x" + i));
    }
    return bits;
  }
}
