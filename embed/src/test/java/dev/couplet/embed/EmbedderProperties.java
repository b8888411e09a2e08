package dev.couplet.embed;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import dev.couplet.embed.best.BestEmbedder;
import dev.couplet.embed.path.PathEmbedder;
import dev.couplet.embed.template.TemplateEmbedder;
import dev.couplet.host.Faults;
import dev.couplet.host.Host;
import dev.couplet.sampling.Effort;
import dev.couplet.sampling.End;
import dev.couplet.sampling.Watch;
import java.time.Duration;
import java.util.List;
import java.util.concurrent.atomic.AtomicLong;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.Combinators;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;

/** Every embedder over random guests, hosts and faults. */
class EmbedderProperties {
  private static final List<Embedder> ALL =
      List.of(PathEmbedder.standard(), TemplateEmbedder.standard(), BestEmbedder.standard());

  @Provide
  Arbitrary<Embedder> embedders() {
    return Arbitraries.of(ALL);
  }

  @Provide
  Arbitrary<Guest> guests() {
    Arbitrary<Integer> size = Arbitraries.integers().between(0, 16);
    Arbitrary<Double> density = Arbitraries.of(0.0, 0.1, 0.3, 0.7, 1.0);
    Arbitrary<Guest> random =
        Combinators.combine(size, density, Arbitraries.longs()).as(Guests::random);
    Arbitrary<Guest> shaped =
        size.flatMap(
            n ->
                Arbitraries.of(
                    Guests.cycle(n + 3),
                    Guests.bipartite(2, n),
                    Guests.grid(2, n + 1),
                    Guests.regular(3, 2 * n + 4, n)));
    return Arbitraries.oneOf(random, shaped);
  }

  @Provide
  Arbitrary<Host> hosts() {
    Arbitrary<Integer> size = Arbitraries.integers().between(1, 5);
    Arbitrary<Host> whole =
        Arbitraries.oneOf(
            Combinators.combine(size, size, size).as(Host::cells),
            Combinators.combine(size, size).as(Host::king),
            Combinators.combine(size, size).as(Host::square),
            Combinators.combine(size, size, size).as(Host::cubic));
    Arbitrary<Double> share = Arbitraries.of(0.0, 0.02, 0.1, 0.3);
    return Combinators.combine(whole, share, share, Arbitraries.longs())
        .as((host, v, e, seed) -> host.without(Faults.seeded(host, v, e, seed)));
  }

  @Property(tries = 300)
  void whatIsReturnedIsValidAndTheSameAgain(
      @ForAll("embedders") Embedder embedder,
      @ForAll("guests") Guest guest,
      @ForAll("hosts") Host host,
      @ForAll long seed) {
    Effort effort = Effort.draws(2).sweeps(12).seed(seed);
    Fit fit = embedder.embed(guest, host, effort);
    fit.embedding().ifPresent(e -> assertEquals(List.of(), PlainValidator.faults(e)));
    assertEquals(fit, embedder.embed(guest, host, effort));
  }

  /** Timed efforts end by a clock that runs, whether the guest fits or not. */
  @Property(tries = 100)
  void endsWhenTold(
      @ForAll("embedders") Embedder embedder,
      @ForAll("guests") Guest guest,
      @ForAll("hosts") Host host) {
    AtomicLong milliseconds = new AtomicLong();
    Watch watch = Watch.none().clock(() -> milliseconds.incrementAndGet() * 1_000_000L);
    Effort effort = Effort.within(Duration.ofMillis(40));
    Fit fit = embedder.embed(guest, host, effort, watch);
    fit.embedding().ifPresent(e -> assertEquals(List.of(), PlainValidator.faults(e)));
    if (fit instanceof Fit.NotFound notFound && !(embedder instanceof TemplateEmbedder)) {
      assertNotEquals(End.DONE, notFound.end());
    }
  }
}
