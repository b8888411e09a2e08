package dev.couplet.bond;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.couplet.embed.Embedding;
import dev.couplet.embed.Guest;
import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import dev.couplet.host.CompactGraph;
import dev.couplet.host.Host;
import dev.couplet.sampling.Draw;
import dev.couplet.sampling.Draws;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Run;
import dev.couplet.sampling.Sampler;
import dev.couplet.sampling.Vigil;
import dev.couplet.sampling.Watch;
import dev.couplet.sampling.Watch.Progress;
import dev.couplet.sampling.Watch.StopSignal;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;

class HostedSamplerTest {
  /** Random states, or the starts as they are; plain, and by the contract of samplers. */
  private static final Sampler RANDOM = HostedSamplerTest::randomStates;

  private static Draws randomStates(Qubo form, Run run) {
    Vigil vigil = run.begin();
    SplittableRandom random = new SplittableRandom(run.effort().seed());
    List<State> states = new ArrayList<>();
    for (int k = 0; k < run.effort().draws().orElse(1); k++) {
      boolean[] values = new boolean[form.size()];
      for (int i = 0; i < values.length; i++) {
        values[i] = random.nextBoolean();
      }
      State state =
          run.starts().isEmpty() ? State.of(values) : run.starts().get(k % run.starts().size());
      states.add(state);
      if (vigil.over()) {
        break;
      }
    }
    return Draws.of(form, states, vigil.reason(), run.effort().seed());
  }

  /** A triangle on a path of four: the second vertex of the last edge is doubled. */
  private static Embedding triangle() {
    CompactGraph ring = CompactGraph.builder(4).edge(0, 1).edge(1, 2).edge(2, 3).edge(0, 3).build();
    CompactGraph guest = CompactGraph.builder(3).edge(0, 1).edge(1, 2).edge(0, 2).build();
    return Embedding.of(
        new Guest("complete:3", guest),
        Host.of("ring", ring),
        List.of(new int[] {0}, new int[] {1}, new int[] {2, 3}));
  }

  private static Qubo frustrated() {
    return Ising.builder(3).addPair(0, 1, 1).addPair(1, 2, 1).addPair(0, 2, 1).build().toQubo();
  }

  @Test
  void energiesAreTheGuestsAndTornSetsAreCounted() {
    HostedSampler sampler = HostedSampler.on(triangle(), RANDOM);
    HostedDraws observed = sampler.observe(frustrated(), Run.of(Effort.draws(4000).seed(3)));
    assertEquals(4000, observed.draws().total());
    for (Draw draw : observed.draws()) {
      assertEquals(frustrated().value(draw.state()), draw.energy());
    }
    assertEquals(0, observed.tornShares().get(0));
    assertEquals(0, observed.tornShares().get(1));
    // Two independent fair spins disagree in half of 4,000 draws; five standard deviations are
    // 0.04.
    assertEquals(0.5, observed.tornShares().get(2), 0.04);
    assertEquals(observed.tornShares().get(2) / 3, observed.tornShare(), 1e-12);
  }

  @Test
  void readbackByLocalFieldIsNoWorseThanByMajority() {
    SplittableRandom random = new SplittableRandom(5);
    int better = 0;
    for (int c = 0; c < 300; c++) {
      RandomHosting hosting = RandomHosting.of(random, 14, 4);
      Qubo form = hosting.form().toQubo();
      Run run = Run.of(Effort.draws(50).seed(c));
      HostedSampler sampler = HostedSampler.on(hosting.embedding(), RANDOM);
      double majority = mean(sampler.readback(Readback.byMajority()).sample(form, run));
      double field = mean(sampler.readback(Readback.byLocalField()).sample(form, run));
      assertTrue(field <= majority, field + " against " + majority);
      better += field < majority ? 1 : 0;
    }
    assertTrue(better > 200, better + " cases are strictly better");
  }

  private static double mean(Draws draws) {
    double sum = 0;
    for (Draw draw : draws) {
      sum += draw.energy() * draw.multiplicity();
    }
    return sum / draws.total();
  }

  @Test
  void startsComeBackWhole() {
    State start = State.parse("011");
    Run run = Run.of(Effort.draws(5)).starts(List.of(start));
    Draws draws = HostedSampler.on(triangle(), RANDOM).sample(frustrated(), run);
    assertEquals(1, draws.rows().size());
    assertEquals(start, draws.best().state());
  }

  @Test
  void theRunEndsAtTheFirstDrawThatReachesTheTargetOnceReadBack() {
    HostedSampler sampler = HostedSampler.on(triangle(), RANDOM);
    for (int seed = 0; seed < 20; seed++) {
      Draws draws = sampler.sample(frustrated(), Effort.draws(1000).seed(seed).target(-1));
      assertEquals(End.TARGET, draws.end());
      assertTrue(draws.best().energy() <= -1);
      double above = draws.rows().stream().filter(d -> d.energy() > -1).count();
      assertEquals(draws.total() - 1, above, "only the last draw is at the target");
      assertEquals(draws, sampler.sample(frustrated(), Effort.draws(1000).seed(seed).target(-1)));
    }
  }

  /** The rarest state of 300 random ones comes late: the cut may fall into any batch. */
  @Test
  void aTargetCutsTheDrawsThatAreMadeWithoutOne() {
    Qubo form =
        Qubo.builder(3).addLinear(0, 4).addLinear(1, 2).addLinear(2, 1).addPair(0, 1, 1).build();
    HostedSampler sampler = HostedSampler.on(triangle(), RANDOM);
    for (int seed = 0; seed < 20; seed++) {
      Effort effort = Effort.draws(300).seed(seed);
      List<State> all = sampler.sample(form, effort).inOrder();
      assertEquals(300, all.size());
      for (Draw row : sampler.sample(form, effort)) {
        Draws cut = sampler.sample(form, effort.target(row.energy()));
        int first = 0;
        while (form.value(all.get(first)) > row.energy()) {
          first++;
        }
        assertEquals(all.subList(0, first + 1), cut.inOrder());
      }
    }
  }

  @Test
  void progressGoesForwardOverAllBatches() {
    List<Progress> heard = new ArrayList<>();
    AtomicLong clock = new AtomicLong();
    Watch watch = Watch.none().progress(heard::add).clock(() -> clock.addAndGet(60_000_000));
    HostedSampler sampler = HostedSampler.on(triangle(), HostedSamplerTest::reportingStates);
    Draws draws = sampler.sample(frustrated(), Run.of(Effort.draws(200)).watch(watch));
    assertEquals(200, draws.total());
    List<Double> shares = heard.stream().map(p -> p.share().orElseThrow()).toList();
    assertEquals(List.of(64 / 200.0, 128 / 200.0, 192 / 200.0, 1.0), shares);
    assertEquals(OptionalDouble.empty(), heard.get(0).best());
    assertEquals(OptionalDouble.of(-1), heard.get(3).best());
  }

  private static Draws reportingStates(Qubo form, Run run) {
    run.begin().report(OptionalDouble.of(1), OptionalDouble.of(-99), OptionalDouble.empty());
    return randomStates(form, run);
  }

  @Test
  void anUnreachableTargetTakesAllDrawsAndAStopEndsThem() {
    HostedSampler sampler = HostedSampler.on(triangle(), RANDOM);
    Draws all = sampler.sample(frustrated(), Effort.draws(30).target(-5));
    assertEquals(30, all.total());
    assertEquals(End.DONE, all.end());
    StopSignal stop = StopSignal.create();
    stop.stop();
    Run stopped = Run.of(Effort.draws(30).target(-5)).watch(Watch.stop(stop));
    assertEquals(End.STOPPED, sampler.sample(frustrated(), stopped).end());
  }

  @Test
  void aFormThatIsNotCarriedIsRefusedWithThePair() {
    CompactGraph path = CompactGraph.builder(3).edge(0, 1).edge(1, 2).build();
    Embedding embedding =
        Embedding.of(
            new Guest("path", path),
            Host.of("path", path),
            List.of(new int[] {0}, new int[] {1}, new int[] {2}));
    IllegalArgumentException refused =
        assertThrows(
            IllegalArgumentException.class,
            () -> HostedSampler.on(embedding, RANDOM).sample(frustrated(), Effort.draws(1)));
    assertTrue(refused.getMessage().contains("(0, 2)"), refused.getMessage());
    Qubo larger = Qubo.builder(4).build();
    assertThrows(
        IllegalArgumentException.class,
        () -> HostedSampler.on(embedding, RANDOM).sample(larger, Effort.draws(1)));
  }
}
